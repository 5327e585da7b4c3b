import type { SignedBathOrder } from '../../../shared/contracts/signed-order.ts'
import type { SaidCaution } from '../../../shared/contracts/order-primitives.ts'
import { groupSaid } from '../../../shared/domain/cautions/group-said.ts'
import { overrideOf, wasRead } from '../../../shared/domain/orders/signed-answers.ts'
import { orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { cautionKey } from './answers-model.ts'
import { CautionGroupBlock } from '../../ui/caution-block.tsx'

/** Where a caution comes from and what would resolve it, one touch away. */
export function CautionSource({ caution }: { caution: SaidCaution }) {
  if (caution.citations.length === 0 && caution.resolve.length === 0) return null
  return (
    <details>
      <summary>{words.sources}</summary>
      <ul>
        {caution.citations.map((citation) => (
          <li key={citation}>{citation}</li>
        ))}
      </ul>
      {caution.resolve.length > 0 ? (
        <>
          <b>{words.resolve}</b>
          <ul>
            {caution.resolve.map((one) => (
              <li key={one}>{one}</li>
            ))}
          </ul>
        </>
      ) : null}
    </details>
  )
}

/** Cautions as they stood at the signature, with who read or overrode each and why. */
export function SignedCautions({ content, signer }: { content: SignedBathOrder; signer: string }) {
  const answerOf = (caution: SaidCaution) => {
    const override = overrideOf(content.overrides, caution)
    if (override) return words.overridden({ name: signer, reason: override.reason })
    return caution.level === 'warning' && wasRead(content.read, caution)
      ? words.wasRead({ name: signer })
      : undefined
  }
  return (
    <section className="stack">
      <h2 className="t-head">
        {words.cautions} <span className="t-note ml-1">{words.cautionsAtSigning}</span>
      </h2>
      {content.cautions.length === 0 ? <p className="t-2">{words.noCautions}</p> : null}
      {groupSaid(content.cautions).map(({ lead, members }) => (
        <CautionGroupBlock
          key={cautionKey(lead)}
          members={members.map((caution) => ({
            key: cautionKey(caution),
            ruleId: caution.ruleId,
            level: caution.level,
            title: caution.title,
            source: <CautionSource caution={caution} />,
            answer: answerOf(caution),
            children: `${caution.text}${caution.secondCalculation ? ` ${words.secondPerson}` : ''}`,
          }))}
        />
      ))}
    </section>
  )
}
