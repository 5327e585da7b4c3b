import { volumeWords } from '../../../shared/messages/volume-form.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { ErrorField, PartFields, PipeFields, volumeUnits } from './volume-form-parts.tsx'
import type { VolumeDraft } from './volume-form-model.ts'

export interface VolumeMethodFieldsProps {
  draft: VolumeDraft
  onChange: (next: VolumeDraft) => void
  lengthUnit: string
  /** What is wrong with the field at a path of the sheet, such as `parts.0.depth`. */
  wrong: (field: string) => string | undefined
}

const replaced = <T,>(list: readonly T[], index: number, next: T) =>
  list.map((one, i) => (i === index ? next : one))
const without = <T,>(list: readonly T[], index: number) => list.filter((_, i) => i !== index)

/** The fields of the way that was chosen. */
export function VolumeMethodFields(props: VolumeMethodFieldsProps) {
  const { draft, onChange, wrong } = props
  const error = (
    <ErrorField
      label={volumeWords.wholeError}
      value={draft.error}
      onChange={(next) => onChange({ ...draft, error: next })}
      wrong={wrong('errorPercent')}
    />
  )
  if (draft.method === 'geometry') return <GeometryFields {...props} />
  if (draft.method === 'metered')
    return (
      <div className="measure-fields">
        <QuantityField
          label={volumeWords.startReading}
          units={volumeUnits}
          quantity={draft.startReading}
          onChange={(startReading) => onChange({ ...draft, startReading })}
          wrong={wrong('startReading')}
        />
        <QuantityField
          label={volumeWords.endReading}
          units={volumeUnits}
          quantity={draft.endReading}
          onChange={(endReading) => onChange({ ...draft, endReading })}
          wrong={wrong('endReading')}
        />
        {error}
      </div>
    )
  if (draft.method === 'stated')
    return (
      <div className="measure-fields">
        <QuantityField
          label={volumeWords.statedVolume}
          hint={volumeWords.statedHint}
          units={volumeUnits}
          quantity={draft.statedVolume}
          onChange={(statedVolume) => onChange({ ...draft, statedVolume })}
          wrong={wrong('volume')}
        />
        {error}
      </div>
    )
  return (
    <div className="measure-fields">
      <QuantityField
        label={volumeWords.saltMass}
        units={[{ unit: 'kg' }, { unit: 'g' }, { unit: 'lb' }]}
        quantity={draft.saltMass}
        onChange={(saltMass) => onChange({ ...draft, saltMass })}
        wrong={wrong('saltMass')}
      />
      <QuantityField
        label={volumeWords.salinityRise}
        units={[{ unit: 'g/L' }]}
        quantity={draft.salinityRise}
        onChange={(salinityRise) => onChange({ ...draft, salinityRise })}
        wrong={wrong('salinityRise')}
      />
      {error}
    </div>
  )
}

function GeometryFields({ draft, onChange, lengthUnit, wrong }: VolumeMethodFieldsProps) {
  const { displacement } = draft
  const setDisplacement = (next: Partial<VolumeDraft['displacement']>) =>
    onChange({ ...draft, displacement: { ...displacement, ...next } })
  return (
    <>
      {draft.parts.map((part, i) => (
        <PartFields
          key={part.key}
          part={part}
          lengthUnit={lengthUnit}
          mayTakeAway={draft.parts.length > 1}
          wrong={(field) => wrong(`parts.${String(i)}.${field}`)}
          onChange={(next) => onChange({ ...draft, parts: replaced(draft.parts, i, next) })}
          onTakeAway={() => onChange({ ...draft, parts: without(draft.parts, i) })}
        />
      ))}
      {draft.pipes.map((pipe, i) => (
        <PipeFields
          key={pipe.key}
          pipe={pipe}
          wrong={(field) => wrong(`pipes.${String(i)}.${field}`)}
          onChange={(next) => onChange({ ...draft, pipes: replaced(draft.pipes, i, next) })}
          onTakeAway={() => onChange({ ...draft, pipes: without(draft.pipes, i) })}
        />
      ))}
      <fieldset className="volume-part">
        <legend className="t-sub">{volumeWords.displacement}</legend>
        <ChoiceField
          label={volumeWords.displaced}
          hint={volumeWords.displacementHint}
          segments={[
            { value: 'none', label: volumeWords.notMeasured },
            { value: 'volume', label: volumeWords.byVolume },
            { value: 'share', label: volumeWords.byShare },
          ]}
          value={displacement.by}
          onChange={(by) => setDisplacement({ by })}
        />
        {displacement.by === 'none' ? null : (
          <div className="measure-fields">
            {displacement.by === 'volume' ? (
              <QuantityField
                label={volumeWords.displaced}
                units={volumeUnits}
                quantity={displacement.volume}
                onChange={(volume) => setDisplacement({ volume })}
                wrong={wrong('displacement')}
              />
            ) : (
              <QuantityField
                label={volumeWords.displaced}
                units={[{ unit: 'percent', label: '%' }]}
                quantity={displacement.share}
                onChange={(share) => setDisplacement({ share })}
                wrong={wrong('displacement')}
              />
            )}
            <ErrorField
              value={displacement.error}
              onChange={(error) => setDisplacement({ error })}
              wrong={wrong('displacement.errorPercent')}
            />
          </div>
        )}
      </fieldset>
    </>
  )
}
