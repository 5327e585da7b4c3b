import type { RuleFirings } from '../../../shared/contracts/caution-firings.contract.ts'

interface FiringRow {
  month: string
  rule: RuleFirings
  reason: string | null
  times: number | null
}

/** A row for each reason of a rule, and one for a rule that was never overridden. */
export const firingRows = (month: string, rules: readonly RuleFirings[]): FiringRow[] =>
  rules.flatMap((rule): FiringRow[] =>
    rule.reasons.length === 0
      ? [{ month, rule, reason: null, times: null }]
      : rule.reasons.map(({ reason, times }) => ({ month, rule, reason, times })),
  )

/** Codes, not words, so that a program can read the file. */
export const firingsCsvColumns: readonly {
  header: string
  value: (row: FiringRow) => string | number | null
}[] = [
  { header: 'month', value: ({ month }) => month },
  { header: 'rule', value: ({ rule }) => rule.ruleId },
  { header: 'asks', value: ({ rule }) => rule.asks },
  { header: 'fired', value: ({ rule }) => rule.fired },
  { header: 'overridden', value: ({ rule }) => rule.overridden },
  { header: 'more_than_half', value: ({ rule }) => (rule.isOften ? 'yes' : 'no') },
  { header: 'reason', value: ({ reason }) => reason },
  { header: 'times', value: ({ times }) => times },
]
