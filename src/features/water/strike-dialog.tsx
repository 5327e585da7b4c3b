import { useState } from 'react'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'

const shortestReason = 3

/** Asks for the reason of striking a record through or withdrawing a volume, and does it once. */
export function StrikeDialog({
  question = waterWords.strikeQuestion,
  hint = waterWords.strikeHint,
  act = waterWords.strike,
  onStrike,
  onBack,
}: {
  question?: string
  hint?: string
  act?: string
  /** `key` stays the same when it has to be sent again. */
  onStrike: (given: { reason: string; key: string }) => Promise<unknown>
  onBack: () => void
}) {
  const [key] = useState(newId)
  const [reason, setReason] = useState('')
  const [refused, setRefused] = useState<string>()
  const short = reason.trim().length < shortestReason

  const strike = async () => {
    try {
      await onStrike({ reason: reason.trim(), key })
      onBack()
    } catch (error) {
      if (!isProblem(error)) throw error
      setRefused(error.says)
    }
  }

  return (
    <Dialog
      question={question}
      onBack={onBack}
      typed={reason !== ''}
      acts={
        <>
          <Button kind="primary" shut={short && waterWords.typeReason} onClick={() => void strike()}>
            {act}
          </Button>
          <Button onClick={onBack}>{waterWords.back}</Button>
        </>
      }
    >
      <div className="stack">
        <WrongSummary fields={[]} general={refused} />
        <p className="t-2">{hint}</p>
        <TextareaField
          label={waterWords.reason}
          value={reason}
          maxLength={2000}
          onChange={(event) => setReason(event.target.value)}
        />
      </div>
    </Dialog>
  )
}
