import type { FoundKind } from '../contracts/find.contract.ts'
import type { TodayKind, TodayLane } from '../domain/today/today-kinds.ts'
import type { TodayState } from '../domain/today/today-item.ts'
import type { NoticeFate } from '../domain/notices/notice-state.ts'
import type { Lateness } from '../domain/today/how-late.ts'
import { counted, defineMessages } from './define-messages.ts'

/** Words of Today and of finding. What a piece of work is called is in say-today.ts. */
export const todayWords = defineMessages({
  title: 'Today',
  source: (p: { day: string; offset: string }) => `${p.day}, ${p.offset}`,
  ownFirst: 'Your own lane comes first.',
  waits: (p: { count: number }) => `${counted(p.count, 'item waits', 'items wait')} for you`,
  noneWait: 'Nothing waits for you now',
  ofThemLate: (p: { count: number; all: boolean }) => {
    if (p.all) return p.count === 1 ? 'and it is overdue' : 'all of them overdue'
    return p.count === 1 ? 'one of them overdue' : `${String(p.count)} of them overdue`
  },
  othersLate: (p: { count: number; more: boolean }) =>
    `${p.count === 1 ? 'One' : String(p.count)}${p.more ? ' more' : ''} ${p.count === 1 ? 'is' : 'are'} overdue in the other lanes.`,
  chooseLane: 'Lane that comes first and stands on the hour ruler',
  late: 'Overdue',
  now: 'now',
  nothingNow: 'Nothing to do here now',
  empty: 'A clear day',
  emptyBody: 'Nothing is due, overdue or waiting for you, and nothing comes before the end of tomorrow.',
  emptyUntil: (p: { when: string; what: string }) => `Nothing waits for you until ${p.when}: ${p.what}.`,
  doneToday: (p: { count: number }) => `${counted(p.count, 'item', 'items')} done today`,
  showDone: 'Show what was done today',
  hideDone: 'Hide what was done today',
  asOf: (p: { time: string }) => `As of ${p.time}. Looked up again every minute.`,
  what: 'the work of today',
  unreadable: 'The work of today can’t be read',
  rounds: 'Go on the round',

  urgent: 'Urgent, not yet seen by anybody',
  urgentBy: (p: { by: string; at: string }) => `${p.by}, ${p.at}`,
  markSeen: 'I have seen it and see to it',
  seenNow: 'Noted that you see to it',

  markRead: 'I have read it',
  readNow: 'Noted that you have read it',
  lift: 'Lift the hold',
  liftQuestion: (p: { number: string }) => `Lift the hold of ${p.number}?`,
  liftBody: 'Doses may be given again as soon as it is lifted.',
  liftLabel: 'Why it may go on',
  lifted: (p: { number: string }) => `Hold of ${p.number} lifted`,
  stop: 'Stop the bath',
  stopped: (p: { enclosure: string }) => `Bath at ${p.enclosure} stopped. Write what was seen on its sheet.`,
  stopQuestion: (p: { enclosure: string }) => `Stop the bath at ${p.enclosure} now?`,
  stopKept: 'Stopped, not sent yet: kept on this device.',
  toUnsent: 'Entries on this device',
  stopBody: 'It is recorded as ended at this minute. No password, no reason.',
  stopSeen: 'What was seen (may stay empty)',
  keepOn: 'Leave it running',
  back: 'Back',

  signedAmount: 'signed',
  ends: (p: { time: string }) => `ends ${p.time}`,
  by: (p: { when: string }) => `by ${p.when}`,

  log: 'Ship’s log',
  logHours: 'last 24 hours',
  logEmpty: 'Nobody has written anything in the last 24 hours.',
})

/** What became of an urgent call so far. */
export const urgentFates = defineMessages({
  sending: 'Being sent. Nobody has answered yet.',
  'not-sent': 'NOT SENT by mail. Telephone whoever is on call.',
  sent: 'Sent by mail. Nobody has answered yet.',
  seen: 'Seen',
} satisfies Record<NoticeFate, string>)

