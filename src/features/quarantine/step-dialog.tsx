import { useState } from 'react'
import type { CaseStepView } from '../../../shared/contracts/quarantine-primitives.ts'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { RecordDialog, WhenField } from '../animals/index.ts'
import { useRecordStep } from './mutations.ts'

/** Records that a step of the protocol was done, or tried in vain. */
export function StepDialog({
  number,
  step,
  onBack,
}: {
  number: string
  step: CaseStepView
  onBack: () => void
}) {
  const when = useMoment()
  const record = useRecordStep(number)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [outcome, setOutcome] = useState<'done' | 'failed' | null>(null)
  const [note, setNote] = useState('')

  const send = async () => {
    if (outcome === null || when.instant === null) return
    const body = { id, stepKey: step.key, outcome, happenedAt: when.instant, note: typedText(note) }
    if (!(await refusal.attempt(() => record.mutateAsync(body)))) return
    toast({ words: words.recorded({ number }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.stepQuestion({ step: step.name })}
      act={words.stepAct}
      shut={outcome === null ? words.chooseKind : when.missing}
      busy={refusal.busy}
      refused={refusal.general(['/happenedAt'])}
      typed={outcome !== null || note !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <ChoiceField
        label={words.stepOutcome}
        segments={[
          { value: 'done', label: words.stepDone },
          { value: 'failed', label: words.stepFailed },
        ]}
        value={outcome}
        onChange={setOutcome}
      />
      <TextareaField
        label={words.stepNote}
        optional
        value={note}
        maxLength={2000}
        rows={2}
        onChange={({ target }) => setNote(target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}
