import { Minus, Plus } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { classNames } from './class-names.ts'
import { FieldGroup } from './field.tsx'
import type { FieldProps } from './field.tsx'
import { Icon } from './icon.tsx'

/**
 * A count by big buttons, for wet hands. It starts "not set", which is not 0; the first press of minus says 0.
 *
 * @param max the largest count that can be said, absent for none
 */
export function Stepper({
  value,
  onChange,
  max,
  ...field
}: FieldProps & { value: number | null; onChange: (next: number) => void; max?: number }) {
  return (
    <FieldGroup {...field}>
      {({ labelId, describedBy }) => (
        <div className="stepper" role="group" aria-labelledby={labelId} aria-describedby={describedBy}>
          <button
            type="button"
            aria-label={partWords.oneLess}
            onClick={() => onChange(Math.max(0, (value ?? 0) - 1))}
          >
            <Icon of={Minus} size={20} />
          </button>
          <output className={classNames(value === null && 'is-unset')}>{value ?? partWords.notSet}</output>
          <button
            type="button"
            aria-label={partWords.oneMore}
            onClick={() => onChange(Math.min(max ?? Infinity, (value ?? 0) + 1))}
          >
            <Icon of={Plus} size={20} />
          </button>
        </div>
      )}
    </FieldGroup>
  )
}
