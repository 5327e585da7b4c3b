import type { Tx } from '../../platform/database/transactions.ts'
import { insertOnce, isRepeated } from '../../platform/database/rows.ts'
import {
  ObservationBodiesRow,
  ObservationCaseRow,
  ObservationDeathRow,
  ObservationReviewRow,
  ObservationRow,
  ObservationVoidRow,
} from './observation.entity.ts'

/** Whether this observation was written before; the same id with other content is refused. */
export function isObservationRepeated(tx: Tx, row: ObservationRow): Promise<boolean> {
  const { id, enclosureId, saidAt, feeding, breathing, skin, words, countBasis, countLow, countHigh } = row
  const { foundDead, unwell, handled, lookedAt, forVeterinarian, urgent } = row
  const content = {
    id,
    enclosureId,
    saidAt,
    feeding,
    breathing,
    skin,
    words,
    countBasis,
    countLow,
    countHigh,
  }
  return isRepeated(tx, ObservationRow, {
    ...content,
    foundDead,
    unwell,
    handled,
    lookedAt,
    forVeterinarian,
    urgent,
  })
}

export async function insertObservation(
  tx: Tx,
  row: ObservationRow,
  caseIds: readonly string[],
): Promise<void> {
  await tx.manager.insert(ObservationRow, row)
  for (const caseId of caseIds) await tx.manager.insert(ObservationCaseRow, { observationId: row.id, caseId })
}

export async function linkDeath(tx: Tx, observationId: string, deathId: string): Promise<void> {
  await tx.manager.insert(ObservationDeathRow, { observationId, deathId })
}

export function findObservation(tx: Tx, id: string): Promise<ObservationRow | null> {
  return tx.manager.findOneBy(ObservationRow, { id })
}

export function insertReview(tx: Tx, row: ObservationReviewRow): Promise<{ created: boolean }> {
  return insertOnce(tx, ObservationReviewRow, row, ['observationId', 'words'])
}

export async function insertVoid(tx: Tx, row: ObservationVoidRow): Promise<void> {
  await tx.manager.insert(ObservationVoidRow, row)
}

export function isVoided(tx: Tx, observationId: string): Promise<boolean> {
  return tx.manager.existsBy(ObservationVoidRow, { observationId })
}

export function findBodies(tx: Tx, observationId: string): Promise<ObservationBodiesRow[]> {
  return tx.manager.findBy(ObservationBodiesRow, { observationId })
}

export function insertBodies(tx: Tx, row: ObservationBodiesRow): Promise<{ created: boolean }> {
  return insertOnce(tx, ObservationBodiesRow, row, ['observationId', 'namedCount', 'reason'])
}

export interface OpenBodiesRow {
  id: string
  enclosure_id: string
  happened_at: Date
  happened_on: string
  left_count: number
}

/** Bodies that an observation `o` had named by deaths that were struck out since: they are without a name again. */
export const namedByStruck = `(SELECT coalesce(sum(d.seen_count), 0)::int FROM observation_deaths k
    JOIN deaths d ON d.id = k.death_id JOIN animal_voids s ON s.death_id = d.id WHERE k.observation_id = o.id)`

/** Bodies of an observation `o` that have no name, explained or not. */
const withoutName = `(o.unassigned_dead + ${namedByStruck}
    - (SELECT coalesce(sum(b.named_count), 0)::int FROM observation_bodies b WHERE b.observation_id = o.id))`

/** How many bodies of an observation lost their name again. */
export async function countNamedByStruck(tx: Tx, observationId: string): Promise<number> {
  const [row]: { count: number }[] = await tx.manager.query(
    `SELECT ${namedByStruck} AS count FROM observations o WHERE o.id = $1`,
    [observationId],
  )
  return row?.count ?? 0
}

/** The observation that a death named a body of, unless it was struck out. */
export async function findNamedBy(
  tx: Tx,
  deathId: string,
): Promise<(OpenBodiesRow & { waiting_case_ids: string[] }) | null> {
  const [row]: (OpenBodiesRow & { waiting_case_ids: string[] })[] = await tx.manager.query(
    `SELECT o.id, o.enclosure_id, o.happened_at, o.happened_on::text AS happened_on, d.seen_count AS left_count,
            ARRAY(SELECT e.case_id FROM live_case_events e
                   WHERE e.observation_id = o.id AND e.facts ->> 'diedElsewhereId' = d.id::text) AS waiting_case_ids
       FROM observation_deaths k JOIN observations o ON o.id = k.observation_id JOIN deaths d ON d.id = k.death_id
      WHERE k.death_id = $1 AND NOT EXISTS (SELECT 1 FROM observation_voids v WHERE v.observation_id = o.id)`,
    [deathId],
  )
  return row ?? null
}

/** Bodies without a name that were found in these enclosures and never stood in this case. */
export function findOpenBodies(
  tx: Tx,
  caseId: string,
  enclosureIds: readonly string[],
): Promise<OpenBodiesRow[]> {
  return tx.manager.query(
    `SELECT o.id, o.enclosure_id, o.happened_at, o.happened_on::text AS happened_on,
            ${withoutName} AS left_count
       FROM observations o
      WHERE o.enclosure_id = ANY ($2::uuid[]) 
        AND ${withoutName} > 0
        AND NOT EXISTS (SELECT 1 FROM observation_voids v WHERE v.observation_id = o.id)
        AND NOT EXISTS (SELECT 1 FROM case_events e
                         WHERE e.case_id = $1 AND e.observation_id = o.id AND e.kind = 'death')
      ORDER BY o.happened_at, o.id`,
    [caseId, enclosureIds],
  )
}

/** Of these deaths, those of animals that were elsewhere by their moves. */
export async function findDiedElsewhere(tx: Tx, deathIds: readonly string[]): Promise<Set<string>> {
  const rows: { source_id: string }[] = await tx.manager.query(
    `SELECT d.source_id FROM discrepancies d
      WHERE d.kind = 'died-elsewhere' AND d.source_kind = 'death' AND d.source_id = ANY ($1::uuid[])`,
    [deathIds],
  )
  return new Set(rows.map(({ source_id }) => source_id))
}

export interface BodiesEventRow {
  id: string
  case_id: string
  number: string
  /** A veterinarian signed the cause of these deaths in that case. */
  is_signed: boolean
}

/** The events that stand for bodies that the observation could not name: one in each case that lived there. */
export function findBodiesEvents(tx: Tx, observationId: string): Promise<BodiesEventRow[]> {
  return tx.manager.query(
    `SELECT e.id, e.case_id, c.number,
            EXISTS (SELECT 1 FROM live_case_events s
                     WHERE s.kind = 'death-cause-signed' AND s.facts ->> 'deathEventId' = e.id::text) AS is_signed
       FROM live_case_events e JOIN quarantine_cases c ON c.id = e.case_id
      WHERE e.observation_id = $1 AND e.kind = 'death' AND e.facts ->> 'diedElsewhereId' IS NULL
      ORDER BY c.number, e.id`,
    [observationId],
  )
}
