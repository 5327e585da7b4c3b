import { Info } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { Icon } from './icon.tsx'

export interface WrongField {
  /** Id of the control. */
  id: string
  label: string
  says: string
}

/** Above a form that could not be sent: every field at fault, each a link to it. The caller moves the focus to the first. */
export function WrongSummary({
  fields,
  general,
}: {
  fields: readonly WrongField[]
  general?: string | undefined
}) {
  if (fields.length === 0 && !general) return null
  return (
    <div className="border-2 border-ink px-3 py-2 grid gap-1" role="alert">
      <p className="wrong">
        <Icon of={Info} />
        <span>{general ?? partWords.fieldsToChange({ count: fields.length })}</span>
      </p>
      {fields.length > 0 ? (
        <ul className="ml-6 text-[13px]">
          {fields.map((field) => (
            <li key={field.id}>
              <a
                className="inline-block min-h-6 py-0.5"
                href={`#${field.id}`}
                onClick={(event) => {
                  event.preventDefault()
                  document.getElementById(field.id)?.focus()
                }}
              >
                {field.label}: {field.says}
              </a>
            </li>
          ))}
        </ul>
      ) : null}
    </div>
  )
}
