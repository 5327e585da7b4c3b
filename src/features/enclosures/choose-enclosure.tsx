import type { Ref } from 'react'
import { queryOptions, useQuery } from '@tanstack/react-query'
import { listEnclosures } from '../../../shared/contracts/enclosures.contract.ts'
import { api } from '../../lib/api-client.ts'
import { Combobox } from '../../ui/combobox.tsx'
import type { FieldProps } from '../../ui/field.tsx'

/** The enclosures in use, few enough to be held here. */
export const everyEnclosure = queryOptions({
  queryKey: ['enclosures', 'every'],
  queryFn: ({ signal }) => api(listEnclosures, { query: { limit: 200, sort: 'code' }, signal }),
  staleTime: 5 * 60_000,
})

/** Chooses an enclosure by its code, name or part of the house. */
export function EnclosureChooser(
  props: FieldProps & {
    value: string | null
    onChange: (next: string | null) => void
    id?: string
    name?: string
    ref?: Ref<HTMLInputElement>
    onBlur?: () => void
  },
) {
  const { data, isPending } = useQuery(everyEnclosure)
  const options = (data?.rows ?? []).map((row) => ({
    value: row.id,
    name: `${row.code}, ${row.name}`,
    detail: row.area,
    aside: row.boundary ?? '',
  }))
  return <Combobox {...props} options={options} searching={isPending} />
}
