import type { EnclosureKind } from '../../../shared/domain/places/enclosure-kind.ts'
import type { Db } from '../../platform/database/db.ts'
import { readEnclosure, readEnclosures } from './enclosures.reads.ts'
import type { EnclosureReadRow } from './enclosures.reads.ts'

/** What other features need to know of a place. */
export interface EnclosureBrief {
  id: string
  code: string
  name: string
  kind: EnclosureKind
  area: string
  /** Name of the quarantine boundary it lies in; null outside every one */
  boundary: string | null
  airSpace: string | null
  treatmentVessel: boolean
  fillMarkLitres: number | null
  /** null for a land area */
  waterBodyId: string | null
  inUseFrom: Date
  inUseUntil: Date | null
}

export const briefOf = (row: EnclosureReadRow): EnclosureBrief => ({
  id: row.id,
  code: row.code,
  name: row.name,
  kind: row.kind,
  area: row.area,
  boundary: row.boundary,
  airSpace: row.air_space,
  treatmentVessel: row.treatment_vessel,
  fillMarkLitres: row.fill_mark_litres,
  waterBodyId: row.water_body_id,
  inUseFrom: row.in_use_from,
  inUseUntil: row.in_use_until,
})

/** Narrow answers about enclosures; each takes the transaction of the asker, or reads what is committed. */
export function createEnclosureQuestions(parts: { dataSource: Db }) {
  return {
    /** The enclosure with this code, also one out of use; null when there is none. */
    async byCode(code: string, db: Db = parts.dataSource): Promise<EnclosureBrief | null> {
      const row = await readEnclosure(db, { code })
      return row && briefOf(row)
    },
    async byId(id: string, db: Db = parts.dataSource): Promise<EnclosureBrief | null> {
      const row = await readEnclosure(db, { id })
      return row && briefOf(row)
    },
    /** Every enclosure in use at an instant, by code. */
    async inUseAt(at: Date, db: Db = parts.dataSource): Promise<EnclosureBrief[]> {
      return (await readEnclosures(db, {}, at)).map(briefOf)
    },
  }
}

export type EnclosureQuestions = ReturnType<typeof createEnclosureQuestions>
