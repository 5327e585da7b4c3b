import { containing } from '../../platform/database/like.ts'
import type { LifeStage } from '../../../shared/domain/animals/description.ts'
import type { SourceMark } from '../../../shared/domain/sources.ts'
import type { SensitivityCode, SensitivityLevel } from '../../../shared/domain/taxa/sensitivity.ts'
import type { QuarantineKindName, TaxonGroup } from '../../../shared/domain/taxa/taxon-group.ts'
import type { Db } from '../../platform/database/db.ts'

export interface WeightBandReadRow {
  id: string
  stage: LifeStage | null
  low: string
  high: string
  unit: string
  low_kg: number
  high_kg: number
  source: string
  mark: SourceMark
  recorded_at: string
  recorded_by_name: string | null
}

export interface SensitivityReadRow {
  code: SensitivityCode
  level: SensitivityLevel
  note: string | null
  recorded_at: string
  recorded_by_name: string | null
}

export interface TaxonReadRow {
  id: string
  scientific_name: string
  common_name: string
  taxon_group: TaxonGroup
  quarantine_kind: QuarantineKindName
  note: string | null
  version: number
  weight_bands: WeightBandReadRow[]
  sensitivities: SensitivityReadRow[]
  animals_here: number
  total: number
}

export interface TaxaFilter {
  ids?: readonly string[]
  q?: string
  group?: string
  kind?: string
  sort?: keyof typeof sortColumns
  direction?: 'asc' | 'desc'
  offset?: number
  limit?: number
}

const sortColumns = {
  scientificName: 'lower(t.scientific_name)',
  commonName: 'lower(t.common_name)',
  group: 't.taxon_group',
} as const

/** Taxa with the newest band of each stage and the newest sensitivity of each code. */
export function readTaxa(db: Db, filter: TaxaFilter): Promise<TaxonReadRow[]> {
  const direction = filter.direction === 'desc' ? 'DESC' : 'ASC'
  return db.query(
    `SELECT t.id, t.scientific_name, t.common_name, t.taxon_group, t.quarantine_kind, t.note, t.version,
            coalesce((SELECT json_agg(to_jsonb(b) ORDER BY b.stage NULLS FIRST) FROM (
               SELECT DISTINCT ON (b.stage) b.id, b.stage, b.low_entered_value::text AS low,
                      b.high_entered_value::text AS high, b.entered_unit AS unit, b.low_kg, b.high_kg, b.source, b.mark,
                      b.recorded_at,
                      (SELECT p.printed_name FROM people p WHERE p.id = b.recorded_by) AS recorded_by_name
                 FROM taxon_weight_bands b WHERE b.taxon_id = t.id
                ORDER BY b.stage, b.position DESC) b), '[]') AS weight_bands,
            coalesce((SELECT json_agg(to_jsonb(s) ORDER BY s.code) FROM (
               SELECT DISTINCT ON (s.code) s.code, s.level, s.note, s.recorded_at,
                      (SELECT p.printed_name FROM people p WHERE p.id = s.recorded_by) AS recorded_by_name
                 FROM taxon_sensitivities s WHERE s.taxon_id = t.id
                ORDER BY s.code, s.position DESC) s WHERE s.level <> 'none'), '[]') AS sensitivities,
            (SELECT count(*)::int FROM animals a JOIN stays y ON y.animal_id = a.id AND upper_inf(y.during)
              WHERE a.taxon_id = t.id) AS animals_here,
            count(*) OVER ()::int AS total
       FROM taxa t
      WHERE ($1::uuid[] IS NULL OR t.id = ANY ($1))
        AND ($2::text IS NULL OR plain_text(t.scientific_name) LIKE plain_text($2) OR plain_text(t.common_name) LIKE plain_text($2))
        AND ($3::text IS NULL OR t.taxon_group = $3) AND ($4::text IS NULL OR t.quarantine_kind = $4)
      ORDER BY ${sortColumns[filter.sort ?? 'commonName']} ${direction}, t.id LIMIT $5 OFFSET $6`,
    [
      filter.ids ?? null,
      containing(filter.q),
      filter.group ?? null,
      filter.kind ?? null,
      filter.limit ?? null,
      filter.offset ?? 0,
    ],
  )
}
