import { useState } from 'react'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { birthKinds, lifeStages, sexes } from '../../../shared/domain/animals/description.ts'
import type { BirthKind, LifeStage, Sex } from '../../../shared/domain/animals/description.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { animalWords } from '../../../shared/messages/animal-sheet.ts'
import { sexNames, stageNames } from '../../../shared/messages/animals.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { typedText } from '../../lib/typed-text.ts'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { animalName } from './animal-name.ts'
import { TaxonChooser } from './choose-taxon.tsx'
import { useDescribeAnimal } from './mutations.ts'
import { RecordDialog, WhenField } from './record-dialog.tsx'

const birthNames = () => ({
  hatched: animalWords.hatched,
  born: animalWords.bornKind,
  propagated: animalWords.propagated,
})

/** Says who an animal is from an instant on; what was said before stays readable. */
export function DescribeDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const describe = useDescribeAnimal(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const [taxonId, setTaxonId] = useState<string | null>(animal.taxon.id)
  const [name, setName] = useState(animal.name ?? '')
  const [sex, setSex] = useState<Sex>(animal.sex)
  const [stage, setStage] = useState<LifeStage>(animal.stage)
  const [birthKind, setBirthKind] = useState<BirthKind | ''>(animal.birth?.kind ?? '')
  const [birthDate, setBirthDate] = useState(animal.birth?.date ?? '')
  const [about, setAbout] = useState(animal.birth?.approximate ?? false)
  const [reason, setReason] = useState('')

  const send = async () => {
    if (taxonId === null || when.instant === null) return
    const body = {
      expectedVersion: animal.version,
      taxonId,
      name: typedText(name) ?? null,
      sex,
      stage,
      birth: birthKind === '' ? null : { kind: birthKind, date: birthDate.trim(), approximate: about },
      reason: typedText(reason),
      happenedAt: when.instant,
    }
    if (!(await refusal.attempt(() => describe.mutateAsync(body)))) return
    toast({ words: words.described })
    onBack()
  }

  return (
    <RecordDialog
      question={words.describeQuestion({ animal: animalName(animal) })}
      act={words.describe}
      shut={when.missing}
      busy={refusal.busy}
      refused={refusal.general(['/taxonId', '/name', '/birth/date', '/happenedAt'])}
      typed={reason !== '' || name !== (animal.name ?? '')}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <TaxonChooser
        label={words.taxon}
        value={taxonId}
        onChange={setTaxonId}
        wrong={refusal.at('/taxonId')}
      />
      <TextField
        label={words.name}
        optional
        value={name}
        maxLength={100}
        wrong={refusal.at('/name')}
        onChange={(event) => setName(event.target.value)}
      />
      <SelectField
        label={words.sex}
        startsEmpty={false}
        options={sexes.map((value) => ({ value, label: sexNames[value] }))}
        value={sex}
        onChange={(event) => setSex(event.target.value as Sex)}
      />
      <SelectField
        label={words.stage}
        startsEmpty={false}
        options={lifeStages.map((value) => ({ value, label: stageNames[value] }))}
        value={stage}
        onChange={(event) => setStage(event.target.value as LifeStage)}
      />
      <SelectField
        label={words.birth}
        startsEmpty={false}
        options={[
          { value: '', label: words.nothingKnown },
          ...birthKinds.map((value) => ({ value, label: birthNames()[value] })),
        ]}
        value={birthKind}
        onChange={(event) => setBirthKind(event.target.value as BirthKind | '')}
      />
      {birthKind === '' ? null : (
        <>
          <TextField
            label={words.birthDate}
            hint={words.birthDateHint}
            value={birthDate}
            wrong={refusal.at('/birth/date')}
            onChange={(event) => setBirthDate(event.target.value)}
          />
          <Tick
            label={words.birthAbout}
            checked={about}
            onChange={(event) => setAbout(event.target.checked)}
          />
        </>
      )}
      <TextField
        label={words.reason}
        optional
        value={reason}
        maxLength={2000}
        onChange={(event) => setReason(event.target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}
