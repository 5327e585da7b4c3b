import type { ClockPolicy } from '../quarantine/clock-policy.ts'

/** What kind of work a step is: look, take a sample, treat, decide, or care. */
export const protocolStepKinds = ['observe', 'sample', 'treat', 'decide', 'husbandry'] as const
export type ProtocolStepKind = (typeof protocolStepKinds)[number]

/** One step of a protocol, by days counted from day 0. */
export interface ProtocolStep {
  /** Unique in its protocol; records of what was done name it. */
  key: string
  kind: ProtocolStepKind
  /** First day on which it is wanted. */
  day: number
  /** Last day of its window; the day itself when there is only one. */
  untilDay: number
  /** Wanted on every day of the window, not once in it. */
  daily: boolean
  /** What is done, as the facility writes it. */
  name: string
  /** The same in two words, for a drawing. */
  short: string
  /** Of a sample: which results it gives. */
  testKey?: string
  /** Of a treatment: whether it hides what the tests look for; it is taken to, unless said otherwise. */
  masks?: boolean
  /** Of a masking treatment: its own window, where a veterinarian set one. */
  maskingWindowDays?: number
  /** Of a treatment left to fade: days until the agent is out of the water. */
  fadingDays?: number
}

/** Everything that one version of a protocol says. Immutable; a change is a new version. */
export interface ProtocolContent {
  policy: ClockPolicy
  steps: readonly ProtocolStep[]
  /** Name of each criterion of the policy, by its id. */
  criterionNames: Readonly<Record<string, string>>
  /** Name of each test, by its key. */
  testNames: Readonly<Record<string, string>>
}
