import type { OrderPreview } from '../../../shared/contracts/orders.contract.ts'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import { orderViewWords } from '../../../shared/messages/orders-screens.ts'
import { Button } from '../../ui/button.tsx'
import { DoseText } from './dose-text.tsx'
import { cautionCount } from './judged-cautions.tsx'

/** On narrow screens: the amount stays in sight, with the way to where it is signed. */
export function OrderFormFoot({
  preview,
  mayScrollTo,
  proposal,
}: {
  preview: OrderPreview | undefined
  /** Id of the signature. */
  mayScrollTo: string
  proposal: boolean
}) {
  return (
    <div className="order-foot">
      <span>
        {preview?.amount ? <DoseText text={preview.amount.text} size="strong" /> : orderViewWords.noAmount}
        {preview?.amount ? <span className="t-note block">{cautionCount(preview.cautions)}</span> : null}
      </span>
      <Button
        kind="primary"
        onClick={() => {
          const block = document.getElementById(mayScrollTo)
          block?.scrollIntoView({ block: 'center' })
          block?.focus({ preventScroll: true })
        }}
      >
        {proposal ? words.toProposal : words.toSignature}
      </Button>
    </div>
  )
}
