import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { animalWords as words } from '../../../shared/messages/animal-sheet.ts'
import { usePreference } from '../../lib/preferences.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { ListFetching, ListUnreadable } from '../../ui/list-states.tsx'
import { Quantity } from '../../ui/quantity.tsx'
import { countText } from './animal-name.ts'
import { inhabitantsQuery } from './queries.ts'
import { Standing } from './standing.tsx'
import { weightOfOne } from './weight-text.ts'

/** Who is in an enclosure now, or was at an instant: for the sheet of the enclosure. */
export function Inhabitants({ code, at }: { code: string; at?: string }) {
  const { data, error, isPending, refetch } = useQuery(inhabitantsQuery(code, at))
  const preferred = usePreference('massUnit')
  if (isPending) return <ListFetching what={words.whatAnimals} rows={2} />
  if (!data)
    return (
      <ListUnreadable
        why={isProblem(error) ? error.says : words.fetchFailed}
        onRetry={() => void refetch()}
      />
    )
  if (data.rows.length === 0) return <p className="t-2">{words.nobody}</p>
  return (
    <ul className="stack gap-0">
      {data.rows.map((row) => (
        <li key={row.id} className="row row-between row-wrap border-b border-hair py-2">
          <span>
            <Link to={paths.animal(row.accession)} className="num t-strong">
              {row.accession}
            </Link>{' '}
            {row.name ? `${row.name}, ${row.taxon.commonName}` : row.taxon.commonName}
            {row.form === 'group' ? `, ${countText(row.count)}` : ''}
          </span>
          <span className="row">
            {row.newestWeight ? <Quantity of={weightOfOne(row.newestWeight, preferred)} /> : null}
            <Standing animal={row} />
          </span>
        </li>
      ))}
    </ul>
  )
}
