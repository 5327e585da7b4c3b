import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { TextField } from '../../ui/text-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { EnclosureChooser, everyEnclosure } from '../enclosures/index.ts'
import { animalName } from './animal-name.ts'
import { missingAnswer, MoveRuleFields, noAnswer, sentAnswer } from './move-rule-fields.tsx'
import { useMoveAnimal } from './mutations.ts'
import { useMoveAsks } from './use-move-asks.ts'
import { RecordDialog, WhenField } from './record-dialog.tsx'
import { WaterInQuarantine } from './water-in-quarantine.tsx'

/** Moves the whole animal or group. A move that a rule forbids can still be recorded as having happened. */
export function MoveDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const move = useMoveAnimal(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const { data } = useQuery(everyEnclosure)
  const [id] = useState(newId)
  const [to, setTo] = useState<string | null>(null)
  const [reason, setReason] = useState('')
  const [answer, setAnswer] = useState(noAnswer)
  const target = data?.rows.find((row) => row.id === to)
  const { asks, isTold, heed } = useMoveAsks(animal, target)
  const { place } = animal

  const send = async () => {
    if (place === null || to === null || when.instant === null) return
    const happenedAt = when.instant
    const done = await refusal.attempt(() =>
      move
        .mutateAsync({
          id,
          fromEnclosureId: place.id,
          toEnclosureId: to,
          reason: typedText(reason),
          ...sentAnswer(asks, answer),
          happenedAt,
        })
        .catch(heed),
    )
    if (!done) return
    toast({ words: words.moved({ animal: animalName(animal), to: target?.code ?? '' }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.moveQuestion({ animal: animalName(animal) })}
      act={words.recordMove}
      shut={to === null ? words.chooseTo : (missingAnswer(asks, answer) ?? when.missing)}
      busy={refusal.busy}
      refused={refusal.general(['/toEnclosureId', '/happenedAt'])}
      typed={to !== null || reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p>
        {words.moveFrom} <b>{place?.code}</b> <span className="t-2">{place?.name}</span>
      </p>
      <EnclosureChooser
        label={words.moveTo}
        value={to}
        onChange={setTo}
        wrong={refusal.at('/toEnclosureId')}
      />
      <WaterInQuarantine enclosureId={to} own={animal.locks.map((lock) => lock.sourceLabel)} />
      <MoveRuleFields
        animal={animal}
        to={target?.code ?? ''}
        asks={asks}
        isTold={isTold}
        answer={answer}
        onAnswer={setAnswer}
      />
      <TextField
        label={words.moveReason}
        optional
        value={reason}
        maxLength={2000}
        onChange={(event) => setReason(event.target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}
