import type { Enclosure, WaterBody } from '../../../shared/contracts/enclosures.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import type { EnclosureReadRow, WaterBodyReadRow } from './enclosures.reads.ts'

const iso = (at: Date | null) => at?.toISOString() ?? null

/** Actions on water that a reader may take. A right that only lets one propose does not let one correct. */
export function mayWithWater(roles: readonly Role[]): string[] {
  return (['water.record', 'water.configure', 'volume.confirm'] as const).filter((action) =>
    action === 'water.configure'
      ? decide(action, roles, { 'proposal-only': false }).allowed
      : decide(action, roles).allowed,
  )
}

export function presentEnclosure(row: EnclosureReadRow, roles: readonly Role[]): Enclosure {
  const { fill_mark: mark, fill_mark_entered_value: value, fill_mark_entered_unit: unit } = row
  return {
    id: row.id,
    code: row.code,
    name: row.name,
    kind: row.kind,
    area: row.area,
    boundary: row.boundary,
    airSpace: row.air_space,
    treatmentVessel: row.treatment_vessel,
    fillMark:
      row.fill_mark_litres !== null && value !== null && unit !== null
        ? { mark: mark ?? '', volume: { value, unit }, litres: row.fill_mark_litres }
        : null,
    description: row.description,
    waterBodyId: row.water_body_id,
    inUseFrom: row.in_use_from.toISOString(),
    inUseUntil: iso(row.in_use_until),
    version: row.version,
    may: mayWithWater(roles),
  }
}

export function presentWaterBody(row: WaterBodyReadRow): WaterBody {
  return {
    id: row.id,
    code: row.code,
    name: row.name,
    kind: row.kind,
    enclosureId: row.enclosure_id,
    inUseFrom: row.in_use_from.toISOString(),
    inUseUntil: iso(row.in_use_until),
    version: row.version,
  }
}
