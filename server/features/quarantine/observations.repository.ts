import type { Tx } from '../../platform/database/transactions.ts'
import { insertOnce, isRepeated } from '../../platform/database/rows.ts'
import {
  ObservationCaseRow,
  ObservationDeathRow,
  ObservationReviewRow,
  ObservationRow,
  ObservationVoidRow,
} from './observation.entity.ts'

/** Whether this observation was written before; the same id with other content is refused. */
export function isObservationRepeated(tx: Tx, row: ObservationRow): Promise<boolean> {
  const { id, enclosureId, saidAt, feeding, breathing, skin, words, countBasis, countLow, countHigh } = row
  const { foundDead, lookedAt, forVeterinarian, urgent } = row
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
  return isRepeated(tx, ObservationRow, { ...content, foundDead, lookedAt, forVeterinarian, urgent })
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
