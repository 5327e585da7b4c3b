import type { FieldErrors, FieldValues } from 'react-hook-form'
import type { WrongField } from '../ui/wrong-summary.tsx'

/**
 * Every fault of a form as a list for its summary, in the order of the form's own values.
 *
 * @param labelOf the label of a field by its name, for example `lines.0.count`
 */
export function listFaults<V extends FieldValues>(
  errors: FieldErrors<V>,
  labelOf: (name: string) => string,
): WrongField[] {
  const found: WrongField[] = []
  const walk = (node: unknown, name: string) => {
    if (typeof node !== 'object' || node === null) return
    const { message, ref: _ref, ...inside } = node as { message?: unknown; ref?: unknown }
    if (typeof message === 'string') found.push({ id: name, label: labelOf(name), says: message })
    else for (const [key, value] of Object.entries(inside)) walk(value, name === '' ? key : `${name}.${key}`)
  }
  walk(errors, '')
  return found
}
