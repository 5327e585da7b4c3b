import { useState } from 'react'
import { BadgeCheck } from 'lucide-react'
import type { ListedParameter, ParameterVersion } from '../../../shared/contracts/caution-rules.contract.ts'
import type { CautionRuleId } from '../../../shared/domain/cautions/caution-rule.ts'
import {
  ruleSheetWords as words,
  thresholdVersionStates,
} from '../../../shared/messages/caution-rules-sheet.ts'
import { sayDate, sayInstant } from '../../../shared/messages/say-date.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { Button } from '../../ui/button.tsx'
import { Facts } from '../../ui/facts.tsx'
import { Tag } from '../../ui/tag.tsx'
import { ConfirmDialog } from './confirm-dialog.tsx'
import { ProposeDialog } from './propose-dialog.tsx'
import { waitingOf } from './rules-model.ts'
import { sayLimits, sayMark } from './threshold-text.ts'

/** One threshold: the value in force and who stands for it, the default and its source, what waits, and what was before. */
export function Threshold({ ruleId, parameter }: { ruleId: CautionRuleId; parameter: ListedParameter }) {
  const { zone } = useMe().facility
  const proposing = useMay('formulary.propose')
  const confirming = useMay('formulary.confirm')
  const [asked, setAsked] = useState<'propose' | 'confirm' | null>(null)
  const waiting = waitingOf(parameter)
  const name = { rule: ruleId, name: parameter.label }
  const inForce = parameter.versions.find(({ state }) => state === 'confirmed')?.confirmation
  return (
    <section className="rule-threshold stack gap-2">
      <h4 className="t-strong">{parameter.label}</h4>
      <Facts
        of={[
          [
            words.inForce,
            <span key="value" className="stack gap-1">
              <span className="row row-wrap gap-2">
                <b data-quantity="dose">{parameter.valueText}</b>
                {parameter.loosened ? <Tag kind="solid">{words.loosened}</Tag> : null}
              </span>
              <span>
                {inForce
                  ? words.confirmedBy({
                      by: inForce.by,
                      on: sayDate(inForce.on),
                      where: inForce.jurisdiction,
                      why: inForce.reason,
                    })
                  : words.notConfirmed}
              </span>
            </span>,
          ],
          [words.defaultIs, parameter.defaultText],
          [words.range, words.rangeIs(sayLimits(parameter))],
          [words.freely, parameter.tighter === 'lower' ? words.freelyLower : words.freelyHigher],
          [words.origin, `${parameter.citation} (${sayMark(parameter.mark)})`],
        ]}
      />
      {waiting ? (
        <p>
          {words.waiting({
            value: waiting.text,
            by: waiting.proposedBy,
            at: sayInstant(waiting.proposedAt, zone),
            why: waiting.reason,
          })}
        </p>
      ) : null}
      {proposing.allowed ? (
        <div className="row row-wrap rule-acts">
          {waiting ? (
            <Button
              size="small"
              icon={BadgeCheck}
              aria-label={words.confirmFor({ ...name, value: waiting.text })}
              shut={confirming.allowed ? false : (confirming.why ?? '')}
              onClick={() => setAsked('confirm')}
            >
              {words.confirm}
            </Button>
          ) : null}
          <Button size="small" aria-label={words.proposeFor(name)} onClick={() => setAsked('propose')}>
            {words.propose}
          </Button>
        </div>
      ) : null}
      {parameter.versions.length > 0 ? (
        <details className="rule-fold">
          <summary>{words.history({ count: parameter.versions.length, name: parameter.label })}</summary>
          <ol className="stack gap-2 rule-history">
            {parameter.versions.map((version) => (
              <Version key={version.id} version={version} zone={zone} />
            ))}
          </ol>
        </details>
      ) : null}
      {asked === 'propose' ? (
        <ProposeDialog ruleId={ruleId} parameter={parameter} onBack={() => setAsked(null)} />
      ) : null}
      {asked === 'confirm' && waiting ? (
        <ConfirmDialog
          ruleId={ruleId}
          parameter={parameter}
          proposal={waiting}
          onBack={() => setAsked(null)}
        />
      ) : null}
    </section>
  )
}

function Version({ version, zone }: { version: ParameterVersion; zone: string }) {
  const { confirmation } = version
  return (
    <li>
      <b data-quantity="dose">{version.text}</b> <Tag>{thresholdVersionStates[version.state]}</Tag>
      <span className="block">
        {words.historyProposed({
          by: version.proposedBy,
          at: sayInstant(version.proposedAt, zone),
          why: version.reason,
        })}
      </span>
      <span className="block">
        {confirmation
          ? words.historyConfirmed({
              by: confirmation.by,
              at: sayInstant(confirmation.at, zone),
              where: confirmation.jurisdiction,
              why: confirmation.reason,
            })
          : words.historyNotConfirmed}
      </span>
      {version.loosens ? <span className="block">{words.historyLoosens}</span> : null}
    </li>
  )
}
