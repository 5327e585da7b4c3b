import { useState } from 'react'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useHold } from './mutations.ts'

/** Holds the order at once; a reason is welcome and not needed. */
export function HoldDialog({ number, now, onBack }: { number: string; now: string; onBack: () => void }) {
  const hold = useHold(number)
  const refusal = useRefusal()
  const say = useToast()
  const [given] = useState(() => ({ id: newId(), happenedAt: now }))
  const [reason, setReason] = useState('')
  const send = async () => {
    const typed = typedText(reason)
    const body = { ...given, ...(typed === undefined ? {} : { reason: typed }) }
    if (!(await refusal.attempt(() => hold.mutateAsync(body)))) return
    say({ words: words.heldNow })
    onBack()
  }
  return (
    <Dialog
      question={words.holdQuestion({ number })}
      typed={reason !== ''}
      onBack={onBack}
      acts={
        <>
          <Button kind="hold" size="touch" disabled={refusal.busy} onClick={() => void send()}>
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
        <WrongSummary fields={[]} general={refusal.general([])} />
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
