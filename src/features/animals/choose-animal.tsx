import { useState } from 'react'
import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query'
import { listAnimals } from '../../../shared/contracts/animals.contract.ts'
import { chooserWords as words } from '../../../shared/messages/choosers.ts'
import { api } from '../../lib/api-client.ts'
import { Combobox } from '../../ui/combobox.tsx'
import type { ChooserProps } from './choose-taxon.tsx'

const foundAnimals = (q: string, form?: 'individual' | 'group') =>
  queryOptions({
    queryKey: ['animals', 'found', q, form ?? 'any'],
    queryFn: ({ signal }) => api(listAnimals, { query: { q, form, limit: 20 }, signal }),
    placeholderData: keepPreviousData,
    enabled: q.length >= 2,
  })

/** Chooses an animal or group in the house, searched on the server by number, name, mark, taxon or place. */
export function AnimalChooser({
  form,
  onForm,
  ...props
}: ChooserProps & {
  /** Only these; both unless told. */
  form?: 'individual' | 'group'
  /** Told whether the chosen one is an individual or a group, and how many it counts. */
  onForm?: (chosen: { form: 'individual' | 'group'; count: number; place: string | null }) => void
}) {
  const [typed, setTyped] = useState('')
  const [chosenName, setChosenName] = useState<string>()
  const { data, isFetching } = useQuery(foundAnimals(typed, form))
  const rows = data?.rows ?? []
  const options = rows.map((row) => ({
    value: row.id,
    name: row.name ? `${row.name}, ${row.taxon.commonName}` : row.taxon.commonName,
    detail: row.accession,
    aside: [row.form === 'group' ? String(row.count.ledger) : null, row.place?.code]
      .filter(Boolean)
      .join(', '),
  }))
  return (
    <Combobox
      {...props}
      hint={props.hint ?? words.animalHint}
      options={options}
      searching={isFetching}
      valueName={chosenName}
      onSearch={setTyped}
      onChange={(next) => {
        const row = rows.find((one) => one.id === next)
        setChosenName(row ? `${row.accession}, ${row.taxon.commonName}` : undefined)
        if (row) onForm?.({ form: row.form, count: row.count.ledger, place: row.place?.code ?? null })
        props.onChange(next)
      }}
    />
  )
}
