import { useState } from 'react'
import type { Observation } from '../../../shared/contracts/observations.contract.ts'
import { sayObservation } from '../../../shared/messages/observations.ts'
import { observationForms as words, caseForms } from '../../../shared/messages/quarantine-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { RecordDialog, shortestReason } from '../animals/index.ts'
import { useStrikeObservation } from './mutations.ts'

/** Strikes out an observation that was made by mistake, and says beforehand what of it stays. */
export function StrikeObservationDialog({
  observation,
  onBack,
}: {
  observation: Observation
  onBack: () => void
}) {
  const strike = useStrikeObservation(observation.id)
  const refusal = useRefusal()
  const toast = useToast()
  const [key] = useState(newId)
  const [reason, setReason] = useState('')

  const send = async () => {
    if (!(await refusal.attempt(() => strike.mutateAsync({ reason: reason.trim(), key })))) return
    toast({ words: words.observationStruck })
    onBack()
  }

  return (
    <RecordDialog
      question={words.strikeQuestion({ enclosure: observation.enclosure })}
      act={words.strikeOut}
      shut={reason.trim().length < shortestReason ? caseForms.typeReason : undefined}
      busy={refusal.busy}
      refused={refusal.general(['/reason'])}
      typed={reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p>
        <b>{sayObservation(observation).join('. ')}.</b>
      </p>
      <p className="t-2">{words.strikeHint}</p>
      <TextareaField
        label={caseForms.reason}
        rows={2}
        maxLength={2000}
        value={reason}
        wrong={refusal.at('/reason')}
        onChange={(event) => setReason(event.target.value)}
      />
    </RecordDialog>
  )
}
