import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { Stepper } from '../../ui/stepper.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { EnclosureChooser, everyEnclosure } from '../enclosures/index.ts'
import { animalName } from './animal-name.ts'
import { missingAnswer, MoveRuleFields, noAnswer, sentAnswer } from './move-rule-fields.tsx'
import { useSplitGroup } from './mutations.ts'
import { useMoveAsks } from './use-move-asks.ts'
import { RecordDialog, WhenField } from './record-dialog.tsx'

/** Takes one animal, or part of a group, out under a number of its own. */
export function SplitDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const split = useSplitGroup(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const { data } = useQuery(everyEnclosure)
  const [id] = useState(newId)
  const [form, setForm] = useState<'individual' | 'group' | null>(null)
  const [some, setSome] = useState<number | null>(null)
  const [to, setTo] = useState<string | null>(animal.place?.id ?? null)
  const [name, setName] = useState('')
  const [reason, setReason] = useState('')
  const [answer, setAnswer] = useState(noAnswer)
  const target = data?.rows.find((row) => row.id === to)
  const stays = to === animal.place?.id
  const { isTold, heed, ...rule } = useMoveAsks(animal, target)
  const asks = stays ? 'nothing' : rule.asks
  const count = form === 'individual' ? 1 : some

  const send = async () => {
    if (form === null || !count || to === null || when.instant === null) return
    const happenedAt = when.instant
    let accession = ''
    const done = await refusal.attempt(async () => {
      const reply = await split
        .mutateAsync({
          id,
          form,
          count,
          toEnclosureId: to,
          name: typedText(name),
          reason: typedText(reason),
          ...sentAnswer(asks, answer),
          happenedAt,
        })
        .catch(heed)
      accession = reply.into.accession
    })
    if (!done) return
    toast({ words: words.splitDone({ count, accession }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.splitQuestion({ animal: animalName(animal) })}
      act={words.recordSplit}
      shut={
        form === null
          ? words.chooseForm
          : !count
            ? words.chooseCount
            : to === null
              ? words.chooseTo
              : (missingAnswer(asks, answer) ?? when.missing)
      }
      busy={refusal.busy}
      refused={refusal.general(['/count', '/toEnclosureId', '/happenedAt'])}
      typed={form !== null || name !== '' || reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p className="t-2">{words.splitHint}</p>
      <ChoiceField
        label={words.splitForm}
        segments={[
          { value: 'individual', label: words.splitOne },
          { value: 'group', label: words.splitGroup },
        ]}
        value={form}
        onChange={setForm}
      />
      {form === 'group' ? (
        <Stepper
          label={words.splitCount}
          value={some}
          onChange={setSome}
          max={animal.count.ledger}
          wrong={refusal.at('/count')}
        />
      ) : null}
      <EnclosureChooser
        label={words.splitTo}
        value={to}
        onChange={setTo}
        wrong={refusal.at('/toEnclosureId')}
      />
      <MoveRuleFields
        animal={animal}
        to={target?.code ?? ''}
        asks={asks}
        isTold={isTold}
        answer={answer}
        onAnswer={setAnswer}
      />
      <TextField
        label={words.splitName}
        optional
        value={name}
        maxLength={100}
        onChange={(event) => setName(event.target.value)}
      />
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
