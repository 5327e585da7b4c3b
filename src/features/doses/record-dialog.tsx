import { useState } from 'react'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { isBeforeStart } from '../../../shared/domain/dose/is-before-start.ts'
import { recordWords as words } from '../../../shared/messages/doses-screens.ts'
import { instantOfMoment } from '../../lib/local-moment.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { MomentField } from '../../ui/moment-field.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { lotLabel } from './first-calculation.tsx'
import { useRecordDose, useStopBath } from './mutations.ts'
import { amountUnits } from './sheet-model.ts'

type Kind = 'recorded' | 'withheld' | 'refused'

/** Records what happened with its own time, and the end of the bath where it has ended. Never refused for its content. */
export function RecordDialog({ sheet, now, onBack }: { sheet: BathSheet; now: string; onBack: () => void }) {
  const { number, key } = sheet
  const units = amountUnits(sheet)
  const when = useMoment(now)
  const record = useRecordDose({ number, key })
  const stop = useStopBath()
  const refusal = useRefusal()
  const say = useToast()
  const [ids] = useState(() => ({ dose: newId(), stop: newId() }))
  const [kind, setKind] = useState<Kind | null>(null)
  const [amount, setAmount] = useState({ value: '', unit: units[0] ?? 'g' })
  const [lotId, setLotId] = useState('')
  const [ended, setEnded] = useState('')
  const [note, setNote] = useState('')
  const wasGiven = kind === 'recorded'
  const asksEnd = wasGiven && sheet.contactMinutes !== null
  const endedAt = asksEnd && ended !== '' ? instantOfMoment(ended, when.zone) : null

  const send = async () => {
    if (kind === null || when.instant === null) return
    const happenedAt = when.instant
    const typed = typedText(note)
    const done = await refusal.attempt(async () => {
      await record.mutateAsync({
        id: ids.dose,
        kind,
        happenedAt,
        amount: wasGiven ? amount : null,
        lotId: wasGiven && lotId !== '' ? lotId : null,
        ...(typed === undefined ? {} : { note: typed }),
      })
      if (endedAt !== null)
        await stop.mutateAsync({ doseId: ids.dose, id: ids.stop, cause: 'time-up', happenedAt: endedAt })
    })
    if (!done) return
    say({ words: words.done })
    onBack()
  }
  const shut =
    kind === null
      ? words.chooseKind
      : wasGiven && amount.value.trim() === ''
        ? words.typeAmount
        : (when.missing ??
          (endedAt !== null && when.instant !== null && isBeforeStart(endedAt, when.instant)
            ? words.endBeforeStart
            : null))

  return (
    <Dialog
      question={words.question}
      typed={kind !== null || note !== ''}
      onBack={onBack}
      acts={
        <>
          <Button
            kind="primary"
            size="touch"
            disabled={refusal.busy}
            shut={shut ?? false}
            onClick={() => void send()}
          >
            {words.act}
          </Button>
          <Button size="touch" onClick={onBack}>
            {words.back}
          </Button>
        </>
      }
    >
      <div className="stack">
        <p>{words.body}</p>
        <WrongSummary fields={[]} general={refusal.general(['/amount', '/happenedAt'])} />
        <ChoiceField<Kind>
          label={words.kind}
          touch
          segments={[
            { value: 'recorded', label: words.recorded },
            { value: 'withheld', label: words.withheld },
            { value: 'refused', label: words.refused },
          ]}
          value={kind}
          onChange={setKind}
        />
        {wasGiven ? (
          <>
            <QuantityField
              label={words.amount}
              units={units.map((unit) => ({ unit, label: isUnitCode(unit) ? unitOf(unit).symbol : unit }))}
              quantity={amount}
              onChange={setAmount}
              wrong={refusal.at('/amount')}
            />
            <SelectField
              label={words.lot}
              startsEmpty={false}
              options={[
                { value: '', label: words.lotUnknown },
                ...sheet.lots.map((lot) => ({ value: lot.id, label: lotLabel(lot) })),
              ]}
              value={lotId}
              onChange={(event) => setLotId(event.target.value)}
            />
          </>
        ) : null}
        <MomentField
          label={words.when}
          value={when.moment}
          onChange={when.setMoment}
          wrong={when.missing ?? refusal.at('/happenedAt')}
        />
        {asksEnd ? (
          <MomentField
            label={words.ended}
            optional
            hint={words.endedHint}
            value={ended}
            onChange={setEnded}
          />
        ) : null}
        <TextareaField
          label={words.note}
          optional
          rows={2}
          maxLength={1000}
          value={note}
          onChange={(event) => setNote(event.target.value)}
        />
      </div>
    </Dialog>
  )
}
