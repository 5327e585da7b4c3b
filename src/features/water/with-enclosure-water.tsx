import type { ReactNode } from 'react'
import { useQuery } from '@tanstack/react-query'
import type { WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { paths } from '../../lib/paths.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { enclosureWaterQuery } from './queries.ts'

/** Reads an enclosure with its water and draws it; until then, or when it cannot be read, says so on the sheet. */
export function WithEnclosureWater({
  code,
  children,
}: {
  code: string
  children: (water: WaterOfEnclosure) => ReactNode
}) {
  const query = useQuery(enclosureWaterQuery(code))
  if (query.data) return children(query.data)
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={waterWords.title} title={code} />
      </Area>
      <Area className="pane">
        <QueryStanding
          query={query}
          what={code}
          titleOf={(problem) =>
            ['not-found', 'bad-input'].includes(problem.code)
              ? waterWords.noSuchEnclosure({ code })
              : undefined
          }
          act={<ButtonLink to={paths.water()}>{waterWords.showAll}</ButtonLink>}
        />
      </Area>
    </Sheet>
  )
}
