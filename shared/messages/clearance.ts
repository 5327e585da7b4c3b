import { tooSoonAfterMasking } from './quarantine.ts'
import { counted, defineMessages } from './define-messages.ts'

/** Words of a signed clearance: its meaning, and the certificate on paper. */
export const clearanceWords = defineMessages({
  meaning: 'author of this clearance',
  name: 'Clearance certificate',
  title: (p: { number: string }) => `Clearance certificate ${p.number}`,
  source: (p: { zone: string }) => `Days are calendar dates of the facility (${p.zone}).`,
  cleared: (p: { on: string }) => `Cleared from quarantine on ${p.on}`,
  notValid: 'This certificate does not hold',
  recalled: 'Recalled after clearance: void. Do not move animals on the strength of this page.',
  unreadable:
    'The signed text of this clearance cannot be read any more. Tell the administrator; treat the animals as in quarantine.',
  notCleared: 'This case has not been cleared.',
  protocol: 'Protocol',
  protocolText: (p: { name: string; code: string; version: number }) =>
    `${p.name} (${p.code}, version ${String(p.version)})`,
  protocolUnconfirmed: ', not confirmed by a licensed veterinarian',
  kind: 'Quarantine kind',
  day0: 'Day 0',
  noDay0: 'none',
  days: 'Days',
  daysText: (p: { ran: number; wanted: number }) =>
    `${counted(p.ran, 'day', 'days')} ran, ${String(p.wanted)} wanted`,
  paused: 'Paused',
  pausedText: (p: { days: number }) => (p.days === 0 ? 'no days' : counted(p.days, 'day', 'days')),
  shares: 'Water shared with',
  sharesNone: 'no other case',
  batchHeading: 'Animals cleared',
  accession: 'Number',
  animal: 'Animal',
  count: 'How many',
  place: 'Enclosure',
  joined: 'Came in',
  gone: 'none left',
  countCounted: (p: { count: number }) => p.count.toLocaleString('en-GB'),
  countEstimated: (p: { low: number; high: number }) =>
    `${p.low.toLocaleString('en-GB')} to ${p.high.toLocaleString('en-GB')}, estimated`,
  noAnimals: 'No animals.',
  animals: (p: { low: number; high: number }) =>
    p.low === p.high
      ? counted(p.low, 'animal', 'animals')
      : `${p.low.toLocaleString('en-GB')} to ${p.high.toLocaleString('en-GB')} animals, estimated`,
  unmetHeading: 'Not met at clearance',
  unmetNone: 'Every condition of the protocol was met at clearance.',
  unmetTitle: 'Cleared against this condition',
  against: (p: { name: string }) => `Cleared all the same by ${p.name},`,
  reason: (p: { reason: string }) => ` reason: ${p.reason}`,
  note: (p: { reason: string }) => `Note of the veterinarian: ${p.reason}`,
  conditionsHeading: 'Conditions besides days',
  condition: 'Condition',
  result: 'Result',
  noConditions: 'The protocol has no conditions besides days.',
  metOn: (p: { on: string }) => `met on ${p.on}`,
  met: 'met',
  notMet: 'not met',
  negatives: (p: { count: number; wanted: number; met: boolean }) =>
    `, ${String(p.count)} of ${String(p.wanted)}${p.met || p.count < p.wanted ? '' : tooSoonAfterMasking}`,
  clockHeading: 'How the clock ran',
  date: 'Date',
  what: 'What happened, and what it did',
  fallen: ' (no longer counts)',
  noClock: 'Nothing happened.',
  deathsHeading: 'Deaths in quarantine',
  noDeaths: 'None.',
  found: 'Found',
  bodies: 'How many',
  finding: 'Finding',
  unexplained: 'unexplained',
  'explained-not-transmissible': 'explained, not transmissible',
  'explained-transmissible': 'explained, transmissible',
  findingText: (p: { finding: string; cause: string }) => `${p.finding}: ${p.cause}`,
  nobody: 'not known',
  scope:
    'This ends the quarantine kept in this facility’s record. It is no permit, health certificate or leave to ship; the law of the place decides about these.',
})
