import { concentrationBases } from '../../../shared/domain/units/basis.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { basisNames } from '../../../shared/messages/formulary.ts'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import { settingNames } from '../../../shared/messages/orders-screens.ts'
import { sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import { instantOfMoment } from '../../lib/local-moment.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { MomentField } from '../../ui/moment-field.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import type { FieldsProps } from './order-fields.tsx'

const unitsOf = (units: readonly UnitCode[]) => units.map((unit) => ({ unit, label: unitOf(unit).symbol }))
const targetUnits = unitsOf(['mg/L', 'g/L', 'ug/L', 'uL/L', 'mL/L'])
const divisionUnits = unitsOf(['g', 'mg', 'kg', 'mL', 'L'])
const settings = ['tank', 'raceway', 'pond'] as const

/** How much, how long, how often, from when: in the order of parts in which every order is written. */
export function CourseFields({ values, onChange, wrong, zone }: FieldsProps & { zone: string }) {
  const starts = instantOfMoment(values.startsAt, zone)
  return (
    <>
      <QuantityField
        id="target"
        label={words.target}
        hint={words.targetHint}
        quantity={values.target}
        units={targetUnits}
        wrong={wrong('target')}
        onChange={(target) => onChange({ target })}
      />
      <SelectField
        id="basis"
        label={words.basis}
        options={concentrationBases.map((value) => ({ value, label: basisNames[value] }))}
        value={values.basis ?? ''}
        wrong={wrong('basis')}
        onChange={(event) => onChange({ basis: (event.target.value || null) as typeof values.basis })}
      />
      <ChoiceField
        label={words.timing}
        segments={[
          { value: 'timed', label: words.timed },
          { value: 'indefinite', label: words.indefinite },
        ]}
        value={values.timing}
        wrong={wrong('timing')}
        onChange={(timing) => onChange({ timing })}
      />
      {values.timing === 'timed' ? (
        <QuantityField
          id="contactMinutes"
          label={words.contact}
          quantity={{ value: values.contactMinutes, unit: 'min' }}
          units={[{ unit: 'min' }]}
          wrong={wrong('contactMinutes')}
          onChange={({ value }) => onChange({ contactMinutes: value })}
        />
      ) : null}
      <div className="pair">
        <TextField
          id="doses"
          label={words.doses}
          inputMode="numeric"
          autoComplete="off"
          value={values.doses}
          wrong={wrong('doses')}
          onChange={(event) => onChange({ doses: event.target.value })}
        />
        {values.doses.trim() === '1' ? null : (
          <QuantityField
            id="intervalHours"
            label={words.interval}
            quantity={{ value: values.intervalHours, unit: 'h' }}
            units={[{ unit: 'h' }]}
            wrong={wrong('intervalHours')}
            onChange={({ value }) => onChange({ intervalHours: value })}
          />
        )}
      </div>
      <MomentField
        id="startsAt"
        label={words.startsAt}
        hint={starts === null ? words.startsAtHint({ zone }) : sayInstantWithOffset(starts, zone)}
        value={values.startsAt}
        wrong={wrong('startsAt')}
        onChange={(startsAt) => onChange({ startsAt })}
      />
      <ChoiceField
        label={words.use}
        segments={[
          { value: 'as-labelled', label: words.asLabelled },
          { value: 'extralabel', label: words.extralabel },
        ]}
        value={values.use}
        wrong={wrong('use')}
        onChange={(use) => onChange({ use })}
      />
      <ChoiceField
        label={words.setting}
        segments={settings.map((value) => ({ value, label: settingNames[value] }))}
        value={values.setting}
        wrong={wrong('setting')}
        onChange={(setting) => onChange({ setting })}
      />
      <QuantityField
        id="division"
        label={words.division}
        hint={words.divisionHint}
        quantity={values.division}
        units={divisionUnits}
        wrong={wrong('division')}
        onChange={(division) => onChange({ division })}
      />
      <TextareaField
        id="stopIf"
        label={words.stopIf}
        hint={words.stopIfHint}
        rows={2}
        maxLength={1000}
        value={values.stopIf}
        wrong={wrong('stopIf')}
        onChange={(event) => onChange({ stopIf: event.target.value })}
      />
      <TextareaField
        id="instructions"
        label={words.instructions}
        optional
        rows={2}
        maxLength={2000}
        value={values.instructions}
        onChange={(event) => onChange({ instructions: event.target.value })}
      />
      <QuantityField
        id="drift"
        label={words.drift}
        hint={words.driftHint}
        quantity={{ value: values.drift, unit: 'percent' }}
        units={[{ unit: 'percent', label: unitOf('percent').symbol }]}
        wrong={wrong('drift')}
        onChange={({ value }) => onChange({ drift: value })}
      />
    </>
  )
}
