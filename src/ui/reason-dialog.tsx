import { useState } from 'react'
import { formWords } from '../../shared/messages/form.ts'
import { Button } from './button.tsx'
import { Dialog } from './dialog.tsx'
import { TextareaField } from './textarea-field.tsx'

const shortest = 3

/**
 * A question that needs a reason in words before the act: voiding, striking out, explaining. What went wrong is said
 * in the dialog, and what was typed stays.
 *
 * @param onAct does it; a refusal it throws is shown by its `says`
 */
export function ReasonDialog({
  question,
  body,
  label,
  act,
  back,
  onAct,
  onBack,
}: {
  question: string
  body: string
  label: string
  act: string
  back: string
  onAct: (reason: string) => Promise<void>
  onBack: () => void
}) {
  const [reason, setReason] = useState('')
  const [wrong, setWrong] = useState<string>()
  const [busy, setBusy] = useState(false)
  const send = async () => {
    if (reason.trim().length < shortest) return setWrong(formWords.needed)
    setBusy(true)
    try {
      await onAct(reason.trim())
    } catch (error) {
      const { says } = error as { says?: string }
      if (says === undefined) throw error
      setWrong(says)
    } finally {
      setBusy(false)
    }
  }
  return (
    <Dialog
      question={question}
      typed={reason !== ''}
      onBack={onBack}
      acts={
        <>
          <Button kind="primary" shut={busy && formWords.sending} onClick={() => void send()}>
            {act}
          </Button>
          <Button onClick={onBack}>{back}</Button>
        </>
      }
    >
      <p>{body}</p>
      <TextareaField
        label={label}
        value={reason}
        wrong={wrong}
        onChange={(event) => {
          setReason(event.target.value)
          setWrong(undefined)
        }}
      />
    </Dialog>
  )
}
