import type {
  ClockDecisionDue,
  ClockExtension,
  LockCause,
  UnmetCriterion,
} from '../domain/quarantine/case-clock.ts'
import type { ClockRefusal } from '../domain/quarantine/prepare-cases.ts'
import type { QuarantineKind } from '../domain/quarantine/quarantine-kind.ts'
import { counted, defineMessages } from './define-messages.ts'

export const quarantineKindWords = defineMessages({
  fish: 'fish',
  amphibian: 'amphibian',
  reptile: 'reptile',
  bird: 'bird',
  mammal: 'mammal',
  invertebrate: 'invertebrate',
} satisfies Record<QuarantineKind, string>)

export const lockCauseWords = defineMessages({
  positive: 'positive result',
  'notifiable-suspicion': 'suspicion of a notifiable disease',
  veterinarian: 'by a veterinarian',
  held: 'held',
  recall: 'recall',
} satisfies Record<LockCause, string>)

export const extensionKindWords = defineMessages({
  death: 'unexplained death',
  signs: 'new clinical signs',
  masking: 'treatment that can hide what the tests look for',
  'not-feeding': 'not feeding by half way',
  positive: 'positive result',
} satisfies Record<ClockExtension['kind'], string>)

interface UnmetParams {
  requiredDays: number
  daysLeft: number
  untilOn: string
  otherCaseId: string
  criterionId: string
  count: number
  wanted: number
  earliestSampleOn: string
  kind: string
}

/** Why as many negatives as are wanted can still not be enough. */
export const tooSoonAfterMasking =
  ', the last taken too soon after a treatment that can hide what the test looks for'

/** What is missing for clearance; each is one line of the checklist. Dates and names come in already written out. */
export const unmetWords = defineMessages({
  'not-closed': () => 'The batch is still open: close it when the last of it is in.',
  locked: () => 'The case is locked. A veterinarian has to lift the lock first.',
  'locked-shared-water': (p) =>
    `Locked with ${p.otherCaseId}, whose water it shared. A veterinarian has to lift the lock first.`,
  held: () => 'The case is held. A veterinarian has to lift the hold first.',
  'length-not-reached': (p) =>
    `${counted(p.requiredDays, 'day', 'days')} plus what was paused: until ${p.untilOn}, ${counted(p.daysLeft, 'day', 'days')} to run.`,
  'extension-running': (p) =>
    p.untilOn === ''
      ? `Extended (${p.kind}) until a veterinarian ends it.`
      : `Extended (${p.kind}) until ${p.untilOn}.`,
  'pause-running': () => 'The clock stands still at present.',
  'negatives-missing': (p) =>
    `${p.criterionId}: ${p.count} of ${p.wanted}${p.count < p.wanted ? '' : tooSoonAfterMasking}.${p.earliestSampleOn === '' ? '' : ` A sample taken on ${p.earliestSampleOn} or later can complete it.`}`,
  'not-declared': (p) => `${p.criterionId}: nobody has declared it met.`,
} satisfies Record<UnmetCriterion['code'], (params: UnmetParams) => string>)

/** What waits for a decision, as worklist lines. */
export const clockDecisionWords = defineMessages({
  exposure: 'Cleared animals were exposed: decide on a new case, or give the reason why not',
  recall: 'Recalled after clearance: decide what follows',
  'repeat-sample': 'Repeat the sample: the last one gave no answer',
  'positive-untreated': 'Positive result without a treatment: decide what follows',
} satisfies Record<ClockDecisionDue['code'], string>)

/** Refusals of the clock; only the last two can come from what a person typed. */
export const clockRefusalWords = defineMessages({
  'not-an-instant': 'A time of this case is not readable.',
  'unknown-zone': 'The facility’s time zone is not known.',
  'unknown-case': 'An event belongs to no case that was asked for.',
  'duplicate-case': 'A case was asked for twice.',
  'policy-not-whole-days': 'Days of a protocol are whole numbers, 0 or more.',
  'sample-taken-after-report': 'A sample can’t have been taken after its result was reported.',
} satisfies Record<ClockRefusal, string>)
