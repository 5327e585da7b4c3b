import type { LicenceClass } from '../domain/licences/licence-classes.ts'
import { sayLicenceNotice } from './signing.ts'
import type { TodayLogLine, TodayWork } from '../contracts/today.contract.ts'
import type { AgentCode } from '../domain/formulary/agent.ts'
import type { DiscrepancyKind } from '../domain/animals/discrepancy.ts'
import type { Breathing, Feeding, Skin } from '../domain/observations/observation.ts'
import type { TransactionKind } from '../domain/register/transaction-kinds.ts'
import type { SettingKey } from '../domain/settings/settings.ts'
import type { TodayKind } from '../domain/today/today-kinds.ts'
import type { Instant, Zone } from '../domain/time/instant.ts'
import { facilityDateOf } from '../domain/time/facility-date.ts'
import { discrepancySentences } from './animal-log.ts'
import { capital } from './capital.ts'
import { counted, defineMessages } from './define-messages.ts'
import { agentNames } from './formulary.ts'
import { breathingWords, feedingWords, sayStrength, skinWords } from './observations.ts'
import { transactionKindNames } from './register-kinds.ts'
import { sayDate, sayTime } from './say-date.ts'
import { settingNames } from './settings.ts'

/** The figures and names of a piece of work, read for words. */
interface Told {
  text: (key: string) => string
  number: (key: string) => number
  has: (key: string) => boolean
  drug: string
  /** A moment: the time of today, else the day and the time. */
  moment: (at: string) => string
  at: string
}

type Say = (told: Told) => string

const beside = (...words: (string | false)[]) => words.filter(Boolean).join(', ')
const dayOf = (t: Told) => t.has('day') && `day ${t.text('day')} of ${t.text('required')}`
const caseWords = (t: Told) => `${t.text('case')} ${t.text('name')}`
const byAndWhen = (t: Told) => beside(t.text('by'), t.at)

/** What there is to do, in a few words that name the place. */
const titles = defineMessages({
  'urgent-call': (t: Told) => `Urgent at ${t.text('enclosure')}`,
  'own-licence': (t: Told) => (t.has('until') ? `Your ${asOwn(sayEnd(t))}` : 'You have no valid licence'),
  'observation-flagged': (t: Told) => `Read what was seen at ${t.text('enclosure')}`,
  'order-held': (t: Told) => beside(`${t.text('number')} is held`, t.text('enclosure'), t.drug),
  'case-held': (t: Told) => `${caseWords(t)} is ${t.number('held') === 1 ? 'held' : 'locked'}`,
  'order-proposed': (t: Told) => beside(`Proposal ${t.text('number')}`, t.text('enclosure'), t.drug),
  'order-draft': (t: Told) =>
    beside(
      t.has('version') ? `Amended version of ${t.text('number')}` : `Draft ${t.text('number')}`,
      t.text('enclosure'),
      t.drug,
    ),
  'case-ready': (t: Told) => `Decide, ${caseWords(t)}`,
  'dose-exceptions': (t: Told) =>
    `${t.has('stopped') ? 'The bath was stopped' : 'Review the dose'}, ${beside(t.text('enclosure'), t.drug)}`,
  'discrepancy-veterinarian': (t: Told) => `Explain, ${t.text('accession')} ${t.text('animal')}`,
  'bodies-veterinarian': sayBodies,
  'bath-running': (t: Told) => `${t.drug} bath, ${t.text('enclosure')}`,
  'second-calculation': (t: Told) => `Second calculation, ${beside(t.text('enclosure'), t.drug)}`,
  dose: (t: Told) => `${t.drug} bath, ${t.text('enclosure')}`,
  'order-not-carried-out': (t: Told) =>
    beside(`${t.text('number')} was not carried out`, t.text('enclosure')),
  sample: (t: Told) => beside(t.text('step'), t.text('enclosure')),
  'volume-to-confirm': (t: Told) => `Confirm the volume, ${t.text('enclosure')}`,
  'volume-check': (t: Told) => `Determine the volume again, ${t.text('enclosure')}`,
  'outside-case': (t: Told) =>
    `In no case: ${t.text('animal')} ${t.text('accession')}, ${t.text('enclosure')}`,
  'case-to-close': (t: Told) => `Is the batch complete? ${caseWords(t)}`,
  observation: (t: Told) =>
    beside(t.has('step') ? t.text('step') : 'Daily look', `${t.text('enclosure')} ${t.text('name')}`),
  care: (t: Told) => beside(t.text('step'), t.text('enclosure')),
  'discrepancy-registrar': (t: Told) => `Explain, ${t.text('accession')} ${t.text('animal')}`,
  'bodies-registrar': sayBodies,
  'movement-marked': (t: Told) => `Moved against a rule, ${t.text('accession')} ${t.text('animal')}`,
  'transaction-marks': (t: Told) => `${t.text('number')} goes beyond a permit`,
  'transaction-papers': (t: Told) =>
    t.has('count')
      ? `${counted(t.number('count'), 'transaction', 'transactions')} without papers`
      : `${t.text('number')} has no papers`,
  'permit-marks': (t: Told) => `${t.text('number')} ${t.text('permit')} was overdrawn`,
  'permit-runs-out': (t: Told) =>
    `${t.text('number')} ${t.text('permit')} ends in ${counted(t.number('days'), 'day', 'days')}`,
  'account-without-licence': (t: Told) => `${t.text('name')} has no valid licence`,
  'licence-ends': (t: Told) => `${t.text('name')}: ${sayEnd(t)}`,
  'signing-locked': (t: Told) =>
    !t.has('until') || !t.has('since')
      ? `Signing of ${t.text('name')} was locked`
      : t.has('running')
        ? `Signing of ${t.text('name')} is locked until ${t.moment(t.text('until'))}`
        : `Signing of ${t.text('name')} was locked, ${t.moment(t.text('since'))} to ${t.moment(t.text('until'))}`,
  'account-without-sign-in': (t: Told) => `${t.text('name')} has never signed in`,
  'setting-proposed': (t: Told) => `Confirm: ${settingNames[t.text('key') as SettingKey]}`,
  'settings-default': (t: Told) =>
    `${counted(t.number('count'), 'setting', 'settings')} nobody has confirmed`,
} satisfies Record<TodayKind, Say>)

