import { useState } from 'react'
import { PenLine, Play, Printer } from 'lucide-react'
import type { Order } from '../../../shared/contracts/orders.contract.ts'
import { orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { useMay } from '../../lib/may.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button, buttonClass, ButtonFace } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useDiscontinue, useHoldOrder, useLiftHold } from './mutations.ts'
import { printAddress } from './queries.ts'

const over = new Set<Order['phase']>(['completed', 'expired', 'discontinued'])

/** What can be done with a signed order. Holding is one touch and never shut by a permission. */
export function OrderActs({ order, version }: { order: Order; version: number }) {
  const print = useMay('order.print')
  const amend = useMay('order.amend')
  const hold = useMay('order.hold')
  const ended = over.has(order.phase)
  return (
    <section className="stack">
      <h2 className="t-head">{words.acts}</h2>
      {print.allowed ? (
        <a
          className={buttonClass({})}
          href={printAddress(order.number, version)}
          download={`${order.number}.pdf`}
        >
          <ButtonFace icon={Printer}>{words.print}</ButtonFace>
        </a>
      ) : (
        <Button icon={Printer} shut={print.why ?? ''}>
          {words.print}
        </Button>
      )}
      {amend.allowed && !ended && order.draft === null ? (
        <ButtonLink icon={PenLine} to={paths.editOrder(order.number)}>
          {words.amend}
        </ButtonLink>
      ) : (
        <Button icon={PenLine} shut={amend.why ?? (ended ? words.ended : words.hasDraft)}>
          {words.amend}
        </Button>
      )}
      {order.phase === 'held' ? <LiftHold order={order} /> : null}
      {hold.allowed && order.phase !== 'held' && !ended ? <Hold order={order} /> : null}
      <Discontinue order={order} ended={order.phase === 'discontinued' || order.phase === 'completed'} />
    </section>
  )
}

function Hold({ order }: { order: Order }) {
  const [reason, setReason] = useState('')
  const [id, setId] = useState(newId)
  const hold = useHoldOrder(order.number)
  const refusal = useRefusal()
  const say = useToast()
  const send = async () => {
    const done = await refusal.attempt(() =>
      hold.mutateAsync({
        id,
        happenedAt: new Date().toISOString(),
        ...(reason.trim() ? { reason: reason.trim() } : {}),
      }),
    )
    if (!done) return
    setId(newId())
    setReason('')
    say({ words: words.held })
  }
  return (
    <div className="stack">
      <Button kind="hold" size="touch" block disabled={refusal.busy} onClick={() => void send()}>
        {words.hold}
      </Button>
      <TextField
        label={words.holdReason}
        optional
        hint={words.holdNeedsNone}
        value={reason}
        maxLength={2000}
        wrong={refusal.at('/reason')}
        onChange={(event) => setReason(event.target.value)}
      />
      <WrongSummary fields={[]} general={refusal.general(['/reason'])} />
    </div>
  )
}

function LiftHold({ order }: { order: Order }) {
  const may = useMay('hold.lift')
  const lift = useLiftHold(order.number)
  const [key, setKey] = useState<string | null>(null)
  const say = useToast()
  return (
    <>
      <Button icon={Play} shut={may.allowed ? false : (may.why ?? '')} onClick={() => setKey(newId())}>
        {words.lift}
      </Button>
      {key === null ? null : (
        <ReasonDialog
          question={words.liftQuestion({ number: order.number })}
          body={words.liftBody}
          label={words.liftReason}
          act={words.lift}
          back={words.liftBack}
          onBack={() => setKey(null)}
          onAct={async (reason) => {
            await lift.mutateAsync({ reason, key })
            setKey(null)
            say({ words: words.lifted })
          }}
        />
      )}
    </>
  )
}

function Discontinue({ order, ended }: { order: Order; ended: boolean }) {
  const may = useMay('order.discontinue')
  const discontinue = useDiscontinue(order.number)
  const [key, setKey] = useState<string | null>(null)
  const say = useToast()
  return (
    <>
      <Button
        icon={null}
        shut={may.allowed ? ended && words.ended : (may.why ?? '')}
        onClick={() => setKey(newId())}
      >
        {words.discontinue}
      </Button>
      {key === null ? null : (
        <ReasonDialog
          question={words.discontinueQuestion({ number: order.number })}
          body={words.discontinueBody}
          label={words.discontinueReason}
          act={words.discontinue}
          back={words.discontinueBack}
          onBack={() => setKey(null)}
          onAct={async (reason) => {
            await discontinue.mutateAsync({ reason, key })
            setKey(null)
            say({ words: words.discontinued })
          }}
        />
      )}
    </>
  )
}
