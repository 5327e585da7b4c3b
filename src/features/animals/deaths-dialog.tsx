import { useState } from 'react'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { carcassPlaces, carcassStates, deathKinds } from '../../../shared/domain/animals/description.ts'
import type { CarcassPlace, CarcassState, DeathKind } from '../../../shared/domain/animals/description.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { carcassPlaceNames, carcassStateNames, deathKindNames } from '../../../shared/messages/animals.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { Stepper } from '../../ui/stepper.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { animalName } from './animal-name.ts'
import { useRecordDeaths } from './mutations.ts'
import { RecordDialog, WhenField } from './record-dialog.tsx'

/** Records deaths as they were seen; more than the ledger has is kept, and said so before it is sent. */
export function DeathsDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const record = useRecordDeaths(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const isGroup = animal.form === 'group'
  const name = animalName(animal)
  const [id] = useState(newId)
  const [kind, setKind] = useState<DeathKind | null>(null)
  const [count, setCount] = useState<number | null>(isGroup ? null : 1)
  const [state, setState] = useState<CarcassState | ''>('')
  const [place, setPlace] = useState<CarcassPlace | ''>('')
  const [note, setNote] = useState('')

  const send = async () => {
    if (kind === null || !count || when.instant === null) return
    const happenedAt = when.instant
    let excess = 0
    const done = await refusal.attempt(async () => {
      const death = await record.mutateAsync({
        id,
        kind,
        count,
        carcassState: state || undefined,
        carcassPlace: place || undefined,
        note: typedText(note),
        happenedAt,
      })
      excess = death.excessCount
    })
    if (!done) return
    toast({
      words: [
        isGroup ? words.deathsRecorded({ count, animal: name }) : words.deathRecorded({ animal: name }),
        excess > 0 ? words.deathsExcess({ excess }) : '',
      ]
        .filter(Boolean)
        .join('. '),
    })
    onBack()
  }

  return (
    <RecordDialog
      question={isGroup ? words.deathsQuestion({ animal: name }) : words.deathQuestion({ animal: name })}
      act={isGroup ? words.recordDeaths : words.recordDeath}
      shut={!count ? words.chooseCount : kind === null ? words.chooseDeath : when.missing}
      busy={refusal.busy}
      refused={refusal.general(['/happenedAt', '/count'])}
      typed={kind !== null || note !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      {isGroup ? (
        <Stepper
          label={words.deathCount}
          value={count}
          onChange={setCount}
          wrong={refusal.at('/count')}
          hint={
            count !== null && count > animal.count.ledger
              ? words.moreThanLedger({ ledger: animal.count.ledger })
              : undefined
          }
        />
      ) : null}
      <ChoiceField
        label={words.deathKind}
        segments={deathKinds.map((value) => ({ value, label: deathKindNames[value] }))}
        value={kind}
        onChange={setKind}
      />
      <SelectField
        label={words.carcassState}
        optional
        options={carcassStates.map((value) => ({ value, label: carcassStateNames[value] }))}
        value={state}
        onChange={(event) => setState(event.target.value as CarcassState | '')}
      />
      <SelectField
        label={words.carcassPlace}
        optional
        options={carcassPlaces.map((value) => ({ value, label: carcassPlaceNames[value] }))}
        value={place}
        onChange={(event) => setPlace(event.target.value as CarcassPlace | '')}
      />
      <TextareaField
        label={words.deathNote}
        optional
        rows={2}
        value={note}
        maxLength={2000}
        onChange={(event) => setNote(event.target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}
