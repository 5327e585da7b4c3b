import { useState } from 'react'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { foodAnswers } from '../../../shared/domain/animals/food-or-release.ts'
import type { FoodAnswer } from '../../../shared/domain/animals/food-or-release.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { SelectField } from '../../ui/select-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { animalName } from './animal-name.ts'
import { useSayFoodOrRelease } from './mutations.ts'
import { RecordDialog, shortestReason, WhenField } from './record-dialog.tsx'

const answerWords = () => ({ yes: words.foodYes, no: words.foodNo })

/** Says whether an animal or group may be eaten or set free; nothing is chosen beforehand. */
export function FoodDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const say = useSayFoodOrRelease(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [answer, setAnswer] = useState<FoodAnswer | ''>('')
  const [reason, setReason] = useState('')

  const send = async () => {
    if (answer === '' || when.instant === null) return
    const body = { id, answer, reason: reason.trim(), happenedAt: when.instant }
    if (!(await refusal.attempt(() => say.mutateAsync(body)))) return
    toast({ words: words.foodRecorded })
    onBack()
  }

  return (
    <RecordDialog
      question={words.foodQuestion({ animal: animalName(animal) })}
      act={words.recordFood}
      shut={
        answer === ''
          ? words.chooseFood
          : reason.trim().length < shortestReason
            ? words.typeReason
            : when.missing
      }
      busy={refusal.busy}
      refused={refusal.general(['/reason', '/happenedAt'])}
      typed={answer !== '' || reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p className="t-2">{words.foodHint}</p>
      <SelectField
        label={words.foodAnswer}
        options={foodAnswers.map((one) => ({ value: one, label: answerWords()[one] }))}
        value={answer}
        onChange={(event) => setAnswer(event.target.value as FoodAnswer | '')}
      />
      <TextareaField
        label={words.reason}
        rows={2}
        maxLength={2000}
        value={reason}
        wrong={refusal.at('/reason')}
        onChange={(event) => setReason(event.target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}
