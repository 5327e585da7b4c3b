import { OctagonX } from 'lucide-react'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { groupSaid } from '../../../shared/domain/cautions/group-said.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { overrideWords, sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { orderViewWords } from '../../../shared/messages/orders-screens.ts'
import { sayDoNotDose } from '../../../shared/messages/record-fault.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { CautionBlock, CautionGroupBlock } from '../../ui/caution-block.tsx'
import { Facts } from '../../ui/facts.tsx'
import { Icon } from '../../ui/icon.tsx'
import { PairOfAmounts } from '../../ui/pair-of-amounts.tsx'
import { WorkingBlock } from '../../ui/working-block.tsx'
import { DoseText } from '../orders/index.ts'
import { OverrideAct } from './override-dialog.tsx'
import { contactOf, isBroken, otherCautions } from './sheet-model.ts'

/** When the bath is stopped at once: on the sheet from the first look to the last. */
export function StopCriteria({ sheet }: { sheet: BathSheet }) {
  return (
    <CautionBlock level="stop" title={words.stopIf}>
      {sheet.stopIf}
    </CautionBlock>
  )
}

/** Until when nobody stays where formalin went in; nothing once it is over. */
export function ReentryNote({ sheet, zone }: { sheet: BathSheet; zone: string }) {
  const { reentry } = sheet
  if (!reentry) return null
  return (
    <CautionBlock level="warning" title={words.reentry}>
      {words.reentryText({ place: reentry.place, until: sayMoment(reentry.until, zone, sheet.now) })}
    </CautionBlock>
  )
}

/** Held, ended or broken: said plainly, by whom, and what one may still do. */
export function Standing({ sheet, zone }: { sheet: BathSheet; zone: string }) {
  const { standing } = sheet
  const broken = isBroken(sheet)
  if (!standing && !broken) return null
  const kind = standing?.kind
  const heading = broken
    ? words.isBroken
    : kind === 'held'
      ? words.isHeld
      : kind === 'discontinued'
        ? words.isDiscontinued
        : kind === 'expired'
          ? words.isExpired
          : words.isCompleted
  return (
    <section className="sheet-standing" role="status">
      <h2 className="t-head row">
        {kind === 'completed' && !broken ? null : <Icon of={OctagonX} size={20} />}
        {heading}
      </h2>
      {standing?.by && standing.at ? (
        <p>{words.standingBy({ by: standing.by, at: sayMoment(standing.at, zone, sheet.now) })}</p>
      ) : null}
      {standing?.reason ? <p>{words.standingReason({ reason: standing.reason })}</p> : null}
      {broken ? <p>{sayDoNotDose(sheet.recordFault)}</p> : kind === 'held' ? <p>{words.liftBy}</p> : null}
      {kind === 'completed' && !broken ? null : <p>{words.still}</p>}
    </section>
  )
}

const isToCome = (state: BathSheet['calendar'][number]['state']) =>
  state === 'coming' || state === 'due' || state === 'late'

/** What goes into which water, for how long and how; no amount. */
export function WhatGoesIn({ sheet, zone }: { sheet: BathSheet; zone: string }) {
  const at = (instant: string) => sayMoment(instant, zone, sheet.now)
  const own = sheet.calendar.find((dose) => dose.key === sheet.key)
  const contact = contactOf(sheet)
  return (
    <section className="stack">
      <h2 className="t-head">{sheet.drug}</h2>
      <Facts
        of={[
          ...(sheet.productName === '' ? [] : [[words.product, sheet.productName] as const]),
          ...(sheet.targetText === '' ? [] : [[words.target, sheet.targetText] as const]),
          ...(contact === 'unknown'
            ? []
            : [
                [
                  words.contact,
                  contact === 'left-in' ? words.leftIn : formatDose(contact, 'min').text,
                ] as const,
              ]),
          ...(own
            ? [
                [
                  isToCome(own.state) ? words.due : words.planned,
                  words.dueText({ at: at(own.dueAt), from: at(own.opensAt), until: at(own.latestAt) }),
                ] as const,
              ]
            : []),
          ...(sheet.instructions === '' ? [] : [[words.how, sheet.instructions] as const]),
        ]}
      />
    </section>
  )
}

