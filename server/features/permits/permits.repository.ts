import { insertOnce } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import {
  PermitRecord,
  PermitTaxon,
  PermitUseExplanation,
  PermitUseRecord,
  PermitVoid,
} from './permit.entity.ts'

/** Advisory locks of this kind stand for a permit, or for a permit's number at its authority: ledgers have no row locks. */
const permitLocks = 4400_0004

/** Puts everybody who uses or voids the permit in one line until the transaction ends. */
export async function lockPermit(tx: Tx, key: string): Promise<void> {
  await tx.manager.query('SELECT pg_advisory_xact_lock($1, hashtext($2))', [permitLocks, key])
}

export function findPermit(tx: Tx, id: string): Promise<PermitRecord | null> {
  return tx.manager.findOneBy(PermitRecord, { id })
}

export function findPermitByNumber(tx: Tx, number: string): Promise<PermitRecord | null> {
  return tx.manager.findOneBy(PermitRecord, { number })
}

export async function taxaOf(tx: Tx, permitId: string): Promise<string[]> {
  const rows = await tx.manager.findBy(PermitTaxon, { permitId })
  return rows.map((row) => row.taxonId).sort()
}

/** A permit of this authority with this number that stands; null when there is none. */
export async function findStanding(tx: Tx, authority: string, permitNumber: string): Promise<string | null> {
  const [row]: { id: string }[] = await tx.manager.query(
    `SELECT p.id FROM permits p
      WHERE lower(p.authority) = lower($1) AND lower(p.permit_number) = lower($2)
        AND NOT EXISTS (SELECT 1 FROM permit_voids v WHERE v.permit_id = p.id)`,
    [authority, permitNumber],
  )
  return row?.id ?? null
}

export function insertPermit(tx: Tx, row: PermitRecord): Promise<{ created: boolean }> {
  return insertOnce(tx, PermitRecord, row, [
    'permitNumber',
    'authority',
    'kind',
    'validFrom',
    'validUntil',
    'quantityAllowed',
    'counterpartyId',
    'purposeCode',
    'conditions',
  ])
}

export async function insertPermitTaxa(tx: Tx, permitId: string, taxonIds: readonly string[]): Promise<void> {
  if (taxonIds.length > 0)
    await tx.manager.insert(
      PermitTaxon,
      taxonIds.map((taxonId) => ({ permitId, taxonId })),
    )
}

export async function countTaxa(tx: Tx, taxonIds: readonly string[]): Promise<number> {
  const [row]: [{ n: string }] = await tx.manager.query(
    'SELECT count(*) AS n FROM taxa t WHERE t.id = ANY($1::uuid[])',
    [taxonIds],
  )
  return Number(row.n)
}

export function isVoided(tx: Tx, permitId: string): Promise<boolean> {
  return tx.manager.existsBy(PermitVoid, { permitId })
}

export async function insertPermitVoid(tx: Tx, row: PermitVoid): Promise<void> {
  await tx.manager.insert(PermitVoid, row)
}

/** Whole animals taken so far; what was voided does not count. */
export async function usedSoFar(tx: Tx, permitId: string): Promise<number> {
  const [row]: [{ n: string }] = await tx.manager.query(
    `SELECT coalesce(sum(u.quantity), 0) AS n FROM permit_uses u
      WHERE u.permit_id = $1
        AND NOT EXISTS (SELECT 1 FROM transaction_voids v WHERE v.transaction_id = u.transaction_id)`,
    [permitId],
  )
  return Number(row.n)
}

export async function insertUse(tx: Tx, row: PermitUseRecord): Promise<void> {
  await tx.manager.insert(PermitUseRecord, row)
}

export function findUse(tx: Tx, id: string): Promise<PermitUseRecord | null> {
  return tx.manager.findOneBy(PermitUseRecord, { id })
}

export function isExplained(tx: Tx, permitUseId: string): Promise<boolean> {
  return tx.manager.existsBy(PermitUseExplanation, { permitUseId })
}

export async function insertExplanation(tx: Tx, row: PermitUseExplanation): Promise<void> {
  await tx.manager.insert(PermitUseExplanation, row)
}

/** The kind of each of these permits; unknown ones are left out. */
export async function kindsOf(tx: Tx, ids: readonly string[]): Promise<Map<string, string>> {
  const rows: { id: string; kind: string }[] = await tx.manager.query(
    'SELECT p.id, p.kind FROM permits p WHERE p.id = ANY ($1::uuid[])',
    [ids],
  )
  return new Map(rows.map((row) => [row.id, row.kind]))
}
