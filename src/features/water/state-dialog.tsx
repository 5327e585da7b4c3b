import { useState } from 'react'
import type { ReactNode } from 'react'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { MomentAndNote } from './moment-and-note.tsx'

/** What a dialog about a valve or machine sends. The id stays the same when it has to be sent again. */
export interface StateEntry {
  id: string
  happenedAt: string
  note: string | null
}

/**
 * Asks when something was opened, shut or switched, and records it. It opens on now; nothing else is said for a person.
 *
 * @param question "Shut V-32?"
 * @param act      "Shut"
 */
export function StateDialog({
  question,
  act,
  shut,
  withNote = true,
  children,
  onRecord,
  onBack,
}: {
  question: string
  act: string
  /** What has to be said first, besides the time. */
  shut?: string | undefined
  withNote?: boolean
  children?: ReactNode
  onRecord: (entry: StateEntry) => Promise<unknown>
  onBack: () => void
}) {
  const when = useMoment()
  const [id] = useState(newId)
  const [note, setNote] = useState('')
  const [busy, setBusy] = useState(false)
  const [refused, setRefused] = useState<string>()

  const record = async () => {
    if (when.instant === null) return
    setBusy(true)
    try {
      await onRecord({ id, happenedAt: when.instant, note: note.trim() || null })
      onBack()
    } catch (error) {
      setRefused(isProblem(error) ? error.says : undefined)
      setBusy(false)
      if (!isProblem(error)) throw error
    }
  }

  return (
    <Dialog
      question={question}
      onBack={onBack}
      typed={note !== ''}
      acts={
        <>
          <Button kind="primary" disabled={busy} shut={shut ?? when.missing} onClick={() => void record()}>
            {act}
          </Button>
          <Button onClick={onBack}>{waterWords.back}</Button>
        </>
      }
    >
      <div className="stack">
        <WrongSummary fields={[]} general={refused} />
        {children}
        <MomentAndNote
          inWords={when.inWords}
          moment={when.moment}
          onMoment={when.setMoment}
          momentWrong={when.missing}
          {...(withNote ? { note, onNote: setNote } : {})}
        />
      </div>
    </Dialog>
  )
}
