import { counted, defineMessages } from './define-messages.ts'

const cases = (count: number) => counted(count, 'case', 'cases')
const animals = (count: number) => counted(count, 'animal', 'animals')
const days = (count: number) => counted(count, 'day', 'days')

/** How many cases stand in a view; null while they are fetched. */
interface Tally {
  count: number | null
}
const tallied = (view: string, { count }: Tally) => (count === null ? view : `${view} ${count}`)
const dayZero = 'Day 0 is the day the last of a batch came in.'

/** The board and the sheet of a quarantine case. */
export const quarantineWords = defineMessages({
  title: 'Quarantine',
  boardSource: (p: { cases: number; animals: string; offset: string }) =>
    `${cases(p.cases)} in this view, ${p.animals}. ${dayZero} Times are facility time, ${p.offset}.`,
  boardSourceFetching: (p: { offset: string }) => `${dayZero} Times are facility time, ${p.offset}.`,
  animalsCounted: (p: { count: number }) => animals(p.count),
  animalsBetween: (p: { low: number; high: number }) => `${p.low} to ${animals(p.high)}`,
  animalsOf: (p: { now: number; before: number }) => `${p.now} of ${animals(p.before)}`,
  fetched: 'quarantine cases',
  openCase: 'Open a case',
  rounds: 'Rounds',
  view: 'Which cases',
  viewRunning: (p: Tally) => tallied('Running', p),
  viewDue: (p: Tally) => tallied('Due today', p),
  viewOverdue: (p: Tally) => tallied('Overdue', p),
  viewReady: (p: Tally) => tallied('Ready to clear', p),
  viewHeld: (p: Tally) => tallied('Held', p),
  viewEnded: (p: Tally) => tallied('Ended', p),
  order: 'Order',
  byClearance: 'By clearance date',
  byWork: 'By order of work',
  rows: 'Rows',
  roomy: 'Roomy',
  close: 'Close',
  table: 'Table',
  find: 'Find by number, animals or place',
  findAndFilter: 'Find and filter',
  protocol: 'Protocol',
  allProtocols: 'Every protocol',
  boundary: 'Quarantine boundary',
  allBoundaries: 'Every boundary',
  noCases: 'No case in this view',
  noCasesWhy: 'No quarantine case is as you asked. Look at the running ones, or open a case.',
  noCasesYet: 'Nobody is in quarantine',
  noCasesYetWhy: 'When animals arrive that have to wait, open a case for the batch.',
  showRunning: 'Show running cases',
  moreCases: (p: { shown: number; total: number }) => `${p.shown} of ${cases(p.total)} shown`,
  nextCases: 'Next cases',
  firstCases: 'First cases',
  case: 'Case',
  animalsHead: 'Animals',
  place: 'Place',
  day: 'Day',
  state: 'State',
  nextStep: 'Due or late',
  earliest: 'Earliest clearance',
  changes: 'Changes of the clock',
  dayOfLength: (p: { day: number; length: number }) => `${p.day} of ${p.length}`,
  dayUnset: (p: { length: number }) => `not begun, ${days(p.length)} wanted`,
  noDate: 'not set',
  inQuarantine: 'In quarantine',
  held: 'Held',
  locked: 'Locked',
  cleared: (p: { on: string }) => `Cleared ${p.on}`,
  clearanceDisagrees: 'Clearance does not agree: not cleared',
  recalled: 'Recalled, not cleared',
  transferred: (p: { on: string }) => `Transferred ${p.on}`,
  batchOpen: 'In quarantine, batch still open',
  noMovement: 'No movement. Clearance date not set.',
  lateDays: (p: { days: number }) => `${days(p.days)} late`,
  log: 'Observations',
  logAllCases: 'all cases',
  logNone: 'Nothing has been observed yet.',
  observationsShown: (p: { shown: number; total: number }) =>
    `The newest ${String(p.shown)} of ${counted(p.total, 'observation', 'observations')}.`,
  observationsOlder: 'Older observations',
  today: 'Today',
  dayOfCase: (p: { date: string; day: number }) => `${p.date}, day ${p.day}`,
  forVeterinarian: 'for the veterinarian',
  urgent: 'urgent',
  readBy: (p: { name: string; at: string }) => `Read by ${p.name}, ${p.at}`,
  readWith: (p: { words: string }) => `: ${p.words}`,
  haveRead: 'I have read it',
  struck: (p: { reason: string }) => `Struck out: ${p.reason}`,
  deathsStand: (p: { count: number }) =>
    p.count === 1
      ? 'A death that it entered still stands. If it was a mistake too, strike it out at'
      : `${p.count} deaths that it entered still stand. If they were a mistake too, strike them out at`,
  keptFirst: (p: { at: string }) => `sent later, at ${p.at}`,
  clockDoubtful: 'The clock of the device ran ahead; the time of receipt stands.',
  writeObservation: 'Write an observation',
  openCalls: 'Urgent calls that nobody has seen',
  openCall: (p: { place: string; words: string; by: string; at: string }) =>
    `${p.place}: ${p.words} (${p.by}, ${p.at})`,
  callState: (p: { state: string }) => `State: ${p.state}`,
  openTheCall: 'Open the call',
})

/** What moved a clock, in few words, where the drawing has room for them. */
export const clockNotes = defineMessages({
  animalsCame: (p: { who: string }) => `${p.who} entered the water`,
  sameRoom: (p: { who: string }) => `${p.who} came into the room`,
  wetMaterial: 'wet material entered the water',
  gear: 'gear was shared',
  breach: 'contact with another unit',
  afterPositive: 'treatment of a finding ended',
  sharedWater: (p: { other: string }) => `counts with ${p.other}`,
  otherwise: 'restarted',
  death: (p: { until: string }) => `unexplained death, to ${p.until}`,
  signs: (p: { until: string }) => `new signs, to ${p.until}`,
  masking: (p: { until: string }) => `treatment hides findings, to ${p.until}`,
  notFeeding: 'not feeding by half way',
  positive: 'positive result',
})
