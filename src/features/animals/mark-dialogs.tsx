import { useState } from 'react'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { identifierKinds } from '../../../shared/domain/animals/description.ts'
import type { IdentifierKind } from '../../../shared/domain/animals/description.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { identifierKindNames } from '../../../shared/messages/animals.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { animalName } from './animal-name.ts'
import { useAddIdentifier, useEndIdentifier } from './mutations.ts'
import { RecordDialog, shortestReason, WhenField } from './record-dialog.tsx'

/** Records a mark put on or read. One that another animal carries is asked back. */
export function MarkDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const add = useAddIdentifier(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [kind, setKind] = useState<IdentifierKind | ''>('')
  const [value, setValue] = useState('')
  const [place, setPlace] = useState('')
  const [twice, setTwice] = useState('')
  const refused = refusal.at('/value')
  const kinds = identifierKinds.filter((one) => animal.form === 'individual' || one !== 'transponder')

  const send = async () => {
    if (kind === '' || when.instant === null) return
    const body = {
      id,
      kind,
      value: value.trim(),
      place: typedText(place),
      readTwiceReason: typedText(twice),
      happenedAt: when.instant,
    }
    if (!(await refusal.attempt(() => add.mutateAsync(body)))) return
    toast({ words: words.markRecorded })
    onBack()
  }

  return (
    <RecordDialog
      question={words.markQuestion({ animal: animalName(animal) })}
      act={words.recordMark}
      shut={kind === '' || value.trim() === '' ? words.chooseMark : when.missing}
      busy={refusal.busy}
      refused={refusal.general(['/value', '/kind', '/happenedAt'])}
      typed={value !== '' || place !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <SelectField
        label={words.markKind}
        options={kinds.map((one) => ({ value: one, label: identifierKindNames[one] }))}
        value={kind}
        wrong={refusal.at('/kind')}
        onChange={(event) => setKind(event.target.value as IdentifierKind | '')}
      />
      <TextField
        label={words.markValue}
        value={value}
        maxLength={100}
        autoComplete="off"
        wrong={refused}
        onChange={(event) => setValue(event.target.value)}
      />
      {refused === undefined ? null : (
        <TextareaField
          label={words.readTwice}
          optional
          rows={2}
          maxLength={2000}
          value={twice}
          onChange={(event) => setTwice(event.target.value)}
        />
      )}
      <TextField
        label={words.markPlace}
        optional
        value={place}
        maxLength={100}
        onChange={(event) => setPlace(event.target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}

/** Says that a mark is no longer on the animal. */
export function EndMarkDialog({
  accession,
  mark,
  onBack,
}: {
  accession: string
  mark: Animal['identifiers'][number]
  onBack: () => void
}) {
  const when = useMoment()
  const end = useEndIdentifier(accession)
  const refusal = useRefusal()
  const toast = useToast()
  const [key] = useState(newId)
  const [reason, setReason] = useState('')

  const send = async () => {
    if (when.instant === null) return
    const body = { reason: reason.trim(), happenedAt: when.instant }
    if (!(await refusal.attempt(() => end.mutateAsync({ recordId: mark.id, key, body })))) return
    toast({ words: words.markRecorded })
    onBack()
  }

  return (
    <RecordDialog
      question={words.endMarkQuestion({ mark: `${identifierKindNames[mark.kind]} ${mark.value}` })}
      act={words.endMark}
      shut={reason.trim().length < shortestReason ? words.typeReason : when.missing}
      busy={refusal.busy}
      refused={refusal.general(['/reason', '/happenedAt'])}
      typed={reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p className="t-2">{words.endMarkHint}</p>
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
