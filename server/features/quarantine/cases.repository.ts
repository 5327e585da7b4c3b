import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import { insertOnce } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { CaseEventRow, CaseMemberRow, CaseRow, CaseStepRecordRow } from './case.entity.ts'

export function insertCase(tx: Tx, row: CaseRow): Promise<{ created: boolean }> {
  return insertOnce(tx, CaseRow, row, ['name', 'quarantineKind', 'protocolVersionId'])
}

export function findCase(tx: Tx, id: string): Promise<CaseRow | null> {
  return tx.manager.findOneBy(CaseRow, { id })
}

export function insertMember(tx: Tx, row: CaseMemberRow): Promise<{ created: boolean }> {
  return insertOnce(tx, CaseMemberRow, row, ['caseId', 'animalId'])
}

/** Heads of animals, locked in the order of their ids: they come before cases in the order of locks. */
export async function lockAnimals(tx: Tx, ids: readonly string[]): Promise<void> {
  await tx.manager.query(
    `SELECT a.id FROM animals a WHERE a.id = ANY ($1::uuid[]) ORDER BY a.id FOR UPDATE`,
    [ids],
  )
}

/** Heads of cases, locked in the order of their ids, so that two changes of one clock follow each other. */
export async function lockCases(tx: Tx, ids: readonly string[]): Promise<void> {
  await tx.manager.query(
    `SELECT c.id FROM quarantine_cases c WHERE c.id = ANY ($1::uuid[]) ORDER BY c.id FOR UPDATE`,
    [ids],
  )
}

/**
 * The case that an animal belonged to at an instant, by a joining of its own or of the group it came from; null when
 * there was none, or it had ended.
 */
export async function findCaseOf(
  tx: Tx,
  animalId: string,
  at: Date,
): Promise<{ id: string; number: string } | null> {
  const [row]: { id: string; number: string }[] = await tx.manager.query(
    `WITH RECURSIVE line AS (
       SELECT a.id, a.split_from_id FROM animals a WHERE a.id = $1
       UNION SELECT a.id, a.split_from_id FROM animals a JOIN line l ON a.id = l.split_from_id)
     SELECT c.id, c.number FROM case_members m JOIN quarantine_cases c ON c.id = m.case_id
      WHERE m.animal_id IN (SELECT l.id FROM line l) AND m.happened_at <= $2
        AND NOT EXISTS (SELECT 1 FROM case_events v
                         WHERE v.kind = 'voided' AND v.facts ->> 'voidsEventId' = m.id::text)
        AND NOT EXISTS (SELECT 1 FROM live_case_events e
                         WHERE e.case_id = c.id AND e.kind IN ('cleared', 'transferred-out')
                           AND e.happened_at <= $2)
      ORDER BY m.happened_at DESC LIMIT 1`,
    [animalId, at],
  )
  return row ?? null
}

/**
 * Writes an event under its own id, once. Key order in stored JSON is the database's own, so contents are compared in
 * canonical form.
 */
export async function insertEvent(tx: Tx, row: CaseEventRow): Promise<{ created: boolean }> {
  const earlier = await tx.manager.findOneBy(CaseEventRow, { id: row.id })
  if (!earlier) {
    await tx.manager.insert(CaseEventRow, row as never)
    return { created: true }
  }
  const content = (one: CaseEventRow) =>
    canonicalJson({ caseId: one.caseId, facts: one.facts as unknown as Json })
  if (content(earlier) !== content(row)) throw new Problem('id-already-used')
  return { created: false }
}

export function findEvent(tx: Tx, id: string): Promise<CaseEventRow | null> {
  return tx.manager.findOneBy(CaseEventRow, { id })
}

export function findMember(tx: Tx, id: string): Promise<CaseMemberRow | null> {
  return tx.manager.findOneBy(CaseMemberRow, { id })
}

export function insertStepRecord(tx: Tx, row: CaseStepRecordRow): Promise<{ created: boolean }> {
  return insertOnce(tx, CaseStepRecordRow, row, ['caseId', 'stepKey', 'outcome', 'note'])
}
