import { useState } from 'react'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { basisNames } from '../../../shared/messages/animals.ts'
import { newId } from '../../lib/new-id.ts'
import { usePreference } from '../../lib/preferences.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { Stepper } from '../../ui/stepper.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { animalName } from './animal-name.ts'
import { useRecordWeight } from './mutations.ts'
import { RecordDialog, shortestReason, WhenField } from './record-dialog.tsx'
import { judgeTypedWeight, weighUnits } from './weigh-form-model.ts'
import { shownMassUnit } from './weight-text.ts'

/** Records a weight. One that is hard to believe is asked back here, before it is sent, and by the server again. */
export function WeighDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const record = useRecordWeight(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const preferred = usePreference('massUnit')
  const [id] = useState(newId)
  const [weight, setWeight] = useState(() => ({
    value: '',
    unit: shownMassUnit(animal.newestWeight?.unit ?? animal.weightBand?.unit ?? 'kg', preferred),
  }))
  const [together, setTogether] = useState<number | null>(animal.form === 'group' ? null : 1)
  const [basis, setBasis] = useState<'measured' | 'estimated' | null>(null)
  const [method, setMethod] = useState('')
  const [confirmed, setConfirmed] = useState('')
  const judged = judgeTypedWeight(animal, weight, together ?? 1)
  const asked = refusal.at('/weight') ?? judged.asks
  const unconfirmed = judged.asks !== undefined && confirmed.trim().length < shortestReason

  const shut =
    weight.value.trim() === ''
      ? words.typeWeight
      : together === null || together < 1
        ? words.chooseCount
        : basis === null
          ? words.chooseBasis
          : unconfirmed
            ? words.typeReason
            : when.missing

  const send = async () => {
    if (basis === null || when.instant === null || together === null) return
    const happenedAt = when.instant
    const done = await refusal.attempt(() =>
      record.mutateAsync({
        id,
        weight,
        animalsWeighed: together,
        basis,
        method: typedText(method),
        confirmedReason: asked === undefined ? undefined : typedText(confirmed),
        happenedAt,
      }),
    )
    if (!done) return
    toast({ words: words.weightRecorded({ weight: judged.text, animal: animalName(animal) }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.weighQuestion({ animal: animalName(animal) })}
      act={asked === undefined ? words.recordWeight : words.recordAnyway}
      shut={shut}
      busy={refusal.busy}
      refused={refusal.general(['/weight', '/happenedAt', '/animalsWeighed'])}
      typed={weight.value !== '' || method !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      {animal.form === 'group' ? (
        <Stepper
          label={words.together}
          value={together}
          onChange={setTogether}
          wrong={refusal.at('/animalsWeighed')}
        />
      ) : null}
      <QuantityField
        label={animal.form === 'group' ? words.weightTogether : words.weight}
        units={weighUnits}
        quantity={weight}
        onChange={(next) => setWeight({ value: next.value, unit: shownMassUnit(next.unit, undefined) })}
        hint={judged.ofOne === undefined ? judged.range : words.ofOne({ weight: judged.ofOne })}
        wrong={asked}
      />
      {asked === undefined ? null : (
        <TextareaField
          label={words.confirm}
          hint={words.confirmHint}
          value={confirmed}
          maxLength={2000}
          rows={2}
          onChange={(event) => setConfirmed(event.target.value)}
        />
      )}
      <ChoiceField
        label={words.basis}
        segments={[
          { value: 'measured', label: basisNames.measured },
          { value: 'estimated', label: basisNames.estimated },
        ]}
        value={basis}
        onChange={setBasis}
      />
      <TextField
        label={words.method}
        optional
        hint={words.methodHint}
        value={method}
        maxLength={200}
        onChange={(event) => setMethod(event.target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}
