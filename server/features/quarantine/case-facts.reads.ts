import type { ProtocolContent } from '../../../shared/domain/protocol/protocol-content.ts'
import type { QuarantineKind } from '../../../shared/domain/quarantine/quarantine-kind.ts'
import type { Db } from '../../platform/database/db.ts'
import type { CaseEventFacts } from './case-event-facts.ts'

export interface CaseReadRow {
  id: string
  number: string
  name: string
  quarantine_kind: QuarantineKind
  protocol_version_id: string
  happened_at: Date
  recorded_by_name: string | null
  version: number
  protocol_code: string
  protocol_version: number
  protocol_name: string
  protocol_confirmed: boolean
  content: ProtocolContent
  /** Clearance or transfer; null while it runs. */
  ended_at: Date | null
}

/** The heads of cases with the protocol they began under: those with these ids, or all. */
export function readCases(db: Db, ids?: readonly string[]): Promise<CaseReadRow[]> {
  return db.query(
    `SELECT c.id, c.number, c.name, c.quarantine_kind, c.protocol_version_id, c.happened_at, c.version,
            w.printed_name AS recorded_by_name, p.code AS protocol_code, v.version AS protocol_version,
            v.name AS protocol_name, v.content,
            EXISTS (SELECT 1 FROM protocol_confirmations f WHERE f.protocol_version_id = v.id) AS protocol_confirmed,
            (SELECT min(e.happened_at) FROM live_case_events e
              WHERE e.case_id = c.id AND e.kind IN ('cleared', 'transferred-out')) AS ended_at
       FROM quarantine_cases c
       JOIN protocol_versions v ON v.id = c.protocol_version_id
       JOIN protocols p ON p.id = v.protocol_id
       LEFT JOIN people w ON w.id = c.recorded_by
      WHERE $1::uuid[] IS NULL OR c.id = ANY ($1)
      ORDER BY c.number`,
    [ids ?? null],
  )
}

export async function findCaseId(db: Db, number: string): Promise<string | null> {
  const [row]: { id: string }[] = await db.query(`SELECT c.id FROM quarantine_cases c WHERE c.number = $1`, [
    number,
  ])
  return row?.id ?? null
}

export interface CaseEventReadRow {
  id: string
  case_id: string
  kind: CaseEventFacts['kind']
  facts: CaseEventFacts
  reason: string | null
  observation_id: string | null
  signed_text_id: string | null
  happened_at: Date
  happened_on: string
  recorded_at: Date
  recorded_by_name: string | null
  voided_reason: string | null
}

/**
 * Events of cases as entered, voided ones with the reason. A body that was named as an animal from elsewhere stands until
 * somebody explained that; where they say that it was not that animal, it goes on standing.
 */
export function readCaseEvents(db: Db, caseIds: readonly string[]): Promise<CaseEventReadRow[]> {
  return db.query(
    `SELECT e.id, e.case_id, e.kind, e.facts, e.reason, e.observation_id, e.signed_text_id, e.happened_at,
            e.happened_on::text AS happened_on, e.recorded_at, w.printed_name AS recorded_by_name,
            coalesce((SELECT v.reason FROM case_events v
                       WHERE v.kind = 'voided' AND v.facts ->> 'voidsEventId' = e.id::text),
                     CASE WHEN e.facts ->> 'diedElsewhereId' IS NOT NULL THEN
                       (SELECT x.reason FROM discrepancies d
                          JOIN discrepancy_resolutions x ON x.discrepancy_id = d.id
                         WHERE d.kind = 'died-elsewhere' AND d.source_kind = 'death'
                           AND d.source_id = (e.facts ->> 'diedElsewhereId')::uuid
                           AND x.outcome <> 'seen-wrongly')
                     END) AS voided_reason
       FROM case_events e
       LEFT JOIN people w ON w.id = e.recorded_by
      WHERE e.case_id = ANY ($1::uuid[])
      ORDER BY e.happened_at, e.id`,
    [caseIds],
  )
}

/** Texts that were signed about cases and that no event points at. */
export function readLooseCaseTexts(db: Db): Promise<{ id: string; label: string }[]> {
  return db.query(
    `SELECT t.id, t.subject_label AS label FROM signed_texts t
      WHERE t.subject_kind = 'case'
        AND NOT EXISTS (SELECT 1 FROM case_events e WHERE e.signed_text_id = t.id)
      ORDER BY t.signed_at`,
  )
}

