import { useState } from 'react'
import type { WaterBody } from '../../../shared/contracts/enclosures.contract.ts'
import type { LifeSupportNow } from '../../../shared/contracts/water-facts.ts'
import { waterEventKinds } from '../../../shared/domain/places/water-event-kind.ts'
import type { WaterEventKind } from '../../../shared/domain/places/water-event-kind.ts'
import { waterEventNames } from '../../../shared/messages/water.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { Button } from '../../ui/button.tsx'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { MomentAndNote } from './moment-and-note.tsx'
import { useRecordWaterEvent } from './mutations.ts'

const volumeUnits = [{ unit: 'L' }, { unit: 'm3', label: 'm³' }, { unit: 'gal_us', label: 'US gal' }]

/** Records a water change, backwash, media change or top-off. */
export function EventDialog({
  bodies,
  machines,
  ownBodyId,
  onBack,
}: {
  bodies: readonly WaterBody[]
  machines: readonly LifeSupportNow[]
  ownBodyId: string
  onBack: () => void
}) {
  const when = useMoment()
  const record = useRecordWaterEvent()
  const refusal = useRefusal()
  const [id] = useState(newId)
  const [kind, setKind] = useState<WaterEventKind | ''>('')
  const [bodyId, setBodyId] = useState(ownBodyId)
  const [by, setBy] = useState<'amount' | 'share' | null>(null)
  const [amount, setAmount] = useState({ value: '', unit: 'L' })
  const [share, setShare] = useState({ value: '', unit: 'percent' })
  const [machineId, setMachineId] = useState('')
  const [note, setNote] = useState('')
  const isChange = kind === 'water-change'
  const showsAmount = isChange ? by === 'amount' : kind !== ''
  const showsMachine = kind === 'backwash' || kind === 'media-change'

  const send = async () => {
    if (kind === '' || when.instant === null) return
    const happenedAt = when.instant
    const done = await refusal.attempt(() =>
      record.mutateAsync({
        id,
        waterBodyId: bodyId,
        kind,
        amount: showsAmount && amount.value !== '' ? amount : null,
        sharePercent: isChange && by === 'share' && share.value !== '' ? share.value : null,
        lifeSupportUnitId: showsMachine && machineId !== '' ? machineId : null,
        happenedAt,
        note: note.trim() || null,
      }),
    )
    if (done) onBack()
  }

  return (
    <Dialog
      question={waterWords.eventQuestion}
      onBack={onBack}
      typed={kind !== '' || note !== ''}
      acts={
        <>
          <Button
            kind="primary"
            disabled={refusal.busy}
            shut={kind === '' ? waterWords.chooseKindFirst : when.missing}
            onClick={() => void send()}
          >
            {waterWords.record}
          </Button>
          <Button onClick={onBack}>{waterWords.back}</Button>
        </>
      }
    >
      <div className="stack">
        <WrongSummary fields={[]} general={refusal.general(['/amount', '/sharePercent', '/happenedAt'])} />
        <SelectField
          label={waterWords.eventKind}
          options={waterEventKinds.map((value) => ({ value, label: waterEventNames[value] }))}
          value={kind}
          onChange={(event) => setKind(event.target.value as WaterEventKind | '')}
        />
        {bodies.length > 1 ? (
          <SelectField
            label={waterWords.eventWater}
            startsEmpty={false}
            options={bodies.map((body) => ({ value: body.id, label: `${body.code} ${body.name}` }))}
            value={bodyId}
            onChange={(event) => setBodyId(event.target.value)}
          />
        ) : null}
        {isChange ? (
          <ChoiceField
            label={waterWords.howMuch}
            segments={[
              { value: 'amount', label: waterWords.byAmount },
              { value: 'share', label: waterWords.byShare },
            ]}
            value={by}
            onChange={setBy}
            wrong={by === null ? refusal.at('/amount') : undefined}
          />
        ) : null}
        {showsAmount ? (
          <QuantityField
            label={waterWords.amount}
            units={volumeUnits}
            quantity={amount}
            onChange={setAmount}
            optional={!isChange}
            wrong={refusal.at('/amount')}
          />
        ) : null}
        {isChange && by === 'share' ? (
          <QuantityField
            label={waterWords.share}
            units={[{ unit: 'percent', label: '%' }]}
            quantity={share}
            onChange={setShare}
            wrong={refusal.at('/sharePercent')}
          />
        ) : null}
        {showsMachine && machines.length > 0 ? (
          <SelectField
            label={waterWords.machine}
            startsEmpty={false}
            options={[
              { value: '', label: waterWords.noMachine },
              ...machines.map((machine) => ({ value: machine.id, label: `${machine.code} ${machine.name}` })),
            ]}
            value={machineId}
            onChange={(event) => setMachineId(event.target.value)}
          />
        ) : null}
        <MomentAndNote
          inWords={when.inWords}
          moment={when.moment}
          onMoment={when.setMoment}
          momentWrong={when.missing ?? refusal.at('/happenedAt')}
          note={note}
          onNote={setNote}
        />
      </div>
    </Dialog>
  )
}
