import { useState } from 'react'
import { useQueryClient } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { Copy, PenLine, Play, Printer, Tag } from 'lucide-react'
import type { Order } from '../../../shared/contracts/orders.contract.ts'
import { orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { useMay } from '../../lib/may.ts'
import { enterAndSend, refusalOf } from '../../lib/enter-and-send.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { stopEntries, useUnsent } from '../../lib/stop-entries.ts'
import { typedText } from '../../lib/typed-text.ts'
import { Button, buttonClass, ButtonFace } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { fieldsOfOrder } from './copied-order.ts'
import { useDiscontinue, useLiftHold } from './mutations.ts'
import { labelAddress, printAddress } from './queries.ts'

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
      {print.allowed && order.record === 'intact' ? (
        <a
          className={buttonClass({})}
          href={labelAddress(order.number)}
          download={`${order.number}-label.pdf`}
        >
          <ButtonFace icon={Tag}>{words.printLabel}</ButtonFace>
        </a>
      ) : (
        <Button icon={Tag} shut={print.why ?? words.labelNotIntact}>
          {words.printLabel}
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
      <CopyOrder order={order} />
      {order.phase === 'held' ? <LiftHold order={order} /> : null}
      {hold.allowed && order.phase !== 'held' && !ended ? <Hold order={order} /> : null}
      <Discontinue order={order} ended={order.phase === 'discontinued' || order.phase === 'completed'} />
    </section>
  )
}

/** A new order that begins as this one; nothing of this one changes. */
function CopyOrder({ order }: { order: Order }) {
  const draft = useMay('order.draft')
  if (fieldsOfOrder(order) === null) return null
  return draft.allowed ? (
    <ButtonLink icon={Copy} to={paths.copyOrder(order.number)}>
      {words.copy}
    </ButtonLink>
  ) : (
    <Button icon={Copy} shut={draft.why ?? ''}>
      {words.copy}
    </Button>
  )
}

/** One touch, with a signal or without: it is kept on the device first. */
function Hold({ order }: { order: Order }) {
  const me = useMe()
  const client = useQueryClient()
  const [reason, setReason] = useState('')
  const [busy, setBusy] = useState(false)
  const [refused, setRefused] = useState<string>()
  const unsent = useUnsent({ number: order.number })
  const say = useToast()
  const send = async () => {
    const id = newId()
    const typed = typedText(reason)
    const body = {
      id,
      happenedAt: new Date().toISOString(),
      ...(typed === undefined ? {} : { reason: typed }),
    }
    setBusy(true)
    const fate = await enterAndSend(client, stopEntries.holdOrder(me.id, order.number, body), [[]])
    setBusy(false)
    setRefused(fate === 'refused' ? refusalOf(id) : undefined)
    if (fate === 'refused') return
    setReason('')
    say({ words: fate === 'kept' ? words.heldHere : words.held })
  }
  return (
    <div className="stack">
      <Button kind="hold" size="touch" block disabled={busy} onClick={() => void send()}>
        {words.hold}
      </Button>
      <TextField
        label={words.holdReason}
        optional
        hint={words.holdNeedsNone}
        value={reason}
        maxLength={2000}
        onChange={(event) => setReason(event.target.value)}
      />
      <WrongSummary fields={[]} general={refused} />
      {unsent === null ? null : (
        <p role="status" className="t-strong">
          {words.heldHere} <Link to={paths.unsent()}>{words.toUnsent}</Link>
        </p>
      )}
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
