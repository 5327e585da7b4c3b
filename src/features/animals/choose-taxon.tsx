import type { Ref } from 'react'
import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query'
import { listTaxa } from '../../../shared/contracts/taxa.contract.ts'
import { chooserWords as words } from '../../../shared/messages/choosers.ts'
import { api } from '../../lib/api-client.ts'
import { Combobox } from '../../ui/combobox.tsx'
import type { FieldProps } from '../../ui/field.tsx'

/** The list of taxa, short enough to be held here. */
export const everyTaxon = queryOptions({
  queryKey: ['taxa', 'every'],
  queryFn: ({ signal }) => api(listTaxa, { query: { limit: 200, sort: 'commonName' }, signal }),
  placeholderData: keepPreviousData,
  staleTime: 5 * 60_000,
})

export interface ChooserProps extends FieldProps {
  value: string | null
  onChange: (next: string | null) => void
  id?: string
  name?: string
  ref?: Ref<HTMLInputElement>
  onBlur?: () => void
}

/** Chooses a taxon by its common or scientific name. */
export function TaxonChooser(props: ChooserProps) {
  const { data, isPending } = useQuery(everyTaxon)
  const options = (data?.rows ?? []).map((row) => ({
    value: row.id,
    name: row.commonName,
    detail: row.scientificName,
  }))
  return <Combobox {...props} options={options} searching={isPending} hint={props.hint ?? words.taxonHint} />
}
