import { useState } from 'react'
import { PenLine, Plus } from 'lucide-react'
import { convert } from '../../shared/domain/units/convert.ts'
import type { UnitCode } from '../../shared/domain/units/unit-table.ts'
import { partsPageWords as words } from '../../shared/messages/parts-page.ts'
import { Button } from '../ui/button.tsx'
import { ButtonLink } from '../ui/button-link.tsx'
import { ChoiceField } from '../ui/choice-field.tsx'
import { Combobox } from '../ui/combobox.tsx'
import { ComputedLine } from '../ui/computed-line.tsx'
import { FlagWords } from '../ui/flag-mark.tsx'
import { PasswordField } from '../ui/password-field.tsx'
import { QuantityField } from '../ui/quantity-field.tsx'
import type { WorkedOut } from '../ui/quantity-context.ts'
import { SegmentedChoice } from '../ui/segmented-choice.tsx'
import { SelectField } from '../ui/select-field.tsx'
import { Stepper } from '../ui/stepper.tsx'
import { Tag } from '../ui/tag.tsx'
import { TextareaField } from '../ui/textarea-field.tsx'
import { TextField } from '../ui/text-field.tsx'
import { Tick } from '../ui/tick.tsx'
import { PartGroup } from './part-group.tsx'

const enclosures = [
  { value: 'QT-3', name: 'QT-3', detail: '14 yellow tang', aside: '2,220 L ± 2 %' },
  { value: 'QT-5', name: 'QT-5', detail: '10 lined seahorse', aside: '480 L ± 2 %' },
  { value: 'QT-6', name: 'QT-6', detail: '4 cownose ray', aside: '18,300 L ± 3 %' },
  { value: 'QF-1', name: 'QF-1', detail: '7 lake sturgeon', aside: '9,400 L ± 3 %' },
]

function convertDigits(value: string, from: string, to: string): WorkedOut {
  const result = convert(Number(value), from as UnitCode, to as UnitCode)
  return result.ok ? { ok: true, value: String(Number(result.value.toPrecision(6))) } : { ok: false }
}

export function ButtonParts() {
  return (
    <PartGroup heading={words.buttons}>
      <div className="row row-wrap">
        <Button kind="primary" icon={PenLine}>
          {words.signOrder}
        </Button>
        <Button>{words.keepDraft}</Button>
        <Button kind="clear">{words.clear}</Button>
        <Button kind="stop">{words.stopBath}</Button>
        <Button kind="hold">{words.hold}</Button>
        <Button kind="urgent">{words.urgent}</Button>
        <Button size="small" icon={Plus}>
          {words.addStep}
        </Button>
        <Button kind="plain">{words.closed}</Button>
        <ButtonLink to="/parts">{words.closed}</ButtonLink>
        <Button kind="clear" shut={words.clearShut}>
          {words.clear}
        </Button>
        <Button disabled>{words.keepDraft}</Button>
      </div>
      <div className="row row-wrap">
        <Button size="touch" kind="urgent">
          {words.urgent}
        </Button>
        <Button size="touch" kind="hold">
          {words.hold}
        </Button>
        <Button size="touch" kind="stop">
          {words.stopBath}
        </Button>
      </div>
    </PartGroup>
  )
}

export function FieldParts() {
  const [depth, setDepth] = useState({ value: '0.68', unit: 'm' })
  const [target, setTarget] = useState({ value: '0.15', unit: 'mg/L' })
  const [salinity, setSalinity] = useState({ value: '331', unit: 'g/kg' })
  const [enclosure, setEnclosure] = useState<string | null>('QT-3')
  return (
    <PartGroup heading={words.fields}>
      <div className="grid gap-4 sm:grid-cols-2">
        <div className="stack">
          <QuantityField
            label={words.depth}
            hint={words.depthHint}
            quantity={depth}
            onChange={setDepth}
            units={[{ unit: 'm' }]}
          />
          <QuantityField
            label={words.target}
            quantity={target}
            onChange={setTarget}
            units={[{ unit: 'mg/L' }, { unit: 'g/L' }, { unit: 'ug/L', label: 'micrograms/L' }]}
            convert={convertDigits}
          />
          <QuantityField
            label={words.salinity}
            wrong={words.salinityWrong}
            quantity={salinity}
            onChange={setSalinity}
            units={[{ unit: 'g/kg' }]}
          />
          <TextField label={words.reason} wrong={words.reasonWrong} defaultValue="stock" />
          <TextField label={words.shutField} disabled defaultValue="CS-2411" />
        </div>
        <div className="stack">
          <Combobox label={words.combobox} options={enclosures} value={enclosure} onChange={setEnclosure} />
          <SelectField label={words.problem} options={[{ value: '2', label: words.problem }]} />
          <PasswordField label={words.password} autoComplete="off" />
          <TextareaField label={words.note} optional />
        </div>
      </div>
    </PartGroup>
  )
}

export function ChoiceParts() {
  const [use, setUse] = useState<'labelled' | 'extralabel' | null>(null)
  const [appetite, setAppetite] = useState<'all' | 'some' | 'none' | null>(null)
  const [view, setView] = useState<'all' | 'due' | 'overdue' | null>('all')
  const [dead, setDead] = useState<number | null>(null)
  return (
    <PartGroup heading={words.choices}>
      <ChoiceField
        label={words.use}
        hint={use === null ? words.useHint : undefined}
        segments={[
          { value: 'labelled', label: words.labelled },
          { value: 'extralabel', label: words.extralabel },
        ]}
        value={use}
        onChange={setUse}
      />
      <SegmentedChoice
        label={words.view}
        segments={[
          { value: 'all', label: words.all },
          { value: 'due', label: words.dueToday },
          { value: 'overdue', label: words.overdueTwo },
        ]}
        value={view}
        onChange={setView}
      />
      <div className="grid gap-4 sm:grid-cols-2">
        <ChoiceField
          label={words.appetite}
          touch
          segments={[
            { value: 'all', label: words.allAte },
            { value: 'some', label: words.some },
            { value: 'none', label: words.none },
          ]}
          value={appetite}
          onChange={setAppetite}
        />
        <Stepper label={words.found} value={dead} onChange={setDead} />
      </div>
      <Tick label={words.tick} defaultChecked />
      <Tick label={words.tickOff} hint={words.tickHint} />
      <ComputedLine what={words.carbon} from={words.carbonFrom} />
    </PartGroup>
  )
}

export function FlagParts() {
  return (
    <PartGroup heading={words.flags}>
      <div className="row row-wrap">
        <FlagWords flag="Q">{words.inQuarantine}</FlagWords>
        <FlagWords flag="L">{words.held}</FlagWords>
        <FlagWords flag="C">{words.cleared}</FlagWords>
        <FlagWords flag="N">{words.notCleared}</FlagWords>
      </div>
      <div className="row row-wrap">
        <Tag kind="solid">{words.active}</Tag>
        <Tag>{words.resolved}</Tag>
        <Tag kind="done">{words.done}</Tag>
        <Tag kind="late">{words.late}</Tag>
      </div>
    </PartGroup>
  )
}
