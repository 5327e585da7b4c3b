import { useState } from 'react'
import type { Ref } from 'react'
import { useQuery } from '@tanstack/react-query'
import type { PermitRow } from '../../../shared/contracts/permits.contract.ts'
import { chooserWords } from '../../../shared/messages/choosers.ts'
import { permitWords as words } from '../../../shared/messages/permits-sheet.ts'
import { permitStateNames } from '../../../shared/messages/register-kinds.ts'
import { sayNumber } from '../../lib/say-number.ts'
import { Combobox } from '../../ui/combobox.tsx'
import type { FieldProps } from '../../ui/field.tsx'
import { permitsQuery } from './queries.ts'

/** How much of a permit is left, beside its state, in one short line. */
export function permitBrief(row: Pick<PermitRow, 'state' | 'remaining' | 'quantityAllowed'>): string {
  const left =
    row.quantityAllowed === null || row.remaining === null
      ? words.noNumberStated
      : `${sayNumber(row.remaining)} / ${sayNumber(row.quantityAllowed)}`
  return `${permitStateNames[row.state]}, ${left}`
}

/** Chooses a permit on file; what is void, expired or used up can be chosen too, since it may have been used. */
export function PermitChooser(
  props: FieldProps & {
    value: string | null
    onChange: (next: string | null) => void
    id?: string
    name?: string
    ref?: Ref<HTMLInputElement>
    onBlur?: () => void
  },
) {
  const [chosen, setChosen] = useState<PermitRow>()
  const { data, isPending } = useQuery(permitsQuery({ sort: 'validUntil', direction: 'desc', limit: 200 }))
  const rows = data?.rows ?? []
  return (
    <Combobox
      {...props}
      hint={props.value !== null && chosen ? permitBrief(chosen) : (props.hint ?? chooserWords.permitHint)}
      options={rows.map((row) => ({
        value: row.id,
        name: `${row.number}, ${row.authority} ${row.permitNumber}`,
        aside: permitBrief(row),
      }))}
      searching={isPending}
      onChange={(next) => {
        setChosen(rows.find((row) => row.id === next))
        props.onChange(next)
      }}
    />
  )
}
