import type { DoseLine, Product } from '../../../shared/contracts/formulary.contract.ts'
import { lotState } from '../../../shared/domain/formulary/lot-state.ts'
import { sources } from '../../../shared/domain/sources.ts'
import type { Source } from '../../../shared/domain/sources.ts'
import type { DoseLineReadRow, ProductReadRow } from './formulary.reads.ts'

const citationOf = (key: string): string => (sources as Record<string, Source>)[key]?.citation ?? key

export function presentDoseLine(row: DoseLineReadRow): DoseLine {
  return {
    id: row.id,
    agent: row.agent as DoseLine['agent'],
    use: row.use,
    low: row.low,
    high: row.high,
    unit: row.unit,
    basis: row.basis as DoseLine['basis'],
    longestContactMinutes: row.longest_contact_minutes,
    water: row.water as DoseLine['water'],
    source: row.source,
    citation: citationOf(row.source),
    mark: row.mark,
    state: row.confirmed_at ? 'confirmed' : row.proposed_by === null ? 'default' : 'proposed',
    confirmedBy: row.confirmed_by_name,
    confirmedAt: row.confirmed_at?.toISOString() ?? null,
  }
}

/** A product as it stands on a facility date: the state of its lots depends on the day. */
export function presentProduct(row: ProductReadRow, on: string): Product {
  return {
    id: row.id,
    agent: row.agent as Product['agent'],
    productName: row.product_name,
    form: row.form as Product['form'],
    strength: { value: row.strength_entered_value, unit: row.strength_entered_unit },
    strengthBasis: row.strength_basis as Product['strengthBasis'],
    densityGPerMl: row.density_g_per_ml,
    inUse: row.in_use,
    record: row.is_as_written ? 'intact' : 'broken',
    version: row.version,
    lots: row.lots.map((lot) => ({
      id: lot.id,
      lotNumber: lot.lot_number,
      expiresOn: lot.expires_on,
      receivedOn: lot.received_on,
      state: lotState(lot.expires_on, lot.last_event, on),
      foundClearAt: lot.found_clear_at === null ? null : new Date(lot.found_clear_at).toISOString(),
    })),
  }
}
