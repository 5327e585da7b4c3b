import { useRef, useState } from 'react'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { todayWords } from '../../../shared/messages/today.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { useStopBath } from './mutations.ts'

/**
 * Ends a bath from the worklist: no password, no reason. It asks once, because here a finger may land on the wrong
 * line; the sheet at the tank stops without asking.
 */
export function StopBathDialog({ item, onBack }: { item: TodayWork; onBack: () => void }) {
  const stop = useStopBath()
  const toast = useToast()
  const refusal = useRefusal()
  const id = useRef(newId())
  const [seen, setSeen] = useState('')
  const enclosure = String(item.params['enclosure'])
  const send = async () => {
    const sent = await refusal.attempt(() =>
      stop.mutateAsync({
        doseId: String(item.params['doseId']),
        id: id.current,
        happenedAt: new Date().toISOString(),
        seen: seen.trim(),
      }),
    )
    if (!sent) return
    toast({ words: todayWords.stopped({ enclosure }) })
    onBack()
  }
  const wrong = refusal.general([])
  return (
    <Dialog
      question={todayWords.stopQuestion({ enclosure })}
      onBack={onBack}
      acts={
        <>
          <Button kind="stop" shut={refusal.busy && formWords.sending} onClick={() => void send()}>
            {todayWords.stop}
          </Button>
          <Button onClick={onBack}>{todayWords.keepOn}</Button>
        </>
      }
    >
      <p>{todayWords.stopBody}</p>
      {wrong === undefined ? null : <p role="alert">{wrong}</p>}
      <TextareaField
        label={todayWords.stopSeen}
        value={seen}
        onChange={(event) => setSeen(event.target.value)}
      />
    </Dialog>
  )
}
