import { useId } from 'react'
import type { ReactNode } from 'react'
import { Info } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { Icon } from './icon.tsx'

/** What every field takes, whatever its control. */
export interface FieldProps {
  label: string
  /** One line under the control; gives way to `wrong`. */
  hint?: ReactNode
  /** What to do, in words; its presence marks the field. */
  wrong?: string | undefined
  optional?: boolean
  /** The label is for readers only, because the sheet already says it. */
  labelHidden?: boolean
}

/** What the control inside a field has to carry, so that label, hint and fault belong to it. */
export interface ControlIds {
  id: string
  'aria-describedby': string | undefined
  'aria-invalid': true | undefined
}

/** Label above, control, and one line below: the hint, or what is wrong. Never a placeholder as label. */
export function Field({
  label,
  hint,
  wrong,
  optional,
  labelHidden,
  id: givenId,
  children,
}: FieldProps & { id?: string | undefined; children: (ids: ControlIds) => ReactNode }) {
  const ownId = useId()
  const id = givenId ?? ownId
  const below = `${id}-below`
  return (
    <div className="field">
      <label className={labelHidden ? 'visually-hidden' : 'field-label'} htmlFor={id}>
        {label}
        {optional ? <span className="t-note"> ({partWords.optional})</span> : null}
      </label>
      {children({
        id,
        'aria-describedby': wrong || hint ? below : undefined,
        'aria-invalid': wrong ? true : undefined,
      })}
      <FieldBelow id={below} hint={hint} wrong={wrong} />
    </div>
  )
}

/** The line under a control. */
export function FieldBelow({
  id,
  hint,
  wrong,
}: {
  id: string
  hint?: ReactNode
  wrong?: string | undefined
}) {
  if (wrong) {
    return (
      <span id={id} className="wrong">
        <Icon of={Info} />
        <span>{wrong}</span>
      </span>
    )
  }
  return hint ? (
    <span id={id} className="hint">
      {hint}
    </span>
  ) : null
}

/** Several controls under one heading, such as a choice: the heading is their group name. */
export function FieldGroup({
  label,
  hint,
  wrong,
  children,
}: FieldProps & { children: (ids: { labelId: string; describedBy: string | undefined }) => ReactNode }) {
  const id = useId()
  const below = `${id}-below`
  return (
    <div className="field">
      <span id={`${id}-label`} className="field-label">
        {label}
      </span>
      {children({ labelId: `${id}-label`, describedBy: wrong || hint ? below : undefined })}
      <FieldBelow id={below} hint={hint} wrong={wrong} />
    </div>
  )
}