function sayEnd(t: Told): string {
  return sayLicenceNotice({
    class: t.text('class') as LicenceClass,
    number: t.text('number'),
    jurisdiction: t.text('jurisdiction'),
    daysLeft: t.number('days'),
    lastDay: t.text('until'),
  })
}
const asOwn = (sentence: string) => sentence.charAt(0).toLowerCase() + sentence.slice(1)

const lastLook = (t: Told) =>
  t.has('lastAt') ? `last ${t.moment(t.text('lastAt'))}, ${t.text('lastBy')}` : 'not looked at yet'

/** What helps to see to it: whose, since when, how far. May be empty. */
const notes = defineMessages({
  'urgent-call': (t: Told) => t.text('words'),
  'own-licence': (t: Told) =>
    t.has('until')
      ? t.text('class') === 'veterinary'
        ? 'After its last day another veterinarian signs. You may still hold and stop.'
        : 'Without it you sign no order for a controlled drug. You may still hold and stop.'
      : 'Another veterinarian signs, confirms and overrides. You may still hold and stop.',
  'observation-flagged': (t: Told) =>
    beside(
      t.has('words') && `“${t.text('words')}”`,
      t.number('dead') > 0 && `${counted(t.number('dead'), 'animal', 'animals')} found dead`,
      t.has('unwell') && sayStrength({ unwell: t.number('unwell'), handled: null }).join(),
      byAndWhen(t),
    ),
  'order-held': (t: Told) => beside(t.has('reason') && `“${t.text('reason')}”`, byAndWhen(t)),
  'case-held': (t: Told) => beside(t.text('enclosure'), dayOf(t)),
  'order-proposed': (t: Told) => beside(t.text('problem'), byAndWhen(t)),
  'order-draft': (t: Told) => beside(t.text('problem'), byAndWhen(t)),
  'case-ready': (t: Told) => beside(dayOf(t), 'nothing stands against clearance'),
  'dose-exceptions': (t: Told) =>
    beside(
      t.text('number'),
      !t.has('stopped') && 'recorded though a rule stood against it',
      t.has('seen') && `“${t.text('seen')}”`,
      byAndWhen(t),
    ),
  'discrepancy-veterinarian': sayDoesNotFit,
  'bodies-veterinarian': byAndWhen,
  'bath-running': (t: Told) =>
    beside(
      t.text('number'),
      `begun ${t.at}`,
      t.text('by'),
      t.has('endUntold') && 'the time to stop cannot be read: ask the veterinarian',
    ),
  'second-calculation': (t: Told) =>
    beside(t.text('number'), `dose ${t.text('key')}`, `first by ${t.text('by')}, ${t.at}`),
  dose: (t: Told) =>
    t.has('record')
      ? beside(t.text('number'), `dose ${t.text('key')}`, byAndWhen(t))
      : beside(
          t.text('number'),
          `dose ${t.text('key')}`,
          t.has('held') && 'held, not to be given until a veterinarian lifts it',
          t.has('broken') && 'its text is not the one that was signed: nothing is given by it',
        ),
  'order-not-carried-out': (t: Told) =>
    `${beside(t.text('problem'), t.drug)}. ${t.text('given')} of ${counted(t.number('doses'), 'dose', 'doses')} recorded. Record what was given or withheld.`,
  sample: sayStep,
  'volume-to-confirm': (t: Told) =>
    beside(t.text('waters'), `determined by ${t.text('by')}`, t.at, 'needs another person'),
  'volume-check': (t: Told) => t.text('waters'),
  'outside-case': (t: Told) =>
    beside(`inside the quarantine boundary since ${t.at}`, 'open a case, or take it into the one that runs'),
  'case-to-close': () => 'The clock begins when the last of the batch is in.',
  observation: (t: Told) => beside(t.text('case'), dayOf(t), lastLook(t)),
  care: sayStep,
  'discrepancy-registrar': sayDoesNotFit,
  'bodies-registrar': byAndWhen,
  'movement-marked': (t: Told) => `${sayDoesNotFit(t)}. It waits for a veterinarian.`,
  'transaction-marks': sayTransaction,
  'transaction-papers': (t: Told) =>
    t.has('count') ? `The oldest: ${t.text('number')}, ${sayTransaction(t)}` : sayTransaction(t),
  'permit-marks': (t: Told) => t.text('authority'),
  'permit-runs-out': (t: Told) => t.text('authority'),
  'account-without-licence': () => 'Veterinarian. Cannot sign, confirm or override without one.',
  'licence-ends': (t: Told) =>
    t.text('class') === 'veterinary'
      ? 'Enter the renewed one, with its paper, or end it.'
      : 'Without it no order for a controlled drug is signed. Enter the renewed one, or end it.',
  'signing-locked': (t: Told) =>
    `${counted(t.number('count'), 'wrong password', 'wrong passwords')} in a row. They may still hold and stop. Ask whether it was them.`,
  'account-without-sign-in': () => 'Give a one-time password, or close the account.',
  'setting-proposed': (t: Told) => byAndWhen(t),
  'settings-default': () => 'They stand as this program set them.',
} satisfies Record<TodayKind, Say>)

