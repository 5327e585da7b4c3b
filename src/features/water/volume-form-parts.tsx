import { Trash2 } from 'lucide-react'
import type { ShapeName } from '../../../shared/domain/water/tank-shape.ts'
import { shapeNames } from '../../../shared/domain/water/tank-shape.ts'
import { measureWords, shapeWords, volumeWords } from '../../../shared/messages/volume-form.ts'
import { Button } from '../../ui/button.tsx'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { measuresOf } from './volume-form-model.ts'
import type { MeasureName, PartDraft, PipeDraft } from './volume-form-model.ts'

export const lengthUnits = [{ unit: 'm' }, { unit: 'cm' }, { unit: 'mm' }, { unit: 'ft' }, { unit: 'in' }]
export const volumeUnits = [{ unit: 'L' }, { unit: 'm3', label: 'm³' }, { unit: 'gal_us', label: 'US gal' }]
const percentUnit = [{ unit: 'percent', label: '%' }]

/** The error of one measure, in percent. */
export function ErrorField({
  label = volumeWords.error,
  value,
  onChange,
  wrong,
}: {
  label?: string
  value: string
  onChange: (next: string) => void
  wrong?: string | undefined
}) {
  return (
    <QuantityField
      label={label}
      units={percentUnit}
      quantity={{ value, unit: 'percent' }}
      onChange={(next) => onChange(next.value)}
      wrong={wrong}
    />
  )
}

/**
 * One tank, sump or vessel with its shape and inside measures.
 *
 * @param wrong what is wrong with a measure, by its name
 */
export function PartFields({
  part,
  lengthUnit,
  mayTakeAway,
  wrong,
  onChange,
  onTakeAway,
}: {
  part: PartDraft
  lengthUnit: string
  mayTakeAway: boolean
  wrong: (field: string) => string | undefined
  onChange: (next: PartDraft) => void
  onTakeAway: () => void
}) {
  const title =
    part.name || { tank: volumeWords.tank, sump: volumeWords.sump, vessel: volumeWords.vessel }[part.role]
  const measure = (name: MeasureName) =>
    part.measures[name] ?? { value: '', unit: name === 'volume' ? 'L' : lengthUnit }
  return (
    <fieldset className="volume-part">
      <legend className="t-sub">{title}</legend>
      <div className="measure-fields">
        <TextField
          label={volumeWords.partName}
          value={part.name}
          maxLength={80}
          onChange={(event) => onChange({ ...part, name: event.target.value })}
        />
        <SelectField
          label={volumeWords.shape}
          startsEmpty={false}
          options={shapeNames.map((value) => ({ value, label: shapeWords[value] }))}
          value={part.shape}
          onChange={(event) => onChange({ ...part, shape: event.target.value as ShapeName })}
        />
        {part.shape === 'polygon' ? (
          <TextField
            label={volumeWords.sides}
            inputMode="numeric"
            value={part.sides}
            onChange={(event) => onChange({ ...part, sides: event.target.value })}
            wrong={wrong('sides')}
          />
        ) : null}
      </div>
      {part.shape === 'polygon' ? (
        <ChoiceField
          label={volumeWords.sideMeasured}
          segments={[
            { value: 'side', label: volumeWords.alongSide },
            { value: 'across-flats', label: volumeWords.acrossFlats },
          ]}
          value={part.measured}
          onChange={(measured) => onChange({ ...part, measured })}
        />
      ) : null}
      <div className="measure-fields">
        {measuresOf[part.shape].map((name) => (
          <QuantityField
            key={name}
            label={measureWords[name]}
            units={name === 'volume' ? volumeUnits : lengthUnits}
            quantity={measure(name)}
            onChange={(next) => onChange({ ...part, measures: { ...part.measures, [name]: next } })}
            wrong={wrong(name)}
          />
        ))}
        <ErrorField
          value={part.error}
          onChange={(error) => onChange({ ...part, error })}
          wrong={wrong('errorPercent')}
        />
      </div>
      {mayTakeAway ? <TakeAway part={title} onTakeAway={onTakeAway} /> : null}
    </fieldset>
  )
}

/** Pipework, full of water. */
export function PipeFields({
  pipe,
  wrong,
  onChange,
  onTakeAway,
}: {
  pipe: PipeDraft
  wrong: (field: string) => string | undefined
  onChange: (next: PipeDraft) => void
  onTakeAway: () => void
}) {
  return (
    <fieldset className="volume-part">
      <legend className="t-sub">{volumeWords.pipe}</legend>
      <div className="measure-fields">
        <QuantityField
          label={volumeWords.bore}
          units={lengthUnits}
          quantity={pipe.bore}
          onChange={(bore) => onChange({ ...pipe, bore })}
          wrong={wrong('bore')}
        />
        <QuantityField
          label={volumeWords.pipeLength}
          units={lengthUnits}
          quantity={pipe.length}
          onChange={(length) => onChange({ ...pipe, length })}
          wrong={wrong('length')}
        />
        <ErrorField
          value={pipe.error}
          onChange={(error) => onChange({ ...pipe, error })}
          wrong={wrong('errorPercent')}
        />
      </div>
      <TakeAway part={volumeWords.pipe} onTakeAway={onTakeAway} />
    </fieldset>
  )
}

function TakeAway({ part, onTakeAway }: { part: string; onTakeAway: () => void }) {
  return (
    <div>
      <Button
        size="small"
        kind="plain"
        icon={Trash2}
        aria-label={volumeWords.takeAwayPart({ part })}
        onClick={onTakeAway}
      >
        {volumeWords.takeAway}
      </Button>
    </div>
  )
}
