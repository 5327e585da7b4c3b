import { Field } from './field.tsx'
import type { FieldProps } from './field.tsx'

/** A file from the device: the browser's own control, so that a phone offers its camera. */
export function FileField({
  onFile,
  accept,
  ...field
}: FieldProps & { onFile: (file: File | null) => void; accept?: string; id?: string }) {
  return (
    <Field {...field}>
      {(ids) => (
        <div className="control control-file">
          <input
            {...ids}
            type="file"
            accept={accept}
            onChange={(event) => onFile(event.target.files?.[0] ?? null)}
          />
        </div>
      )}
    </Field>
  )
}