/** An animal of a batch: as it joined, or taken out of one that had joined (then with the joining of that one). */
export interface BatchReadRow {
  case_id: string
  /** The joining that it goes back to. */
  member_id: string
  animal_id: string
  accession: string
  form: 'individual' | 'group'
  house_name: string | null
  common_name: string
  scientific_name: string
  from_split: boolean
  joined_at: Date
  joined_on: string
}

/** The joinings of cases, voided ones left out. */
export function readMembers(db: Db): Promise<Omit<BatchReadRow, 'from_split'>[]> {
  return db.query(
    `SELECT m.case_id, m.id AS member_id, m.animal_id, a.accession, a.form, a.name AS house_name, t.common_name,
            t.scientific_name, m.happened_at AS joined_at, m.happened_on::text AS joined_on
       FROM case_members m
       JOIN animals a ON a.id = m.animal_id
       JOIN taxa t ON t.id = a.taxon_id
      WHERE NOT EXISTS (SELECT 1 FROM case_events v
                         WHERE v.kind = 'voided' AND v.facts ->> 'voidsEventId' = m.id::text)
      ORDER BY m.happened_at, m.id`,
  )
}

export interface SplitReadRow {
  animal_id: string
  split_from_id: string
  accession: string
  form: 'individual' | 'group'
  house_name: string | null
  common_name: string
  scientific_name: string
  happened_at: Date
}

/** Every animal or group that was taken out of another, with the time of it. */
export function readSplits(db: Db): Promise<SplitReadRow[]> {
  return db.query(
    `SELECT a.id AS animal_id, a.split_from_id, a.accession, a.form, a.name AS house_name, t.common_name,
            t.scientific_name, min(e.happened_at) AS happened_at
       FROM animals a
       JOIN taxa t ON t.id = a.taxon_id
       JOIN live_count_entries e ON e.animal_id = a.id
      WHERE a.split_from_id IS NOT NULL
      GROUP BY a.id, t.id ORDER BY min(e.happened_at)`,
  )
}

export interface BatchStayReadRow {
  case_id: string
  animal_id: string
  enclosure_id: string
  water_body_id: string | null
  from_at: Date
  until_at: Date | null
}

/** Where animals were. */
export function readStaysOf(
  db: Db,
  animalIds: readonly string[],
): Promise<Omit<BatchStayReadRow, 'case_id'>[]> {
  return db.query(
    `SELECT s.animal_id, s.enclosure_id, w.id AS water_body_id, lower(s.during) AS from_at,
            upper(s.during) AS until_at
       FROM stays s
       LEFT JOIN water_bodies w ON w.enclosure_id = s.enclosure_id
      WHERE s.animal_id = ANY ($1::uuid[])
      ORDER BY lower(s.during)`,
    [animalIds],
  )
}

export interface EntryReadRow {
  id: string
  animal_id: string
  enclosure_id: string
  from_enclosure_id: string | null
  happened_at: Date
  quarantine_kind: QuarantineKind
  common_name: string
  animal_count: number
  joins_group: boolean
}

/**
 * Everything that came into an enclosure since an instant: arrivals, moves, parts of groups (from where the group was),
 * and animals taken into a group that was there already.
 */
