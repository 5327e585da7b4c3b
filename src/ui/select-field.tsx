import type { ComponentProps } from 'react'
import { ChevronDown } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { classNames } from './class-names.ts'
import { Field } from './field.tsx'
import type { FieldProps } from './field.tsx'
import { Icon } from './icon.tsx'

export interface SelectOption {
  value: string
  label: string
}

/**
 * One of a short list. Without a chosen value it opens on "Choose one", so that nothing is said for a person;
 * `startsEmpty={false}` for settings that always have a value.
 */
export function SelectField({
  label,
  hint,
  wrong,
  optional,
  labelHidden,
  id,
  options,
  startsEmpty = true,
  ...select
}: FieldProps & ComponentProps<'select'> & { options: readonly SelectOption[]; startsEmpty?: boolean }) {
  return (
    <Field {...{ label, hint, wrong, optional, labelHidden, id }}>
      {(ids) => (
        <div className={classNames('control control-select', wrong && 'is-wrong')}>
          <select {...select} {...ids}>
            {startsEmpty ? <option value="">{partWords.choose}</option> : null}
            {options.map((option) => (
              <option key={option.value} value={option.value}>
                {option.label}
              </option>
            ))}
          </select>
          <span className="control-cue">
            <Icon of={ChevronDown} />
          </span>
        </div>
      )}
    </Field>
  )
}
