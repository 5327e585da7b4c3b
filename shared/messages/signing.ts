import type { LicenceClass } from '../domain/licences/licence-classes.ts'
import type { LicenceNotice } from '../domain/licences/licence-notices.ts'
import type { SigningLack, SigningLackCode } from '../domain/licences/signing-licence.ts'
import { counted, defineMessages } from './define-messages.ts'
import { sayDate } from './say-date.ts'

const stillMay = 'You may still read, write drafts, and hold and stop.'
const opensItself = 'It opens by itself then; nobody can open it sooner.'

/** Words of signing that all kinds of signature share: which licence signs, what lacks, what is locked. */
export const signingWords = defineMessages({
  passwordWrong: 'That is not your password.',
  lockedFor: (p: { minutes: number }) =>
    `Too many wrong passwords in a row: signing is locked for you for another ${String(p.minutes)} min. ${opensItself} ${stillMay}`,
  lockedNow: (p: { minutes: number }) =>
    `It was the last of too many wrong ones in a row: signing is locked for you for ${String(p.minutes)} min. ${opensItself} ${stillMay}`,
  locked: (p: { until: string }) =>
    `Too many wrong passwords in a row: signing is locked for you until ${p.until}. ${opensItself} ${stillMay}`,
  shutLocked: 'Signing is locked for you for now.',
  shutLacks: 'It says above what is needed to sign this.',
  scheduleOf: (p: { schedule: string }) =>
    `Controlled drug, schedule ${p.schedule}. The schedule is from memory and nobody has checked it: confirm it before you rely on it.`,
  chooseLicence: 'Licence you sign under',
  chooseHint: 'The one you choose is printed with the signature.',
  chooseFirst: 'Choose the licence you sign under.',
  licence: (p: { jurisdiction: string; number: string; until: string }) =>
    `${p.jurisdiction}, licence ${p.number}, valid to ${p.until}`,
  registration: (p: { jurisdiction: string; number: string; until: string }) =>
    `controlled-substance registration ${p.number}, ${p.jurisdiction}, valid to ${p.until}`,
  stillMay,
})

export const licenceClassNames = defineMessages({
  veterinary: 'Licence to practise',
  'controlled-substance': 'Controlled-substance registration',
} satisfies Record<LicenceClass, string>)

type LackParams = SigningLack['params']
const named = ({ jurisdiction = '', number = '' }: LackParams) => `${number} (${jurisdiction})`
const day = ({ on }: LackParams) => (on === undefined ? '' : sayDate(on))
const drug = ({ schedule }: LackParams) => `a drug of schedule ${schedule ?? ''}`

const lackWords = defineMessages({
  'no-licence': () => 'No licence to practise is entered for you.',
  'licence-not-yet': (p: LackParams) => `Your licence ${named(p)} is valid from ${day(p)} on.`,
  'licence-ended': (p: LackParams) => `Your licence ${named(p)} ended on ${day(p)}.`,
  'licence-not-accepted-here': (p: LackParams) =>
    `Your licence ${named(p)} is of a jurisdiction that this facility does not accept.`,
  'licence-not-chosen': (p: LackParams) =>
    `${counted(p.count ?? 0, 'licence is', 'licences are')} valid today. Choose the one you sign under.`,
  'chosen-licence-not-valid': () => 'The licence you chose is not valid today. Choose again.',
  'no-registration': (p: LackParams) =>
    `For ${drug(p)} you need a controlled-substance registration besides the licence, and none is entered for you.`,
  'registration-not-yet': (p: LackParams) =>
    `For ${drug(p)} you need a controlled-substance registration; your registration ${named(p)} is valid from ${day(p)} on.`,
  'registration-ended': (p: LackParams) =>
    `For ${drug(p)} you need a controlled-substance registration; your registration ${named(p)} ended on ${day(p)}.`,
  'registration-elsewhere': (p: LackParams) =>
    `For ${drug(p)} you need a controlled-substance registration for the jurisdiction of your licence; your registration ${named(p)} is for another.`,
} satisfies Record<SigningLackCode, (p: LackParams) => string>)

/** What a signer lacks, in a sentence. */
export const sayLack = ({ code, params }: SigningLack): string => lackWords[code](params)

/** Everything that a signer lacks, and what they may do all the same. */
export const sayLacks = (lacks: readonly SigningLack[]): string => [...lacks.map(sayLack), stillMay].join(' ')

type Noticed = Pick<LicenceNotice, 'daysLeft' | 'lastDay'> & {
  class: LicenceClass
  number: string
  jurisdiction: string
}

const noticeWords = defineMessages({
  ends: (p: { what: string; days: number; on: string }) =>
    `${p.what} ends in ${counted(p.days, 'day', 'days')}, on ${p.on}`,
  endsToday: (p: { what: string; on: string }) => `${p.what} ends today, ${p.on}`,
  ended: (p: { what: string; on: string }) => `${p.what} ended on ${p.on}`,
  licence: (p: { number: string; jurisdiction: string }) => `Licence ${p.number}, ${p.jurisdiction},`,
  registration: (p: { number: string; jurisdiction: string }) =>
    `Controlled-substance registration ${p.number}, ${p.jurisdiction},`,
})

/** That a licence ends soon or has ended, and when. */
export function sayLicenceNotice({ daysLeft, lastDay, class: of, number, jurisdiction }: Noticed): string {
  const what = (of === 'veterinary' ? noticeWords.licence : noticeWords.registration)({
    number,
    jurisdiction,
  })
  const on = sayDate(lastDay)
  if (daysLeft < 0) return noticeWords.ended({ what, on })
  return daysLeft === 0 ? noticeWords.endsToday({ what, on }) : noticeWords.ends({ what, days: daysLeft, on })
}
