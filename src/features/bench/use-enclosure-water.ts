import { useEffect, useRef, useState } from 'react'
import { useQueryClient } from '@tanstack/react-query'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { useFacilityNow } from '../../lib/facility-time.ts'
import { useMe } from '../../lib/me.ts'
import { everyEnclosure } from '../enclosures/index.ts'
import { enclosureWaterQuery } from '../water/index.ts'
import type { Draft } from './bench-draft.ts'
import { enclosureFigures, noteOf, originOf, withEnclosureFigures } from './enclosure-figures.ts'
import type { FieldNote, FoundFigure } from './enclosure-figures.ts'

interface Chosen {
  id: string
  code: string
  figures: Record<string, FoundFigure>
  /** How far the server's clock is ahead of the device's: ages go by the server's. */
  aheadMs: number
}

/**
 * The enclosure whose figures stand in the fields. It is asked anew each time it is chosen.
 *
 * @param startId the enclosure that was chosen when the sheet was left for a form
 */
export function useEnclosureWater(
  of: AnyCalculator,
  change: (next: (draft: Draft) => Draft) => void,
  startId: string | null,
) {
  const client = useQueryClient()
  const { zone } = useMe().facility
  const [wanted, setWanted] = useState<string | null>(null)
  const [chosen, setChosen] = useState<Chosen | null>(null)
  const [wrong, setWrong] = useState<string | undefined>()
  const latest = useRef<string | null>(null)
  // ages go on while the sheet lies open
  useFacilityNow(zone)

  /** Forgets the enclosure, and leaves the fields to whoever empties or fills them. */
  const forget = () => {
    latest.current = null
    setWanted(null)
    setChosen(null)
    setWrong(undefined)
  }

  const choose = async (id: string | null) => {
    const before = chosen?.figures ?? {}
    forget()
    if (id === null) return change((draft) => withEnclosureFigures(draft, {}, before))
    latest.current = id
    setWanted(id)
    try {
      const { rows } = await client.ensureQueryData(everyEnclosure)
      const code = rows.find((row) => row.id === id)?.code ?? ''
      const water = await client.fetchQuery({ ...enclosureWaterQuery(code), staleTime: 0 })
      // another one was chosen while the answer was on its way
      if (latest.current !== id) return
      const figures = enclosureFigures(of, water, zone)
      setChosen({ id, code, figures, aheadMs: Date.parse(water.asOf) - Date.now() })
      change((draft) => withEnclosureFigures(draft, figures, before))
    } catch (error) {
      if (!isProblem(error)) throw error
      if (latest.current !== id) return
      setWrong(error.says)
      change((draft) => withEnclosureFigures(draft, {}, before))
    }
  }

  const first = useRef(startId)
  useEffect(() => {
    const id = first.current
    first.current = null
    if (id !== null) void choose(id)
  })

  return {
    id: wanted,
    /** The enclosure whose water answered. */
    chosen,
    asking: wanted !== null && chosen === null && wrong === undefined,
    wrong,
    choose,
    forget,
    /** Where the figure in a field comes from; undefined where a person typed it. */
    originOf: (name: string, given: Draft[string] | undefined) =>
      originOf(chosen?.figures[name], given, zone),
    /** What is said beside a field; undefined where no enclosure has anything to say. */
    note(name: string, given: Draft[string] | undefined): FieldNote | undefined {
      const figure = chosen?.figures[name]
      if (!chosen || !figure) return undefined
      return noteOf(figure, given, new Date(Date.now() + chosen.aheadMs).toISOString())
    },
  }
}

export type EnclosureWater = ReturnType<typeof useEnclosureWater>
