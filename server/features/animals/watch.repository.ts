import type { Tx } from '../../platform/database/transactions.ts'
import {
  DiscrepancyResolutionRow,
  DiscrepancyRow,
  MovementLockLiftRow,
  MovementLockRow,
} from './animal-watch.entity.ts'

export async function insertDiscrepancy(tx: Tx, row: DiscrepancyRow): Promise<void> {
  await tx.manager.insert(DiscrepancyRow, row)
}

export function findDiscrepancy(tx: Tx, id: string): Promise<DiscrepancyRow | null> {
  return tx.manager.findOneBy(DiscrepancyRow, { id })
}

/** Kinds of the open discrepancies of an animal, with their ids. */
export async function openDiscrepancies(
  tx: Tx,
  animalId: string,
): Promise<{ id: string; kind: string; source_id: string }[]> {
  return tx.manager.query(
    `SELECT q.id, q.kind, q.source_id FROM discrepancies q WHERE q.animal_id = $1
        AND NOT EXISTS (SELECT 1 FROM discrepancy_resolutions z WHERE z.discrepancy_id = q.id)`,
    [animalId],
  )
}

/** Whether somebody was asked to explain a record before, explained since or not. */
export function isAskedAbout(tx: Tx, sourceId: string): Promise<boolean> {
  return tx.manager.existsBy(DiscrepancyRow, { sourceId })
}

/** Open discrepancies that one record left behind, over all its animals. */
export async function openDiscrepanciesOfSource(
  tx: Tx,
  source: { kind: string; id: string },
): Promise<{ id: string; kind: string }[]> {
  return tx.manager.query(
    `SELECT q.id, q.kind FROM discrepancies q WHERE q.source_kind = $1 AND q.source_id = $2
        AND NOT EXISTS (SELECT 1 FROM discrepancy_resolutions z WHERE z.discrepancy_id = q.id)
      ORDER BY q.id`,
    [source.kind, source.id],
  )
}

export function isResolved(tx: Tx, discrepancyId: string): Promise<boolean> {
  return tx.manager.existsBy(DiscrepancyResolutionRow, { discrepancyId })
}

export async function insertResolution(tx: Tx, row: DiscrepancyResolutionRow): Promise<void> {
  await tx.manager.insert(DiscrepancyResolutionRow, row)
}

export async function insertLock(tx: Tx, row: MovementLockRow): Promise<void> {
  await tx.manager.insert(MovementLockRow, row)
}

export function findLift(tx: Tx, lockId: string): Promise<MovementLockLiftRow | null> {
  return tx.manager.findOneBy(MovementLockLiftRow, { lockId })
}

/** Locks of one source, of all animals or of one, that were never lifted. */
export async function unliftedLocks(
  tx: Tx,
  sourceId: string,
  animalId: string | null,
): Promise<{ id: string; animal_id: string }[]> {
  return tx.manager.query(
    `SELECT k.id, k.animal_id FROM movement_locks k
      WHERE k.source_id = $1 AND ($2::uuid IS NULL OR k.animal_id = $2)
        AND NOT EXISTS (SELECT 1 FROM movement_lock_lifts f WHERE f.lock_id = k.id)
      ORDER BY k.animal_id`,
    [sourceId, animalId],
  )
}

export async function insertLockLift(tx: Tx, row: MovementLockLiftRow): Promise<void> {
  await tx.manager.insert(MovementLockLiftRow, row)
}