function sayBodies(t: Told): string {
  return `Whose are they? ${counted(t.number('dead'), 'animal', 'animals')} found dead, ${t.text('enclosure')}`
}

function sayStep(t: Told): string {
  return beside(
    caseWords(t),
    dayOf(t),
    t.has('failed') && 'tried in vain, to be done again',
    t.has('by') && `done by ${t.text('by')}`,
  )
}

function sayTransaction(t: Told): string {
  return beside(transactionKindNames[t.text('kind') as TransactionKind], t.text('party'), t.text('animal'))
}

function sayDoesNotFit(t: Told): string {
  return discrepancySentences[t.text('code') as DiscrepancyKind]({ said: (key) => t.text(`fact.${key}`) })
}

function toldOf(
  { params, at }: { params: Record<string, string | number>; at: Instant | null },
  now: Instant,
  zone: Zone,
): Told {
  const moment = (instant: string) => {
    const day = facilityDateOf(instant, zone)
    const time = sayTime(instant, zone)
    return day === facilityDateOf(now, zone) ? time : `${sayDate(day)}, ${time}`
  }
  return {
    text: (key) => String(params[key] ?? ''),
    number: (key) => Number(params[key] ?? 0),
    has: (key) => params[key] !== undefined && params[key] !== '',
    drug:
      typeof params['agent'] === 'string'
        ? agentNames[params['agent'] as AgentCode]
        : String(params['drug'] ?? ''),
    moment,
    at: at === null ? '' : moment(at),
  }
}

/**
 * A piece of work in words: what there is to do and where, and what helps to see to it.
 *
 * @param now  the instant of the worklist; moments of its day are said by their time
 * @param zone zone of the facility
 */
export function sayWork(item: TodayWork, now: Instant, zone: Zone): { title: string; note: string } {
  const told = toldOf(item, now, zone)
  return { title: capital(titles[item.kind](told)), note: capital(notes[item.kind](told)) }
}

const doseRecords = defineMessages({
  given: (t: Told) => beside(`${t.drug} given`, t.text('amount'), t.text('number')),
  recorded: (t: Told) => beside(`${t.drug} recorded as given`, t.text('amount'), t.text('number')),
  withheld: (t: Told) => beside(`${t.drug} withheld`, t.text('number')),
  refused: (t: Told) => beside(`${t.drug} refused by the animal`, t.text('number')),
  'time-up': (t: Told) => beside(`${t.drug} bath ended at its time`, t.text('seen'), t.text('number')),
  stopped: (t: Told) => beside(`${t.drug} bath stopped`, t.text('seen'), t.text('number')),
})

/** Each thing seen is a sentence of its own, as it was tapped. */
const observed = defineMessages({
  seen: (t: Told) =>
    [
      t.has('feeding') && feedingWords[t.text('feeding') as Feeding],
      t.has('breathing') && breathingWords[t.text('breathing') as Breathing],
      t.has('skin') && skinWords[t.text('skin') as Skin],
      t.number('dead') > 0 && `${counted(t.number('dead'), 'animal', 'animals')} found dead`,
      ...sayStrength({
        unwell: t.has('unwell') ? t.number('unwell') : null,
        handled: t.has('handled') ? t.text('handled') === 'yes' : null,
      }),
      t.has('words') && `“${t.text('words')}”`,
    ]
      .filter(Boolean)
      .join('. ') || 'Looked at',
})

/** A line of the log in words; the place stands before it. */
export function sayLogLine(line: TodayLogLine, now: Instant, zone: Zone): string {
  const told = toldOf(line, now, zone)
  if (line.kind === 'observation') return observed.seen(told)
  const code = told.text(line.kind === 'dose' ? 'record' : 'cause')
  return capital(doseRecords[code as keyof typeof doseRecords](told))
}
