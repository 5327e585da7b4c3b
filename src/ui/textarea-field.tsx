import type { ComponentProps } from 'react'
import { classNames } from './class-names.ts'
import { Field } from './field.tsx'
import type { FieldProps } from './field.tsx'

/** Several lines of text. */
export function TextareaField({
  label,
  hint,
  wrong,
  optional,
  labelHidden,
  id,
  ...area
}: FieldProps & ComponentProps<'textarea'>) {
  return (
    <Field {...{ label, hint, wrong, optional, labelHidden, id }}>
      {(ids) => (
        <div className={classNames('control', wrong && 'is-wrong')}>
          <textarea rows={3} {...area} {...ids} />
        </div>
      )}
    </Field>
  )
}
