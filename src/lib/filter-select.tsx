import { SelectField } from '../ui/select-field.tsx'
import type { SelectOption } from '../ui/select-field.tsx'
import type { ListState } from './list-state.ts'

/** A filter of a list: one of a few values, kept in the address, or any. */
export function FilterSelect({
  list,
  name,
  label,
  any,
  options,
}: {
  list: ListState
  /** Its name in the address. */
  name: string
  label: string
  /** What stands for no filter: "every kind". */
  any: string
  options: readonly SelectOption[]
}) {
  const chosen = options.find((option) => option.value === list.get(name))
  return (
    <SelectField
      label={label}
      startsEmpty={false}
      options={[{ value: '', label: any }, ...options]}
      value={chosen?.value ?? ''}
      onChange={(event) => list.set({ [name]: event.target.value })}
    />
  )
}

/** Values with their names, as choices. */
export const choicesOf = <V extends string>(
  values: readonly V[],
  names: Readonly<Record<V, string>>,
): SelectOption[] => values.map((value) => ({ value, label: names[value] }))
