import { useState } from 'react'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { useStrike } from './mutations.ts'
import type { StrikeKind } from './mutations.ts'
import { RecordDialog, shortestReason } from './record-dialog.tsx'

export interface ToStrike {
  kind: StrikeKind
  recordId: string
  /** What it says, for the question. */
  what: string
}

/** Strikes a line out; it stays readable. */
export function StrikeDialog({
  accession,
  line,
  onBack,
}: {
  accession: string
  line: ToStrike
  onBack: () => void
}) {
  const strike = useStrike(accession)
  const refusal = useRefusal()
  const toast = useToast()
  const [key] = useState(newId)
  const [reason, setReason] = useState('')

  const send = async () => {
    const { kind, recordId } = line
    const done = await refusal.attempt(() =>
      strike.mutateAsync({ kind, recordId, reason: reason.trim(), key }),
    )
    if (!done) return
    toast({ words: words.struck })
    onBack()
  }

  return (
    <RecordDialog
      question={words.strikeQuestion}
      act={words.strikeOut}
      shut={reason.trim().length < shortestReason ? words.typeReason : undefined}
      busy={refusal.busy}
      refused={refusal.general(['/reason'])}
      typed={reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p>
        <b>{line.what}</b>
      </p>
      <p className="t-2">{words.strikeHint}</p>
      <TextareaField
        label={words.reason}
        rows={2}
        maxLength={2000}
        value={reason}
        wrong={refusal.at('/reason')}
        onChange={(event) => setReason(event.target.value)}
      />
    </RecordDialog>
  )
}
