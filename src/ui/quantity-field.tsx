import { useEffect, useRef } from 'react'
import type { KeyboardEvent, Ref } from 'react'
import { ChevronDown } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { Button } from './button.tsx'
import { afterPress } from './after-press.ts'
import { classNames } from './class-names.ts'
import { Field } from './field.tsx'
import type { FieldProps } from './field.tsx'
import { Icon } from './icon.tsx'
import type { QuantityTools } from './quantity-context.ts'
import { useQuantityField } from './use-quantity-field.ts'
import type { TypedQuantity } from './use-quantity-field.ts'

export interface UnitOption {
  /** Code of the unit as it crosses the wire. */
  unit: string
  /** As shown, when it differs: "mg/L free Cu". */
  label?: string
}

export type QuantityFieldProps = FieldProps &
  QuantityTools & {
    /** Value and unit as typed; the unit is always one of `units`. */
    quantity: TypedQuantity
    onChange: (next: TypedQuantity) => void
    /** One unit stands as a suffix; more are a choice. */
    units: readonly UnitOption[]
    allowNegative?: boolean
    disabled?: boolean
    id?: string
    name?: string
    ref?: Ref<HTMLInputElement>
    onBlur?: () => void
    /** Hears whether it is open in which unit the number is: until that is answered it counts in the earlier one. */
    onAsking?: (field: string, asking: boolean) => void
  }

/**
 * A number with its unit. A bare number is never entered: the value goes out as `{ value, unit }` with the digits as
 * typed. The wheel changes nothing, two separators are refused, arithmetic is worked out when the field is left, and a
 * changed unit asks whether the number is kept or converted.
 */
export function QuantityField(props: QuantityFieldProps) {
  const { quantity, units, label, hint, wrong, optional, labelHidden, id, name, ref, disabled, onBlur } =
    props
  const state = useQuantityField(props)
  const said = wrong ?? state.fault
  const below = state.working ? partWords.workingOut : (state.workedOut ?? hint)
  const { shown } = state
  const asking = state.askedUnit !== null
  const { onAsking } = props
  useEffect(() => {
    if (!asking || !onAsking) return undefined
    onAsking(label, true)
    return () => onAsking(label, false)
  }, [asking, label, onAsking])
  const unit = useRef<HTMLSelectElement>(null)

  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    // Enter works the arithmetic out first and must not send the form with unread text
    if (event.key === 'Enter' && !/^\s*[-−]?[\d.]*\s*$/.test(quantity.value)) {
      event.preventDefault()
      void state.settle()
    }
  }

  return (
    <div>
      <Field {...{ label, hint: below, wrong: said, optional, labelHidden, id }}>
        {(ids) => (
          <div className={classNames('control control-num', said && 'is-wrong')}>
            <input
              {...ids}
              ref={ref}
              name={name}
              type="text"
              inputMode="decimal"
              autoComplete="off"
              disabled={disabled}
              value={quantity.value}
              onChange={(event) => state.type(event.target.value)}
              onBlur={() => {
                afterPress(() => void state.settle())
                onBlur?.()
              }}
              onKeyDown={onKeyDown}
            />
            {units.length > 1 ? (
              <span className="control-suffix is-select">
                <select
                  ref={unit}
                  aria-label={partWords.unit({ field: label })}
                  // the unit of the number as it stands: what is seen is what goes out, also while it is asked
                  value={quantity.unit}
                  disabled={disabled}
                  onChange={(event) => state.changeUnit(event.target.value)}
                >
                  {units.map((option) => (
                    <option key={option.unit} value={option.unit}>
                      {option.label ?? option.unit}
                    </option>
                  ))}
                </select>
                <Icon of={ChevronDown} />
              </span>
            ) : shown(quantity.unit) === '' ? null : (
              <span className="control-suffix">{shown(quantity.unit)}</span>
            )}
          </div>
        )}
      </Field>
      {state.askedUnit !== null ? (
        <UnitQuestion
          value={quantity.value}
          from={shown(quantity.unit)}
          to={shown(state.askedUnit)}
          converted={state.converted?.ok ? state.converted.value : null}
          onAnswer={(how) => {
            state.answerUnit(how)
            // the buttons go with the question: whoever uses keys goes on from where it was asked
            unit.current?.focus()
          }}
        />
      ) : null}
    </div>
  )
}

/** Keep the number or convert it: asked in place, because the number itself has to stay in sight. */
function UnitQuestion({
  value,
  from,
  to,
  converted,
  onAnswer,
}: {
  value: string
  from: string
  to: string
  converted: string | null
  onAnswer: (how: 'keep' | 'convert' | 'back') => void
}) {
  const first = useRef<HTMLDivElement>(null)
  const question = converted === null ? partWords.keepOnly : partWords.keepOrConvert
  const asked = question({ value, from, to })
  useEffect(() => {
    first.current?.querySelector('button')?.focus()
  }, [])
  return (
    <div
      ref={first}
      role="group"
      className="unit-question mt-1"
      aria-label={asked}
      onKeyDown={(event) => {
        if (event.key !== 'Escape') return
        event.stopPropagation()
        event.preventDefault()
        onAnswer('back')
      }}
    >
      <p>{asked}</p>
      <Button size="small" onClick={() => onAnswer('keep')}>
        {partWords.keepNumber({ value, unit: to })}
      </Button>
      {converted === null ? null : (
        <Button size="small" onClick={() => onAnswer('convert')}>
          {partWords.convertNumber({ value: converted, unit: to })}
        </Button>
      )}
      <Button size="small" kind="plain" onClick={() => onAnswer('back')}>
        {partWords.backToUnit({ unit: from })}
      </Button>
    </div>
  )
}