export const stateWords = defineMessages({
  late: 'overdue',
  running: 'going on now',
  due: 'due',
  waiting: 'waiting',
  coming: 'to come',
  done: 'done',
} satisfies Record<TodayState, string>)

/** The way to where a piece of work is done; empty where its name is way enough. */
export const goWords = defineMessages({
  'urgent-call': '',
  'own-licence': '',
  'observation-flagged': '',
  'order-held': '',
  'case-held': 'Read the case',
  'order-proposed': 'Read and sign',
  'order-draft': 'Read and sign',
  'case-ready': 'Clear from quarantine',
  'dose-exceptions': 'Review',
  'discrepancy-veterinarian': 'Explain',
  'bodies-veterinarian': 'Name them',
  'bath-running': 'To the tank sheet',
  'second-calculation': 'Calculate blind',
  dose: 'Prepare the dose',
  'order-not-carried-out': 'Record it',
  sample: 'Record it',
  'volume-to-confirm': 'Read and confirm',
  'volume-check': '',
  'outside-case': '',
  'case-to-close': '',
  observation: 'Observe',
  care: 'Record it',
  'discrepancy-registrar': 'Explain',
  'bodies-registrar': 'Name them',
  'movement-marked': 'To the animal',
  'transaction-marks': 'Explain',
  'transaction-papers': 'Attach papers',
  'permit-marks': '',
  'permit-runs-out': '',
  'account-without-licence': '',
  'licence-ends': '',
  'signing-locked': '',
  'account-without-sign-in': '',
  'setting-proposed': 'Read and confirm',
  'settings-default': '',
} satisfies Record<TodayKind, string>)

export const laneNames = defineMessages({
  urgent: 'Urgent',
  decide: 'To sign and decide',
  doses: 'Doses and samples',
  watch: 'Observations',
  register: 'Register',
  people: 'People and settings',
} satisfies Record<TodayLane, string>)

/** The lanes by the people whose own they are. */
export const laneOwners = defineMessages({
  urgent: 'Everybody',
  decide: 'Veterinarian',
  doses: 'Technician',
  watch: 'Keeper',
  register: 'Registrar',
  people: 'Administrator',
} satisfies Record<TodayLane, string>)

export const lateWords = defineMessages({
  minutes: (p: { count: number }) => `${String(p.count)} min late`,
  hours: (p: { count: number }) => `${String(p.count)} h late`,
  days: (p: { count: number }) => `${String(p.count)} d late`,
} satisfies Record<Lateness['unit'], (p: { count: number }) => string>)

export const agoWords = defineMessages({
  minutes: (p: { count: number }) => `${String(p.count)} min ago`,
  hours: (p: { count: number }) => `${String(p.count)} h ago`,
  days: (p: { count: number }) => `${String(p.count)} d ago`,
} satisfies Record<Lateness['unit'], (p: { count: number }) => string>)

/** Notes from one watch to the next. */
export const handoverWords = defineMessages({
  title: 'Handover',
  titleAbout: (p: { about: string }) => `Handover, ${p.about}`,
  readBy: (p: { names: readonly string[] }) => `Read by ${p.names.join(', ')}.`,
  readByNobody: 'Nobody has said yet that they have read it.',
  haveRead: 'I have read it',
  label: 'Note for the next watch',
  about: 'What it is about',
  leave: 'Leave the note',
  written: 'The note stands on Today for two days',
})

export const findWords = defineMessages({
  nothing: (p: { text: string }) => `Nothing found for “${p.text}”.`,
  tryOther:
    'Numbers and names are searched: of animals, enclosures, orders, cases, papers and people you may see.',
  more: (p: { count: number }) => `and ${String(p.count)} more; type more of it`,
  finding: 'Looking …',
  failed: 'Finding did not work. Type on, or try again.',
  count: (p: { count: number }) => counted(p.count, 'find', 'finds'),
})

export const foundKindNames = defineMessages({
  animal: 'Animals',
  enclosure: 'Enclosures',
  order: 'Orders',
  case: 'Quarantine cases',
  transaction: 'Transactions',
  permit: 'Permits',
  person: 'People',
} satisfies Record<FoundKind, string>)
