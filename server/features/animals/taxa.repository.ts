import { insertOnce, updateVersioned } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Taxon, TaxonSensitivity, TaxonWeightBand } from './taxon.entity.ts'

export function insertTaxon(tx: Tx, row: Taxon): Promise<{ created: boolean }> {
  return insertOnce(tx, Taxon, row, ['scientificName', 'commonName', 'taxonGroup', 'note'])
}

/** The taxon's row, locked until the transaction ends; null when there is none. */
export function lockTaxon(tx: Tx, id: string): Promise<Taxon | null> {
  return tx.manager.findOne(Taxon, { where: { id }, lock: { mode: 'pessimistic_write' } })
}

export function findTaxon(tx: Tx, id: string): Promise<Taxon | null> {
  return tx.manager.findOneBy(Taxon, { id })
}

export function saveTaxon(
  tx: Tx,
  key: { id: string; version: number },
  patch: Partial<Pick<Taxon, 'scientificName' | 'commonName' | 'taxonGroup' | 'quarantineKind' | 'note'>>,
): Promise<void> {
  return updateVersioned(tx, Taxon, key, patch)
}

export function insertWeightBand(tx: Tx, row: TaxonWeightBand): Promise<{ created: boolean }> {
  return insertOnce(tx, TaxonWeightBand, row, [
    'taxonId',
    'stage',
    'lowEnteredValue',
    'highEnteredValue',
    'enteredUnit',
    'source',
    'mark',
  ])
}

export function insertSensitivity(tx: Tx, row: TaxonSensitivity): Promise<{ created: boolean }> {
  return insertOnce(tx, TaxonSensitivity, row, ['taxonId', 'code', 'level', 'note'])
}
