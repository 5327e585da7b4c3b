import type { ComponentProps } from 'react'
import { classNames } from './class-names.ts'
import { Field } from './field.tsx'
import type { FieldProps } from './field.tsx'

/** One line of text. Takes what a form's `register` gives. */
export function TextField({
  label,
  hint,
  wrong,
  optional,
  labelHidden,
  id,
  type = 'text',
  ...input
}: FieldProps & ComponentProps<'input'>) {
  return (
    <Field {...{ label, hint, wrong, optional, labelHidden, id }}>
      {(ids) => (
        <div className={classNames('control', wrong && 'is-wrong')}>
          <input {...input} {...ids} type={type} />
        </div>
      )}
    </Field>
  )
}
