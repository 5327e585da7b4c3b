import { useState } from 'react'
import { useQueryClient } from '@tanstack/react-query'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { enterAndSend, refusalOf } from '../../lib/enter-and-send.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { stopEntries } from '../../lib/stop-entries.ts'
import { typedText } from '../../lib/typed-text.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'

/** Holds the order at once, with a signal or without; a reason is welcome and not needed. */
export function HoldDialog({ number, now, onBack }: { number: string; now: string; onBack: () => void }) {
  const me = useMe()
  const client = useQueryClient()
  const [busy, setBusy] = useState(false)
  const [refused, setRefused] = useState<string>()
  const say = useToast()
  const [given] = useState(() => ({ id: newId(), happenedAt: now }))
  const [reason, setReason] = useState('')
  const send = async () => {
    const typed = typedText(reason)
    const body = { ...given, ...(typed === undefined ? {} : { reason: typed }) }
    setBusy(true)
    const fate = await enterAndSend(client, stopEntries.holdOrder(me.id, number, body), [[]])
    setBusy(false)
    if (fate === 'refused') return setRefused(refusalOf(given.id))
    say({ words: fate === 'kept' ? words.keptHold : words.heldNow })
    onBack()
  }
  return (
    <Dialog
      question={words.holdQuestion({ number })}
      typed={reason !== ''}
      onBack={onBack}
      acts={
        <>
          <Button kind="hold" size="touch" disabled={busy} onClick={() => void send()}>
            {words.holdAct}
          </Button>
          <Button size="touch" onClick={onBack}>
            {words.holdBack}
          </Button>
        </>
      }
    >
      <div className="stack">
        <p>{words.holdBody}</p>
        <WrongSummary fields={[]} general={refused} />
        <TextareaField
          label={words.holdReason}
          optional
          rows={2}
          maxLength={2000}
          value={reason}
          onChange={(event) => setReason(event.target.value)}
        />
      </div>
    </Dialog>
  )
}
