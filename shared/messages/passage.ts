import { counted, defineMessages } from './define-messages.ts'

/** Words of the passage, the drawing of a quarantine case. */
export const passageWords = defineMessages({
  dayOf: (p: { day: number; length: number }) => `Day ${p.day} of ${p.length}`,
  of: (p: { length: number }) => `of ${p.length}`,
  held: 'held',
  stepDone: 'step done',
  due: 'due today',
  toCome: 'to come',
  overdue: 'overdue',
  failed: 'failed',
  restarted: 'clock restarted',
  paused: (p: { days: number }) => `paused ${counted(p.days, 'day', 'days')}`,
  earliestClearance: 'earliest clearance',
  animalsCounted: 'animals counted',
  inDays: (p: { days: number }) => (p.days === 1 ? 'in 1 day' : `in ${p.days} days`),
  daysToRun: (p: { days: number }) => `${counted(p.days, 'day', 'days')} to run`,
  today: 'today',
  passed: 'date passed',
  readyToClear: 'ready to clear',
  noMovement: 'No movement. Clearance date not set.',
  stepsTogether: (p: { count: number }) => `${p.count} steps close together`,
  fixName: (p: { name: string; day: number; on: string; state: string }) =>
    `${p.name}, day ${p.day}, ${p.on}, ${p.state}`,
  courseOf: (p: { name: string }) => `Steps of ${p.name}`,
  stepsTable: (p: { name: string }) => `Protocol steps of ${p.name}`,
  day: 'Day',
  date: 'Date',
  step: 'Step',
  state: 'State',
  result: 'Result or owner',
  firstLeg: (p: { days: number }) => `First leg, closed after day ${p.days}`,
  earlierLeg: (p: { days: number }) => `Earlier leg, closed after day ${p.days}`,
  restartedOn: (p: { on: string }) => `Restarted ${p.on}`,
  key: 'Marks used in the drawing',
  boardLabel: (p: { count: number; from: string; until: string }) =>
    `${counted(p.count, 'quarantine passage', 'quarantine passages')} on one day ruler, ${p.from} to ${p.until}`,
})
