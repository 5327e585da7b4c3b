import { get, set } from 'react-hook-form'
import type { FieldErrors, FieldValues, Resolver } from 'react-hook-form'
import type { z } from 'zod'
// gives the faults of every schema their words
import '../../shared/contracts/input-words.ts'
import { formWords } from '../../shared/messages/form.ts'

/**
 * Checks a form by the schema of the body that it will send, so that the form and the server ask for the same. Names in
 * the form are those of the body, so that a fault found by either stands at the same field.
 *
 * @param needed names of fields that the form itself asks for, though the schema would let them pass
 */
export function bodyResolver<V extends FieldValues>(
  schema: z.ZodType | undefined,
  toBody: (values: V) => unknown,
  needed: (values: V) => readonly string[] = () => [],
): Resolver<V> {
  if (!schema) throw new Error('a form needs a contract with a body')
  return (values) => {
    const body = toBody(values)
    const parsed = schema.safeParse(body)
    const errors: FieldErrors<V> = {}
    for (const name of needed(values)) set(errors, name, { type: 'needed', message: formWords.needed })
    if (parsed.success && Object.keys(errors).length === 0) return { values, errors: {} }
    for (const issue of parsed.error?.issues ?? []) {
      const name = issue.path.map(String).join('.')
      if (get(errors, name)) continue
      set(errors, name, { type: 'body', message: issue.message })
    }
    return { values: {}, errors }
  }
}
