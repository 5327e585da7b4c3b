import { useState } from 'react'
import { useQueryClient } from '@tanstack/react-query'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { todayWords } from '../../../shared/messages/today.ts'
import { enterAndSend, refusalOf } from '../../lib/enter-and-send.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { stopEntries } from '../../lib/stop-entries.ts'
import { typedText } from '../../lib/typed-text.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'

/**
 * Ends a bath from the worklist: no password, no reason. It asks once, because here a finger may land on the wrong
 * line; the sheet at the tank stops without asking.
 */
export function StopBathDialog({ item, onBack }: { item: TodayWork; onBack: () => void }) {
  const me = useMe()
  const client = useQueryClient()
  const toast = useToast()
  const [given] = useState(() => ({ id: newId(), happenedAt: new Date().toISOString() }))
  const [busy, setBusy] = useState(false)
  const [refused, setRefused] = useState<string>()
  const [seen, setSeen] = useState('')
  const enclosure = String(item.params['enclosure'])
  const send = async () => {
    const typed = typedText(seen)
    setBusy(true)
    const fate = await enterAndSend(
      client,
      stopEntries.stopBath(me.id, enclosure, String(item.params['doseId']), {
        ...given,
        cause: 'stopped',
        ...(typed === undefined ? {} : { seen: typed }),
      }),
      [[]],
    )
    setBusy(false)
    if (fate === 'refused') return setRefused(refusalOf(given.id))
    toast({ words: fate === 'kept' ? todayWords.stopKept : todayWords.stopped({ enclosure }) })
    onBack()
  }
  return (
    <Dialog
      question={todayWords.stopQuestion({ enclosure })}
      onBack={onBack}
      acts={
        <>
          <Button kind="stop" shut={busy && formWords.sending} onClick={() => void send()}>
            {todayWords.stop}
          </Button>
          <Button onClick={onBack}>{todayWords.keepOn}</Button>
        </>
      }
    >
      <p>{todayWords.stopBody}</p>
      {refused === undefined ? null : <p role="alert">{refused}</p>}
      <TextareaField
        label={todayWords.stopSeen}
        value={seen}
        onChange={(event) => setSeen(event.target.value)}
      />
    </Dialog>
  )
}