export function readEntries(db: Db, since: Date): Promise<EntryReadRow[]> {
  return db.query(
    `SELECT m.id, m.animal_id, m.to_enclosure_id AS enclosure_id,
            coalesce(m.from_enclosure_id,
                     (SELECT s.enclosure_id FROM stays s
                       WHERE s.animal_id = a.split_from_id AND s.during @> m.happened_at LIMIT 1)) AS from_enclosure_id,
            m.happened_at, t.quarantine_kind, t.common_name,
            greatest(1, (SELECT coalesce(sum(e.delta), 0)::int FROM live_count_entries e
                          WHERE e.animal_id = m.animal_id AND e.happened_at <= m.happened_at)) AS animal_count,
            false AS joins_group
       FROM live_moves m
       JOIN animals a ON a.id = m.animal_id
       JOIN taxa t ON t.id = a.taxon_id
      WHERE m.to_enclosure_id IS NOT NULL AND m.happened_at >= $1
     UNION ALL
     SELECT e.id, e.animal_id, s.enclosure_id, NULL, e.happened_at, t.quarantine_kind, t.common_name, e.delta,
            true
       FROM live_count_entries e
       JOIN stays s ON s.animal_id = e.animal_id AND s.during @> e.happened_at AND lower(s.during) < e.happened_at
       JOIN animals a ON a.id = e.animal_id
       JOIN taxa t ON t.id = a.taxon_id
      WHERE e.happened_at >= $1 AND e.delta > 0
        AND e.kind NOT IN ('birth-or-hatch', 'propagation', 'split-in', 'merge-in', 'count-adjustment', 'found')`,
    [since],
  )
}

export interface DeathReadRow {
  id: string
  animal_id: string
  seen_count: number
  happened_at: Date
  happened_on: string
}

/** Deaths of animals, struck-out ones left out. */
export function readDeathsOf(db: Db, animalIds: readonly string[]): Promise<DeathReadRow[]> {
  return db.query(
    `SELECT d.id, d.animal_id, d.seen_count, d.happened_at, d.happened_on::text AS happened_on
       FROM live_deaths d WHERE d.animal_id = ANY ($1::uuid[])
      ORDER BY d.happened_at, d.id`,
    [animalIds],
  )
}

export interface CountChangeReadRow {
  animal_id: string
  happened_at: Date
  happened_on: string
  delta: number
}

/** How the counts of animals changed, in time order. */
export function readCountChanges(db: Db, animalIds: readonly string[]): Promise<CountChangeReadRow[]> {
  return db.query(
    `SELECT e.animal_id, e.happened_at, e.happened_on::text AS happened_on, e.delta
       FROM live_count_entries e WHERE e.animal_id = ANY ($1::uuid[])
      ORDER BY e.happened_at, e.delta < 0, e.id`,
    [animalIds],
  )
}

export interface PlaceReadRow {
  id: string
  code: string
  area: string
  boundary: string | null
  water_body_id: string | null
  air_space: string | null
}

/** Every enclosure there ever was, with its water and its air. */
export function readPlaces(db: Db): Promise<PlaceReadRow[]> {
  return db.query(
    `SELECT e.id, e.code, e.area, e.boundary, w.id AS water_body_id, e.air_space
       FROM enclosures e LEFT JOIN water_bodies w ON w.enclosure_id = e.id`,
  )
}

export interface StepRecordReadRow {
  id: string
  case_id: string
  step_key: string
  outcome: 'done' | 'failed'
  note: string | null
  happened_at: Date
  happened_on: string
  recorded_by_name: string | null
}

export function readStepRecords(db: Db, caseIds: readonly string[]): Promise<StepRecordReadRow[]> {
  return db.query(
    `SELECT r.id, r.case_id, r.step_key, r.outcome, r.note, r.happened_at, r.happened_on::text AS happened_on,
            w.printed_name AS recorded_by_name
       FROM case_step_records r
       LEFT JOIN people w ON w.id = r.recorded_by
      WHERE r.case_id = ANY ($1::uuid[]) ORDER BY r.happened_at, r.id`,
    [caseIds],
  )
}

export interface LookReadRow {
  case_id: string
  happened_on: string
  happened_at: Date
  for_veterinarian: boolean
  reviewed: boolean
}

/** The days on which each case was looked at, and what waits for a veterinarian; voided observations left out. */
export function readLooks(db: Db, caseIds: readonly string[]): Promise<LookReadRow[]> {
  return db.query(
    `SELECT k.case_id, o.happened_on::text AS happened_on, o.happened_at, o.for_veterinarian,
            EXISTS (SELECT 1 FROM observation_reviews r WHERE r.observation_id = o.id) AS reviewed
       FROM observation_cases k
       JOIN observations o ON o.id = k.observation_id
      WHERE k.case_id = ANY ($1::uuid[])
        AND NOT EXISTS (SELECT 1 FROM observation_voids v WHERE v.observation_id = o.id)
      ORDER BY o.happened_at`,
    [caseIds],
  )
}
