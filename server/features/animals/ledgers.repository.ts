import type { CountEntry, CountKind } from '../../../shared/domain/ledger/count-entry.ts'
import type { CountStatement } from '../../../shared/domain/ledger/compute-group-count.ts'
import type { Move, Stay } from '../../../shared/domain/ledger/move.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import {
  AnimalVoid,
  CountEntryRow,
  CountStatementRow,
  DeathRow,
  MoveRow,
  WeightRow,
} from './animal-ledgers.entity.ts'

/** The count ledger of one animal or group, struck-out lines left out. */
export async function readEntries(tx: Tx, animalId: string): Promise<CountEntry[]> {
  const rows: {
    id: string
    kind: CountKind
    delta: number
    happened_at: Date
    recorded_at: Date
    transfer_id: string | null
  }[] = await tx.manager.query(
    `SELECT e.id, e.kind, e.delta, e.happened_at, e.recorded_at, e.transfer_id
       FROM live_count_entries e WHERE e.animal_id = $1`,
    [animalId],
  )
  return rows.map((row) => ({
    entryId: row.id,
    animalId,
    kind: row.kind,
    delta: row.delta,
    at: row.happened_at.toISOString(),
    recordedAt: row.recorded_at.toISOString(),
    transferId: row.transfer_id,
  }))
}

export async function readStatements(tx: Tx, animalId: string): Promise<CountStatement[]> {
  const rows = await tx.manager.findBy(CountStatementRow, { animalId })
  return rows.map((row) => {
    const times = { at: row.happenedAt.toISOString(), recordedAt: row.recordedAt.toISOString() }
    return row.basis === 'counted'
      ? { statementId: row.id, ...times, basis: 'counted', count: row.low }
      : { statementId: row.id, ...times, basis: 'estimated', low: row.low, high: row.high }
  })
}

export type LiveMove = Move & { automatic: boolean; happenedOn: string }

/** The moves of one animal or group, struck-out ones left out. */
export async function readLiveMoves(tx: Tx, animalId: string): Promise<LiveMove[]> {
  const rows: {
    id: string
    from_enclosure_id: string | null
    to_enclosure_id: string | null
    happened_at: Date
    happened_on: string
    recorded_at: Date
    automatic: boolean
  }[] = await tx.manager.query(
    `SELECT m.id, m.from_enclosure_id, m.to_enclosure_id, m.happened_at, m.happened_on::text AS happened_on,
            m.recorded_at, m.automatic
       FROM live_moves m WHERE m.animal_id = $1 ORDER BY m.happened_at`,
    [animalId],
  )
  return rows.map((row) => ({
    moveId: row.id,
    animalId,
    fromEnclosureId: row.from_enclosure_id,
    toEnclosureId: row.to_enclosure_id,
    at: row.happened_at.toISOString(),
    happenedOn: row.happened_on,
    recordedAt: row.recorded_at.toISOString(),
    automatic: row.automatic,
  }))
}

export async function insertEntry(tx: Tx, row: CountEntryRow): Promise<void> {
  await tx.manager.insert(CountEntryRow, row)
}

export async function insertStatement(tx: Tx, row: CountStatementRow): Promise<void> {
  await tx.manager.insert(CountStatementRow, row)
}

export async function insertMove(tx: Tx, row: MoveRow): Promise<void> {
  await tx.manager.insert(MoveRow, row)
}

export async function insertWeight(tx: Tx, row: WeightRow): Promise<void> {
  await tx.manager.insert(WeightRow, row)
}

export async function insertDeath(tx: Tx, row: DeathRow): Promise<void> {
  await tx.manager.insert(DeathRow, row)
}

/** Replaces the stays of one animal by those its moves give. */
export async function replaceStays(
  tx: Tx,
  animalId: string,
  stays: readonly (Stay & { moveId: string })[],
): Promise<void> {
  await tx.manager.query(`DELETE FROM stays WHERE animal_id = $1`, [animalId])
  if (stays.length === 0) return
  await tx.manager.query(
    `INSERT INTO stays (began_with_move_id, animal_id, enclosure_id, during)
     SELECT s.move_id, $1, s.enclosure_id, tstzrange(s.from_at, s.until_at)
       FROM unnest($2::uuid[], $3::uuid[], $4::timestamptz[], $5::timestamptz[])
         AS s (move_id, enclosure_id, from_at, until_at)`,
    [
      animalId,
      stays.map((stay) => stay.moveId),
      stays.map((stay) => stay.enclosureId),
      stays.map((stay) => stay.from),
      stays.map((stay) => stay.until),
    ],
  )
}

/** The newest weight before or at an instant, kg; null when there is none. */
export async function newestWeightKg(tx: Tx, animalId: string, at: Date): Promise<number | null> {
  const [row]: { weight_kg: number }[] = await tx.manager.query(
    `SELECT w.weight_kg FROM live_weights w WHERE w.animal_id = $1 AND w.happened_at <= $2
      ORDER BY w.happened_at DESC, w.recorded_at DESC, w.id DESC LIMIT 1`,
    [animalId, at],
  )
  return row?.weight_kg ?? null
}

type Struck = 'countEntryId' | 'moveId' | 'weightId' | 'deathId'

export function isStruck(tx: Tx, what: Struck, id: string): Promise<boolean> {
  return tx.manager.existsBy(AnimalVoid, { [what]: id })
}

/** Strikes a row out; it stays readable. */
export async function strike(
  tx: Tx,
  given: { id: string; what: Struck; rowId: string; reason: string },
): Promise<void> {
  await tx.manager.insert(AnimalVoid, {
    id: given.id,
    countEntryId: null,
    moveId: null,
    weightId: null,
    deathId: null,
    [given.what]: given.rowId,
    reason: given.reason,
    recordedAt: tx.at,
    recordedBy: tx.actor.personId,
  })
}

export function findEntry(tx: Tx, id: string): Promise<CountEntryRow | null> {
  return tx.manager.findOneBy(CountEntryRow, { id })
}

export function findTransfer(tx: Tx, transferId: string): Promise<CountEntryRow[]> {
  return tx.manager.findBy(CountEntryRow, { transferId })
}

export function findStatement(tx: Tx, id: string): Promise<CountStatementRow | null> {
  return tx.manager.findOneBy(CountStatementRow, { id })
}

export function findMove(tx: Tx, id: string): Promise<MoveRow | null> {
  return tx.manager.findOneBy(MoveRow, { id })
}

export function findWeight(tx: Tx, id: string): Promise<WeightRow | null> {
  return tx.manager.findOneBy(WeightRow, { id })
}

export function findDeath(tx: Tx, id: string): Promise<DeathRow | null> {
  return tx.manager.findOneBy(DeathRow, { id })
}

export function isDeathEntry(tx: Tx, countEntryId: string): Promise<boolean> {
  return tx.manager.existsBy(DeathRow, { countEntryId })
}

/** The death that a line of the count ledger was written for; null for any other line. */
export async function findDeathOf(tx: Tx, countEntryId: string): Promise<string | null> {
  return (await tx.manager.findOneBy(DeathRow, { countEntryId }))?.id ?? null
}
