import { useState } from 'react'
import type { ComponentProps } from 'react'
import { Eye, EyeOff } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { classNames } from './class-names.ts'
import { Field } from './field.tsx'
import type { FieldProps } from './field.tsx'
import { Icon } from './icon.tsx'

/**
 * A password. For a signature give `autoComplete="off"`: the field there never remembers and is never filled.
 */
export function PasswordField({
  label,
  hint,
  wrong,
  optional,
  labelHidden,
  id,
  ...input
}: FieldProps & ComponentProps<'input'>) {
  const [shown, setShown] = useState(false)
  return (
    <Field {...{ label, hint, wrong, optional, labelHidden, id }}>
      {(ids) => (
        <div className={classNames('control', wrong && 'is-wrong')}>
          <input {...input} {...ids} type={shown ? 'text' : 'password'} spellCheck={false} />
          <button
            type="button"
            className="control-cue"
            aria-label={shown ? partWords.hidePassword : partWords.showPassword}
            onClick={() => setShown(!shown)}
          >
            <Icon of={shown ? EyeOff : Eye} />
          </button>
        </div>
      )}
    </Field>
  )
}
