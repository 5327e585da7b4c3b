import { useState } from 'react'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { basisNames } from '../../../shared/messages/animals.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { Stepper } from '../../ui/stepper.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { animalName } from './animal-name.ts'
import { useAdjustCount, useRecordBirths, useStateCount } from './mutations.ts'
import { RecordDialog, shortestReason, WhenField } from './record-dialog.tsx'
import { wholeNumber } from './whole-number.ts'

/** States what was counted or estimated; the ledger stays as it is. */
export function CountDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const state = useStateCount(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [basis, setBasis] = useState<'counted' | 'estimated' | null>(null)
  const [low, setLow] = useState('')
  const [high, setHigh] = useState('')
  const [note, setNote] = useState('')
  const figures = { low: wholeNumber(low), high: basis === 'counted' ? wholeNumber(low) : wholeNumber(high) }

  const send = async () => {
    if (basis === null || figures.low === null || figures.high === null || when.instant === null) return
    const body = {
      id,
      basis,
      low: figures.low,
      high: figures.high,
      note: typedText(note),
      happenedAt: when.instant,
    }
    if (!(await refusal.attempt(() => state.mutateAsync(body)))) return
    toast({ words: words.countRecorded })
    onBack()
  }

  return (
    <RecordDialog
      question={words.countQuestion({ animal: animalName(animal) })}
      act={words.recordCount}
      shut={
        basis === null
          ? words.chooseCountBasis
          : figures.low === null || figures.high === null
            ? words.typeCount
            : when.missing
      }
      busy={refusal.busy}
      refused={refusal.general(['/low', '/high', '/happenedAt'])}
      typed={low !== '' || note !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p className="t-2">{words.countHint}</p>
      <ChoiceField
        label={words.countBasis}
        segments={[
          { value: 'counted', label: basisNames.counted },
          { value: 'estimated', label: basisNames.estimated },
        ]}
        value={basis}
        onChange={setBasis}
      />
      {basis === null ? null : (
        <TextField
          label={basis === 'counted' ? words.countAll : words.countLow}
          inputMode="numeric"
          autoComplete="off"
          value={low}
          wrong={refusal.at('/low')}
          onChange={(event) => setLow(event.target.value)}
        />
      )}
      {basis === 'estimated' ? (
        <TextField
          label={words.countHigh}
          inputMode="numeric"
          autoComplete="off"
          value={high}
          wrong={refusal.at('/high')}
          onChange={(event) => setHigh(event.target.value)}
        />
      ) : null}
      <TextField
        label={words.note}
        optional
        value={note}
        maxLength={2000}
        onChange={(event) => setNote(event.target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}

/** Records young that were born or hatched into a group. */
export function BirthsDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const record = useRecordBirths(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [count, setCount] = useState<number | null>(null)
  const [note, setNote] = useState('')

  const send = async () => {
    if (!count || when.instant === null) return
    const body = { id, count, note: typedText(note), happenedAt: when.instant }
    if (!(await refusal.attempt(() => record.mutateAsync(body)))) return
    toast({ words: words.birthsRecorded({ count }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.birthsQuestion({ animal: animalName(animal) })}
      act={words.recordBirths}
      shut={!count ? words.chooseCount : when.missing}
      busy={refusal.busy}
      refused={refusal.general(['/happenedAt'])}
      typed={count !== null || note !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <Stepper label={words.birthsCount} value={count} onChange={setCount} />
      <TextField
        label={words.note}
        optional
        value={note}
        maxLength={2000}
        onChange={(event) => setNote(event.target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}

/** Adjusts the ledger, with a reason that stays on the record. */
export function AdjustDialog({ animal, onBack }: { animal: Animal; onBack: () => void }) {
  const when = useMoment()
  const adjust = useAdjustCount(animal.accession)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [by, setBy] = useState('')
  const [reason, setReason] = useState('')
  const delta = wholeNumber(by)

  const send = async () => {
    if (!delta || when.instant === null) return
    const body = { id, delta, reason: reason.trim(), happenedAt: when.instant }
    let ledger = 0
    const done = await refusal.attempt(async () => {
      ledger = (await adjust.mutateAsync(body)).count.ledger
    })
    if (!done) return
    toast({ words: words.adjusted({ count: ledger }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.adjustQuestion({ animal: animalName(animal) })}
      act={words.recordAdjust}
      shut={
        !delta ? words.adjustWrong : reason.trim().length < shortestReason ? words.typeReason : when.missing
      }
      busy={refusal.busy}
      refused={refusal.general(['/delta', '/reason', '/happenedAt'])}
      typed={by !== '' || reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <TextField
        label={words.adjustBy}
        hint={words.adjustHint}
        inputMode="numeric"
        autoComplete="off"
        value={by}
        wrong={refusal.at('/delta')}
        onChange={(event) => setBy(event.target.value)}
      />
      <TextareaField
        label={words.reason}
        hint={words.reasonHint}
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
