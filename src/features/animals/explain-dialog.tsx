import { useState } from 'react'
import type { Discrepancy } from '../../../shared/contracts/animals.contract.ts'
import { discrepancyOutcomes } from '../../../shared/domain/animals/discrepancy.ts'
import type { DiscrepancyOutcome } from '../../../shared/domain/animals/discrepancy.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { SelectField } from '../../ui/select-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { sayDiscrepancy } from './say-discrepancy.ts'
import { useResolveDiscrepancy } from './mutations.ts'
import { RecordDialog, shortestReason } from './record-dialog.tsx'

/** Explains a discrepancy; correcting the count writes what the ledger had missed. */
export function ExplainDialog({ discrepancy, onBack }: { discrepancy: Discrepancy; onBack: () => void }) {
  const resolve = useResolveDiscrepancy()
  const refusal = useRefusal()
  const toast = useToast()
  const [key] = useState(newId)
  const [outcome, setOutcome] = useState<DiscrepancyOutcome | ''>('')
  const [reason, setReason] = useState('')
  const counts = discrepancy.kind === 'more-than-counted' || discrepancy.kind === 'count-differs'
  const outcomes = discrepancyOutcomes.filter((one) => counts || one !== 'count-corrected')

  const send = async () => {
    if (outcome === '') return
    const body = { outcome, reason: reason.trim() }
    if (!(await refusal.attempt(() => resolve.mutateAsync({ recordId: discrepancy.id, key, body })))) return
    toast({ words: words.explanationRecorded })
    onBack()
  }

  return (
    <RecordDialog
      question={words.explainQuestion}
      act={words.recordExplanation}
      shut={
        outcome === ''
          ? words.chooseOutcome
          : reason.trim().length < shortestReason
            ? words.typeReason
            : undefined
      }
      busy={refusal.busy}
      refused={refusal.general(['/outcome', '/reason'])}
      typed={reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p>{sayDiscrepancy(discrepancy)}</p>
      <SelectField
        label={words.outcome}
        options={outcomes.map((value) => ({ value, label: words[value] }))}
        value={outcome}
        wrong={refusal.at('/outcome')}
        onChange={(event) => setOutcome(event.target.value as DiscrepancyOutcome | '')}
      />
      <TextareaField
        label={words.reason}
        hint={words.reasonHint}
        rows={3}
        maxLength={2000}
        value={reason}
        wrong={refusal.at('/reason')}
        onChange={(event) => setReason(event.target.value)}
      />
    </RecordDialog>
  )
}
