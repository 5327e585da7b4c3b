import { TextField } from './text-field.tsx'
import type { FieldProps } from './field.tsx'

/** A date and time, facility time: the browser's own control, which every phone has. */
export function MomentField({
  value,
  onChange,
  ...field
}: FieldProps & { value: string; onChange: (next: string) => void; id?: string; max?: string }) {
  return (
    <TextField
      {...field}
      type="datetime-local"
      value={value}
      onChange={(event) => onChange(event.target.value)}
    />
  )
}
