import { useState } from 'react'
import { keepPreviousData, useQuery } from '@tanstack/react-query'
import type { AnimalRow } from '../../../shared/contracts/animals.contract.ts'
import { chooserWords } from '../../../shared/messages/choosers.ts'
import { Combobox } from '../../ui/combobox.tsx'
import type { FieldProps } from '../../ui/field.tsx'
import { animalListQuery } from '../animals/index.ts'

/** Chooses one animal or group in the house by its number, name, taxon or place; gives its whole row. */
export function BatchAnimalChooser({
  onChoose,
  without = [],
  ...field
}: FieldProps & {
  onChoose: (animal: AnimalRow | null) => void
  /** Numbers that are chosen already. */
  without?: readonly string[]
}) {
  const [typed, setTyped] = useState('')
  const [chosen, setChosen] = useState<AnimalRow | null>(null)
  const { data, isFetching } = useQuery({
    ...animalListQuery({ q: typed, limit: 20 }),
    placeholderData: keepPreviousData,
    enabled: typed.length >= 2,
  })
  const rows = (data?.rows ?? []).filter((row) => !without.includes(row.accession))
  return (
    <Combobox
      {...field}
      hint={field.hint ?? chooserWords.animalHint}
      options={rows.map((row) => ({
        value: row.accession,
        name: row.name ? `${row.name}, ${row.taxon.commonName}` : row.taxon.commonName,
        detail: row.accession,
        aside: row.place?.code ?? '',
      }))}
      searching={isFetching}
      value={chosen?.accession ?? null}
      valueName={chosen ? `${chosen.accession}, ${chosen.taxon.commonName}` : ''}
      onSearch={setTyped}
      onChange={(next) => {
        const row = rows.find((one) => one.accession === next) ?? null
        setChosen(row)
        onChoose(row)
      }}
    />
  )
}
