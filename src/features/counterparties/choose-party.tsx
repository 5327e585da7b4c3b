import { useState } from 'react'
import type { Ref } from 'react'
import { useQuery } from '@tanstack/react-query'
import { chooserWords as words } from '../../../shared/messages/choosers.ts'
import { counterpartyKindNames } from '../../../shared/messages/register-kinds.ts'
import { Combobox } from '../../ui/combobox.tsx'
import type { FieldProps } from '../../ui/field.tsx'
import { partiesQuery } from './queries.ts'

/** Chooses another party on file, searched on the server. */
export function PartyChooser(
  props: FieldProps & {
    value: string | null
    onChange: (next: string | null) => void
    id?: string
    name?: string
    ref?: Ref<HTMLInputElement>
    onBlur?: () => void
  },
) {
  const [typed, setTyped] = useState('')
  const [chosenName, setChosenName] = useState<string>()
  const { data, isFetching } = useQuery({
    ...partiesQuery({ q: typed, limit: 20 }),
    enabled: typed.length >= 2,
  })
  const rows = data?.rows ?? []
  return (
    <Combobox
      {...props}
      hint={props.hint ?? words.partyHint}
      options={rows.map((row) => ({
        value: row.id,
        name: row.name,
        detail: counterpartyKindNames[row.kind],
      }))}
      searching={isFetching}
      valueName={chosenName}
      onSearch={setTyped}
      onChange={(next) => {
        setChosenName(rows.find((row) => row.id === next)?.name)
        props.onChange(next)
      }}
    />
  )
}
