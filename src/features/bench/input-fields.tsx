import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import type { ChoiceInput, QuantityInput } from '../../../shared/bench/inputs.ts'
import { say, sayOption, wordOf } from '../../../shared/bench/words.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { unitsOf } from '../../../shared/domain/units/units-of.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { askedInputs, fittingUnits, unitKey } from './bench-draft.ts'
import type { Draft } from './bench-draft.ts'
import { FillNote, TakeFigure } from './enclosure-field.tsx'
import type { FieldNote } from './enclosure-figures.ts'
import { rememberUnit } from './remembered-units.ts'

const fewOptions = 2
const shortWords = 40

/** The fields of a calculator, made from its description: those that belong to the question as the choices stand. */
export function InputFields({
  of,
  draft,
  onChange,
  wrong,
  noteOf,
  onAsking,
}: {
  of: AnyCalculator
  draft: Draft
  onChange: (next: Draft) => void
  wrong: (name: string) => string | undefined
  /** What an enclosure says for a field. */
  noteOf: (name: string) => FieldNote | undefined
  /** Hears, by its label, of a field where it is open in which unit its number is. */
  onAsking: (label: string, asking: boolean) => void
}) {
  return askedInputs(of, draft).map((name) => {
    const input = of.inputs[name]
    const given = draft[name]
    if (!input) return null
    const common = {
      label: say(of, `input.${name}`),
      hint: wordOf(of, `help.${name}`),
      wrong: wrong(name),
      optional: input.optional ?? false,
    }
    if (input.kind === 'choice')
      return (
        <OneChoice
          key={name}
          {...{ of, name, input, common, draft }}
          value={typeof given === 'string' ? given : ''}
          onChange={(next) => onChange({ ...draft, [name]: next })}
        />
      )
    const note = noteOf(name)
    const field = (
      <QuantityField
        {...common}
        hint={note ? <HintWithNote hint={common.hint} note={note} /> : common.hint}
        name={name}
        onAsking={onAsking}
        allowNegative={mayBeNegative(input)}
        units={input.units.map((unit) => ({ unit, label: unitOf(unit).symbol }))}
        quantity={typeof given === 'object' ? given : { value: '', unit: input.units[0] ?? '' }}
        onChange={(next) => {
          rememberUnit(unitKey(of, name), next.unit)
          onChange({ ...draft, [name]: next })
        }}
      />
    )
    return (
      <div key={name}>
        {field}
        {note?.take ? (
          <TakeFigure
            field={common.label}
            take={note.take}
            onTake={() => {
              const { value = '', unit = '' } = note.take ?? {}
              onChange({ ...draft, [name]: { value, unit } })
            }}
          />
        ) : null}
      </div>
    )
  })
}

const HintWithNote = ({ hint, note }: { hint: string | undefined; note: FieldNote }) => (
  <>
    {hint ? `${hint} ` : null}
    <FillNote note={note} />
  </>
)

const mayBeNegative = ({ limits }: QuantityInput) =>
  limits?.above === undefined && (limits?.min === undefined || limits.min < 0)

function OneChoice({
  of,
  name,
  input,
  common,
  draft,
  value,
  onChange,
}: {
  of: AnyCalculator
  name: string
  input: ChoiceInput
  common: { label: string; hint?: string | undefined; wrong?: string | undefined; optional: boolean }
  draft: Draft
  value: string
  onChange: (next: string) => void
}) {
  const source = input.unitsOf === undefined ? undefined : draft[input.unitsOf]
  const options =
    typeof source === 'object' && isUnitCode(source.unit)
      ? fittingUnits(input.options, unitsOf(unitOf(source.unit).dimension))
      : input.options
  const segments = options.map((option) => ({ value: option, label: sayOption(of, name, option) }))
  const length = segments.reduce((sum, segment) => sum + segment.label.length, 0)
  if (segments.length <= fewOptions && length <= shortWords)
    return (
      <ChoiceField {...common} segments={segments} value={value === '' ? null : value} onChange={onChange} />
    )
  return (
    <SelectField
      {...common}
      options={segments}
      value={options.includes(value) ? value : ''}
      onChange={(event) => onChange(event.target.value)}
    />
  )
}
