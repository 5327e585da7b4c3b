import type { CautionRule } from '../../../shared/contracts/caution-rules.contract.ts'
import { cautionEffectWords, orderRouteWords } from '../../../shared/messages/caution-reasons.ts'
import { ruleSheetWords as words } from '../../../shared/messages/caution-rules-sheet.ts'
import { cautionLevelWords, cautionStageWords } from '../../../shared/messages/cautions.ts'
import { Facts } from '../../ui/facts.tsx'
import { Tag } from '../../ui/tag.tsx'
import { waitingCount } from './rules-model.ts'
import { Threshold } from './threshold.tsx'
import { sayMark } from './threshold-text.ts'

/** A code in words; one that this version has no words for stands as it is. */
const inWords = (codes: readonly string[], names: Readonly<Record<string, string>>) =>
  codes.map((code) => (Object.hasOwn(names, code) ? (names[code] ?? code) : code)).join(', ')

/** One rule, folded to what it asks and how grave it is; unfolded to all of it. */
export function RuleSection({ rule, open }: { rule: CautionRule; open: boolean }) {
  const waits = waitingCount(rule)
  return (
    <details className="rule rule-fold" open={open}>
      <summary>
        <h2 className="t-head">
          {rule.ruleId} {rule.asks}
        </h2>
        <span className="row row-wrap gap-2">
          {rule.levels.map((level) => (
            <Tag key={level} kind={level === 'stop' ? 'solid' : 'plain'}>
              {cautionLevelWords[level]}
            </Tag>
          ))}
          <span className="t-2">
            {cautionStageWords[rule.when]} ·{' '}
            {rule.overridable ? words.overridableInShort : words.notOverridableInShort}
          </span>
          {waits > 0 ? <Tag>{words.waitsInShort({ count: waits })}</Tag> : null}
          {rule.parameters.some(({ loosened }) => loosened) ? <Tag kind="solid">{words.loosened}</Tag> : null}
        </span>
      </summary>
      <div className="rule-body stack gap-4">
        <p>{rule.reason}</p>
        <Facts
          of={[
            [words.level, rule.levels.map((level) => cautionLevelWords[level]).join(', ')],
            [words.when, cautionStageWords[rule.when]],
            [words.override, rule.overridable ? words.overridable : words.notOverridable],
            [words.routes, inWords(rule.routes, orderRouteWords)],
            ...(rule.effects.length > 0
              ? ([[words.effects, inWords(rule.effects, cautionEffectWords)]] as const)
              : []),
            [
              words.sources,
              <ul key="sources">
                {rule.sources.map(({ source, citation, mark }) => (
                  <li key={source}>{words.sourceAndMark({ citation, mark: sayMark(mark) })}</li>
                ))}
              </ul>,
            ],
          ]}
        />
        <section className="stack gap-2">
          <h3 className="t-strong">{words.findings}</h3>
          <ul className="rule-findings stack gap-2">
            {rule.findings.map(({ code, title, resolvedBy }) => (
              <li key={code}>
                <b>{title}</b> <span className="t-2">{words.resolves}</span>
                <ul>
                  {resolvedBy.map((one) => (
                    <li key={one.code}>{one.text}</li>
                  ))}
                </ul>
              </li>
            ))}
          </ul>
        </section>
        <section className="stack gap-3">
          <h3 className="t-strong">{words.thresholds}</h3>
          {rule.parameters.length === 0 ? <p className="t-2">{words.noThresholds}</p> : null}
          {rule.parameters.map((parameter) => (
            <Threshold key={parameter.key} ruleId={rule.ruleId} parameter={parameter} />
          ))}
        </section>
      </div>
    </details>
  )
}
