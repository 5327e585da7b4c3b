import { get, useFormContext } from 'react-hook-form'
import type { FieldPath } from 'react-hook-form'
import type { TransactionValues } from './transaction-form-model.ts'

/** What a text field of the form takes: its id is its name, so that a summary can lead to it. */
export function useFormField() {
  const { register, formState } = useFormContext<TransactionValues>()
  const wrong = (name: string): string | undefined =>
    (get(formState.errors, name) as { message?: string } | undefined)?.message
  return {
    wrong,
    field: (name: FieldPath<TransactionValues>) => ({ id: name, wrong: wrong(name), ...register(name) }),
  }
}
