import { useState } from 'react'
import type { ReactNode } from 'react'
import type { WaterBody } from '../../../shared/contracts/enclosures.contract.ts'
import { lifeSupportKinds } from '../../../shared/domain/places/life-support-kind.ts'
import type { LifeSupportKind } from '../../../shared/domain/places/life-support-kind.ts'
import { mapWords } from '../../../shared/messages/water-map.ts'
import { lifeSupportNames } from '../../../shared/messages/water.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import type { Refusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useEnterWaterBody } from '../enclosures/index.ts'
import { useEnterConnection, useEnterLifeSupport } from './mutations.ts'

interface CodeAndName {
  code: string
  name: string
}

/** What the three dialogs share: code, name, the further fields, and sending. */
function PlaceDialog({
  question,
  value,
  onChange,
  refusal,
  shut,
  onSend,
  onBack,
  children,
}: {
  question: string
  value: CodeAndName
  onChange: (next: CodeAndName) => void
  refusal: Refusal
  shut: string | undefined
  onSend: () => Promise<boolean>
  onBack: () => void
  children: ReactNode
}) {
  return (
    <Dialog
      question={question}
      onBack={onBack}
      typed={value.code !== '' || value.name !== ''}
      acts={
        <>
          <Button
            kind="primary"
            disabled={refusal.busy}
            shut={shut}
            onClick={() => void onSend().then((done) => done && onBack())}
          >
            {mapWords.enter}
          </Button>
          <Button onClick={onBack}>{waterWords.back}</Button>
        </>
      }
    >
      <div className="stack">
        <WrongSummary fields={[]} general={refusal.general(['/code', '/name'])} />
        <TextField
          label={waterWords.code}
          hint={mapWords.codeHint}
          maxLength={20}
          value={value.code}
          wrong={refusal.at('/code')}
          onChange={(event) => onChange({ ...value, code: event.target.value })}
        />
        <TextField
          label={waterWords.name}
          maxLength={120}
          value={value.name}
          wrong={refusal.at('/name')}
          onChange={(event) => onChange({ ...value, name: event.target.value })}
        />
        {children}
      </div>
    </Dialog>
  )
}

const optionsOf = (bodies: readonly WaterBody[]) =>
  bodies.map((body) => ({ value: body.id, label: `${body.code} ${body.name}` }))

export function BodyDialog({ onBack }: { onBack: () => void }) {
  const enter = useEnterWaterBody()
  const refusal = useRefusal()
  const [id] = useState(newId)
  const [value, setValue] = useState<CodeAndName>({ code: '', name: '' })
  const [kind, setKind] = useState<'sump' | 'loop' | null>(null)
  return (
    <PlaceDialog
      question={mapWords.bodyQuestion}
      value={value}
      onChange={setValue}
      refusal={refusal}
      shut={kind === null ? mapWords.chooseKind : undefined}
      onBack={onBack}
      onSend={() => refusal.attempt(() => enter.mutateAsync({ id, ...value, kind: kind ?? 'sump' }))}
    >
      <ChoiceField
        label={mapWords.kind}
        segments={[
          { value: 'sump', label: mapWords.sump },
          { value: 'loop', label: mapWords.loop },
        ]}
        value={kind}
        onChange={setKind}
      />
    </PlaceDialog>
  )
}

export function ConnectionDialog({ bodies, onBack }: { bodies: readonly WaterBody[]; onBack: () => void }) {
  const enter = useEnterConnection()
  const refusal = useRefusal()
  const [id] = useState(newId)
  const [value, setValue] = useState<CodeAndName>({ code: '', name: '' })
  const [kind, setKind] = useState<'valve' | 'pump' | null>(null)
  const [fromBodyId, setFrom] = useState('')
  const [toBodyId, setTo] = useState('')
  const [state, setState] = useState<'open' | 'shut' | null>(null)
  const missing =
    kind === null
      ? mapWords.chooseKind
      : !fromBodyId || !toBodyId
        ? mapWords.chooseEnds
        : state === null
          ? mapWords.chooseState
          : undefined
  return (
    <PlaceDialog
      question={mapWords.connectionQuestion}
      value={value}
      onChange={setValue}
      refusal={refusal}
      shut={missing}
      onBack={onBack}
      onSend={() =>
        refusal.attempt(() =>
          enter.mutateAsync({
            id,
            ...value,
            kind: kind ?? 'valve',
            fromBodyId,
            toBodyId,
            open: state === 'open',
          }),
        )
      }
    >
      <ChoiceField
        label={mapWords.kind}
        segments={[
          { value: 'valve', label: mapWords.valve },
          { value: 'pump', label: mapWords.pump },
        ]}
        value={kind}
        onChange={setKind}
      />
      <SelectField
        label={mapWords.from}
        options={optionsOf(bodies)}
        value={fromBodyId}
        onChange={(event) => setFrom(event.target.value)}
      />
      <SelectField
        label={mapWords.to}
        options={optionsOf(bodies.filter((body) => body.id !== fromBodyId))}
        value={toBodyId}
        onChange={(event) => setTo(event.target.value)}
      />
      <ChoiceField
        label={mapWords.stands}
        segments={[
          { value: 'open', label: kind === 'pump' ? waterWords.running : waterWords.open },
          { value: 'shut', label: kind === 'pump' ? waterWords.stopped : waterWords.shut },
        ]}
        value={state}
        onChange={setState}
      />
    </PlaceDialog>
  )
}

export function MachineDialog({ bodies, onBack }: { bodies: readonly WaterBody[]; onBack: () => void }) {
  const enter = useEnterLifeSupport()
  const refusal = useRefusal()
  const [id] = useState(newId)
  const [value, setValue] = useState<CodeAndName>({ code: '', name: '' })
  const [kind, setKind] = useState<LifeSupportKind | ''>('')
  const [waterBodyId, setBody] = useState('')
  const [state, setState] = useState<'on' | 'off' | null>(null)
  const missing =
    kind === ''
      ? mapWords.chooseKind
      : !waterBodyId
        ? mapWords.chooseWater
        : state === null
          ? mapWords.chooseState
          : undefined
  return (
    <PlaceDialog
      question={mapWords.machineQuestion}
      value={value}
      onChange={setValue}
      refusal={refusal}
      shut={missing}
      onBack={onBack}
      onSend={() =>
        refusal.attempt(async () => {
          if (kind !== '') await enter.mutateAsync({ id, ...value, kind, waterBodyId, on: state === 'on' })
        })
      }
    >
      <SelectField
        label={mapWords.kind}
        options={lifeSupportKinds.map((one) => ({ value: one, label: lifeSupportNames[one] }))}
        value={kind}
        onChange={(event) => setKind(event.target.value as LifeSupportKind | '')}
      />
      <SelectField
        label={mapWords.worksOn}
        options={optionsOf(bodies)}
        value={waterBodyId}
        onChange={(event) => setBody(event.target.value)}
      />
      <ChoiceField
        label={mapWords.stands}
        segments={[
          { value: 'on', label: waterWords.on },
          { value: 'off', label: waterWords.isOff },
        ]}
        value={state}
        onChange={setState}
      />
    </PlaceDialog>
  )
}
