import type { OrderPreview } from '../../../shared/contracts/orders.contract.ts'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import { orderViewWords } from '../../../shared/messages/orders-screens.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { DoseText } from './dose-text.tsx'

/** The amount of an order that is being written, or what has to be done before there is one. */
export function PreviewHead({
  preview,
  current,
  error,
}: {
  preview: OrderPreview | undefined
  /** What is shown belongs to what is typed. */
  current: boolean
  error: Error | null
}) {
  const { amount, refusal, water } = preview ?? {}
  return (
    <div className="dose-head">
      <div aria-live="polite" aria-busy={!current && preview !== undefined}>
        <p>{amount ? words.amount : orderViewWords.noAmount}</p>
        {amount ? (
          <p>
            <DoseText text={amount.text} size="dose" />
          </p>
        ) : null}
        {amount?.measured === null ? <p>{words.unrounded({ amount: amount.text })}</p> : null}
        {!amount ? (
          <p className="dose-drug">{refusal ? refusal.detail : words.noEnclosure}</p>
        ) : (
          <p>{orderViewWords.routeText}</p>
        )}
        {error ? (
          <p className="t-strong">
            {words.notJudged} {isProblem(error) ? error.says : ''} {words.notJudgedKept}
          </p>
        ) : preview && !current ? (
          <p>{words.old}</p>
        ) : null}
      </div>
      {water ? (
        <div>
          {water.volumeText === null ? null : (
            <p>
              <DoseText text={water.volumeText} kind="volume" size="mid" />
            </p>
          )}
          <p>{orderViewWords.volume({ code: water.enclosureCode })}</p>
          <p>{water.volumeNote}</p>
        </div>
      ) : null}
    </div>
  )
}
