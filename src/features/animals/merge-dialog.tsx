import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { Stepper } from '../../ui/stepper.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { animalName, countText } from './animal-name.ts'
import { useMergeGroup } from './mutations.ts'
import { animalListQuery } from './queries.ts'
import { RecordDialog, WhenField } from './record-dialog.tsx'

/** Puts an animal or group into another group of its taxon in the same enclosure. */
export function MergeDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const merge = useMergeGroup(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [into, setInto] = useState('')
  const [how, setHow] = useState<'all' | 'some' | null>(animal.form === 'individual' ? 'all' : null)
  const [some, setSome] = useState<number | null>(null)
  const [reason, setReason] = useState('')
  const groups = useQuery(
    animalListQuery({ taxonId: animal.taxon.id, place: animal.place?.code, form: 'group', limit: 100 }),
  )
  const choices = (groups.data?.rows ?? []).filter((row) => row.id !== animal.id)

  const send = async () => {
    if (into === '' || when.instant === null) return
    const happenedAt = when.instant
    let ledger = 0
    const done = await refusal.attempt(async () => {
      const count = how === 'some' ? (some ?? undefined) : undefined
      const reply = await merge.mutateAsync({ id, into, count, reason: typedText(reason), happenedAt })
      ledger = reply.into.count.ledger
    })
    if (!done) return
    toast({ words: words.mergeDone({ accession: into, count: ledger }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.mergeQuestion({ animal: animalName(animal) })}
      act={words.recordMerge}
      shut={
        into === ''
          ? words.chooseInto
          : how === null || (how === 'some' && !some)
            ? words.chooseCount
            : when.missing
      }
      busy={refusal.busy}
      refused={refusal.general(['/into', '/count', '/happenedAt'])}
      typed={into !== '' || reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      {groups.data && choices.length === 0 ? <p>{words.mergeNone}</p> : null}
      {choices.length > 0 ? (
        <SelectField
          label={words.mergeInto}
          options={choices.map((row) => ({
            value: row.accession,
            label: `${row.accession}, ${row.name ?? row.taxon.commonName}, ${countText(row.count)}`,
          }))}
          value={into}
          wrong={refusal.at('/into')}
          onChange={(event) => setInto(event.target.value)}
        />
      ) : null}
      {animal.form === 'group' ? (
        <ChoiceField
          label={words.mergeCount}
          segments={[
            { value: 'all', label: words.mergeAll },
            { value: 'some', label: words.mergeSome },
          ]}
          value={how}
          onChange={setHow}
        />
      ) : null}
      {how === 'some' ? (
        <Stepper
          label={words.splitCount}
          value={some}
          onChange={setSome}
          max={animal.count.ledger}
          wrong={refusal.at('/count')}
        />
      ) : null}
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