/** The signed amount and the one for the water now, never as one number, and the working of the second. */
export function Amounts({ sheet }: { sheet: BathSheet }) {
  const { signedAmountText, amountNowText, driftPercent, driftWithin } = sheet
  const percent = formatDose(Number(Math.abs(driftPercent ?? 0).toFixed(1)), 'percent').text
  const moved = driftPercent !== null && Math.abs(driftPercent) >= 0.05
  const reason = !moved
    ? signedAmountText === amountNowText
      ? words.noDrift
      : words.driftOther
    : driftWithin
      ? words.driftWithin({ percent })
      : words.driftOutside({ percent })
  return (
    <section className="stack">
      <h2 className="t-head">{words.amount}</h2>
      {sheet.blind ? (
        <>
          <p>{words.amountLater}</p>
          {driftPercent === null ? null : <p className="t-2">{reason}</p>}
        </>
      ) : amountNowText === null ? (
        <p className="t-strong">{words.amountNone}</p>
      ) : (
        <div className="sheet-amounts">
          <PairOfAmounts
            signed={<DoseText text={signedAmountText ?? ''} />}
            signedWords={words.amountSigned}
            recomputed={<DoseText text={amountNowText} />}
            recomputedWords={words.amountNow}
            reason={reason}
          />
        </div>
      )}
      {sheet.working.length > 0 ? (
        <WorkingBlock
          label={words.working}
          rows={sheet.working.map((line, i) => ({
            key: String(i),
            what: line.label,
            formula: line.shown,
            result: line.result,
            kind: i === sheet.working.length - 1 ? 'sum' : 'line',
          }))}
        />
      ) : null}
      {sheet.roundingText === null ? null : <p className="t-note">{sheet.roundingText}</p>}
    </section>
  )
}

/** Cautions that fire now and that no step speaks of, the gravest first. */
export function CautionsNow({ sheet }: { sheet: BathSheet }) {
  const cautions = otherCautions(sheet)
  if (cautions.length === 0) return null
  return (
    <section className="stack">
      <h2 className="t-head">{words.cautions}</h2>
      {groupSaid(cautions).map(({ lead, members }) => (
        <CautionGroupBlock
          key={keyOf(lead)}
          members={members.map((caution) => ({
            key: keyOf(caution),
            ruleId: caution.ruleId,
            level: caution.level,
            title: caution.title,
            answer: caution.overridden
              ? orderViewWords.overridden({ name: caution.overridden.by, reason: caution.overridden.reason })
              : undefined,
            children: (
              <>
                {[caution.text, ...(caution.overridden ? [] : caution.resolve)].join(' ')}
                <OverrideAct sheet={sheet} stop={caution} />
              </>
            ),
          }))}
        />
      ))}
    </section>
  )
}

const keyOf = ({ ruleId, text }: BathSheet['cautions'][number]) => `${ruleId} ${text}`

/** Stops that a veterinarian overrode for this dose, with the reason as it was signed. */
export function SignedOverrides({ sheet, zone }: { sheet: BathSheet; zone: string }) {
  if (sheet.overrides.length === 0) return null
  return (
    <section className="stack">
      <h2 className="t-head">{overrideWords.heading}</h2>
      {sheet.overrides.map(({ id, title, text, reason, signature }) => (
        <CautionBlock
          key={id}
          level="stop"
          title={title}
          answer={
            signature.state === 'intact'
              ? orderViewWords.overridden({
                  name: overrideWords.signedAt({
                    name: signature.printedName,
                    at: sayMoment(signature.signedAt, zone, sheet.now),
                  }),
                  reason,
                })
              : overrideWords.broken
          }
        >
          {text}
        </CautionBlock>
      ))}
    </section>
  )
}
