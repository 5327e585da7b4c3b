import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { caseWords as words } from '../../../shared/messages/quarantine-case.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Conditions } from '../../ui/condition-row.tsx'
import type { Condition } from '../../ui/condition-row.tsx'
import { sayUnmet } from './clock-sentences.ts'
import { hasEnded } from './passage-of-case.ts'

/** Everything that has to be true before clearance, met and unmet, each with what is known of it now. */
export function clearanceConditions(detail: CaseDetail): Condition[] {
  const { names } = detail
  const criteriaShown = new Set(['negatives-missing', 'not-declared'])
  const criteria = detail.criteria.map((one): Condition => {
    const known = [
      one.wanted > 0
        ? words.criterionCount({ count: one.count, wanted: one.wanted, met: one.met })
        : one.met
          ? ''
          : words.criterionDeclared,
      one.metOn ? words.criterionMetOn({ on: sayDate(one.metOn) }) : '',
      !one.met && one.earliestSampleOn ? words.earliestSample({ on: sayDate(one.earliestSampleOn) }) : '',
    ]
    return {
      key: one.criterionId,
      state: one.met ? 'met' : 'open',
      what: one.name,
      known: known.filter(Boolean).join('; '),
    }
  })
  const unmet = detail.unmet
    .filter(({ code }) => !criteriaShown.has(code))
    .map((one, i): Condition => ({
      key: `${one.code} ${String(i)}`,
      state: 'open',
      what: sayUnmet(one, names),
    }))
  const lengthMet = detail.day0On !== null && !detail.unmet.some(({ code }) => code === 'length-not-reached')
  return [
    ...(lengthMet
      ? [{ key: 'length', state: 'met' as const, what: words.lengthMet({ days: detail.requiredDays }) }]
      : []),
    ...criteria,
    ...unmet,
    ...(detail.openDiscrepancies > 0
      ? [
          {
            key: 'discrepancies',
            state: 'open' as const,
            what: words.discrepancies({ count: detail.openDiscrepancies }),
            known: words.discrepanciesKnown,
          },
        ]
      : []),
  ]
}

/** The list of conditions, and the way to the signature for who may clear. */
export function BeforeClearance({
  of: detail,
  whyNot,
}: {
  of: CaseDetail
  /** Why this person can't clear; undefined when they may. */
  whyNot: string | undefined
}) {
  if (hasEnded(detail)) return null
  const ready = detail.readyToClear && detail.openDiscrepancies === 0
  const fixed = detail.unmet.some(({ overridable }) => !overridable) || detail.openDiscrepancies > 0
  const face = ready ? words.clear : words.clearAgainst({ count: detail.unmet.length })
  const why = whyNot ?? (fixed ? words.cannotClear : undefined)
  return (
    <div className="stack">
      <Conditions heading={words.before} conditions={clearanceConditions(detail)} />
      {ready ? <p className="t-2">{words.nothingUnmet}</p> : null}
      {why === undefined ? (
        <ButtonLink kind={ready ? 'clear' : 'edge'} to={paths.clearCase(detail.number)}>
          {face}
        </ButtonLink>
      ) : (
        <Button shut={why}>{fixed ? words.clear : face}</Button>
      )}
      {why === undefined && !ready ? <p className="t-note">{words.clearHint}</p> : null}
    </div>
  )
}
