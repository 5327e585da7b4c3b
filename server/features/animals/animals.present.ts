import type {
  Animal,
  AnimalRow,
  CountLine,
  Death,
  Discrepancy,
  LogLine,
  MoveEntry,
  WeightEntry,
} from '../../../shared/contracts/animals.contract.ts'
import type { Count, NewestWeight, Place } from '../../../shared/contracts/animal-primitives.ts'
import type { Sensitivity, TaxonRow, WeightBand } from '../../../shared/contracts/taxa.contract.ts'
import type { LifeStage } from '../../../shared/domain/animals/description.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import type { AnimalReadRow } from './animals.reads.ts'
import type {
  AnimalTies,
  CountLineReadRow,
  DeathReadRow,
  DiscrepancyReadRow,
  FactRow,
  IdentifierReadRow,
  LockReadRow,
  MoveReadRow,
  PlaceReadRow,
  StruckRow,
  WeightReadRow,
} from './chart.reads.ts'
import type { FoodFact } from './food.reads.ts'
import type { LogReadRow } from './log.reads.ts'
import type { SensitivityReadRow, TaxonReadRow, WeightBandReadRow } from './taxa.reads.ts'

const iso = (at: Date | string) => (typeof at === 'string' ? new Date(at) : at).toISOString()

export const presentFact = (row: FactRow) => ({
  id: row.id,
  happenedAt: iso(row.happened_at),
  happenedOn: row.happened_on,
  recordedAt: iso(row.recorded_at),
  recordedBy: row.recorded_by_name ?? '',
})

const presentStruck = (row: StruckRow) =>
  row.struck_reason === null || row.struck_at === null
    ? null
    : { reason: row.struck_reason, at: iso(row.struck_at), by: row.struck_by_name ?? '' }

const presentPlace = (row: PlaceReadRow | null): Place | null =>
  row && { id: row.id, code: row.code, name: row.name, area: row.area, boundary: row.boundary }

/** The count as one figure or a range, by the rule of compute-group-count. */
export function presentCount(
  row: Pick<AnimalReadRow, 'ledger' | 'statement_basis' | 'statement_low' | 'statement_high' | 'moved_since'>,
): Count {
  const { ledger } = row
  const now = (figure: number) => Math.max(0, figure + row.moved_since)
  if (row.statement_basis !== 'estimated') {
    const agrees = row.statement_basis === null || now(row.statement_low) === ledger
    return { basis: 'counted', ledger, low: ledger, high: ledger, agrees }
  }
  const low = now(row.statement_low)
  const high = now(row.statement_high)
  return { basis: 'estimated', ledger, low, high, agrees: low <= ledger && ledger <= high }
}

export function presentNewestWeight(row: AnimalReadRow): NewestWeight | null {
  if (row.weight_kg === null) return null
  return {
    weightKg: row.weight_kg,
    value: row.weight_value,
    unit: row.weight_unit,
    animalsWeighed: row.weight_animals,
    basis: row.weight_basis,
    happenedAt: iso(row.weight_at),
    happenedOn: row.weight_on,
  }
}

export function presentAnimalRow(row: AnimalReadRow): AnimalRow {
  return {
    id: row.id,
    accession: row.accession,
    form: row.form,
    name: row.name,
    taxon: {
      id: row.taxon_id,
      scientificName: row.scientific_name,
      commonName: row.common_name,
      group: row.taxon_group,
      quarantineKind: row.quarantine_kind,
    },
    sex: row.sex,
    stage: row.stage,
    place:
      row.enclosure_id === null
        ? null
        : {
            id: row.enclosure_id,
            code: row.enclosure_code,
            name: row.enclosure_name,
            area: row.enclosure_area,
            boundary: row.enclosure_boundary,
          },
    since: row.since && iso(row.since),
    sinceKnownOn: row.since_known_on,
    count: presentCount(row),
    newestWeight: presentNewestWeight(row),
    lock: row.lock,
    openDiscrepancies: row.open_discrepancies,
  }
}

/** Actions that a sheet of an animal offers. */
const sheetActions: readonly Action[] = [
  'weight.record',
  'animal.move',
  'observation.record',
  'register.manage',
  'animal.say-food-or-release',
  'chart.read',
  'chart.write',
]

export interface AnimalSheet {
  row: AnimalReadRow
  ties: AnimalTies
  identifiers: IdentifierReadRow[]
  locks: LockReadRow[]
  discrepancies: DiscrepancyReadRow[]
  food: FoodFact | undefined
  taxon: TaxonReadRow | undefined
}

export function presentAnimal(sheet: AnimalSheet, roles: readonly Role[]): Animal {
  const { row, ties, taxon } = sheet
  return {
    ...presentAnimalRow(row),
    birth:
      row.birth_kind && row.birth_date
        ? { kind: row.birth_kind, date: row.birth_date, approximate: row.birth_approximate }
        : null,
    splitFrom: ties.split_from,
    splitInto: ties.split_into,
    arrivedAt: ties.arrived_at && iso(ties.arrived_at),
    arrivedKnownOn: ties.arrived_known_on,
    foodOrRelease: sheet.food
      ? {
          answer: sheet.food.answer,
          accession: sheet.food.accession,
          reason: sheet.food.reason,
          happenedOn: sheet.food.happenedOn,
          recordedBy: sheet.food.recordedBy,
        }
      : null,
    identifiers: sheet.identifiers.map((one) => ({
      ...presentFact(one),
      kind: one.kind,
      value: one.value,
      place: one.place,
      ended: one.ended_at && { reason: one.ended_reason ?? '', at: iso(one.ended_at) },
    })),
    locks: sheet.locks.map((lock) => ({
      id: lock.id,
      kind: lock.kind,
      sourceLabel: lock.source_label,
      reason: lock.reason,
      since: iso(lock.happened_at),
    })),
    discrepancies: sheet.discrepancies.map(presentDiscrepancy),
    weightBand: bandFor(taxon?.weight_bands ?? [], row.stage),
    sensitivities: (taxon?.sensitivities ?? []).map(presentSensitivity),
    version: row.version,
    may: sheetActions.filter((action) => decide(action, roles).allowed),
  }
}

/** The band that the sheet draws: of the animal's own stage, else the one for grown animals. */
function bandFor(bands: readonly WeightBandReadRow[], stage: LifeStage): WeightBand | null {
  const band = bands.find((one) => one.stage === stage) ?? bands.find((one) => one.stage === null)
  return band ? presentWeightBand(band) : null
}

export const presentWeightBand = (row: WeightBandReadRow): WeightBand => ({
  id: row.id,
  stage: row.stage,
  low: row.low,
  high: row.high,
  unit: row.unit,
  lowKg: row.low_kg,
  highKg: row.high_kg,
  source: row.source,
  mark: row.mark,
  recordedAt: iso(row.recorded_at),
  recordedBy: row.recorded_by_name ?? '',
})

export const presentSensitivity = (row: SensitivityReadRow): Sensitivity => ({
  code: row.code,
  level: row.level,
  note: row.note,
  recordedAt: iso(row.recorded_at),
  recordedBy: row.recorded_by_name ?? '',
})

export const presentTaxon = (row: TaxonReadRow): TaxonRow => ({
  id: row.id,
  scientificName: row.scientific_name,
  commonName: row.common_name,
  group: row.taxon_group,
  quarantineKind: row.quarantine_kind,
  note: row.note,
  weightBands: row.weight_bands.map(presentWeightBand),
  sensitivities: row.sensitivities.map(presentSensitivity),
  animalsHere: row.animals_here,
  version: row.version,
})

export const presentWeight = (row: WeightReadRow): WeightEntry => ({
  ...presentFact(row),
  weightKg: row.weight_kg,
  value: row.entered_value,
  unit: row.entered_unit,
  animalsWeighed: row.animals_weighed,
  basis: row.basis,
  method: row.method,
  doubt: row.doubt,
  confirmedReason: row.confirmed_reason,
  struck: presentStruck(row),
})

export const presentMove = (row: MoveReadRow): MoveEntry => ({
  ...presentFact(row),
  kind: row.kind,
  from: presentPlace(row.from_place),
  to: presentPlace(row.to_place),
  reason: row.reason,
  documentedTransfer: row.documented_transfer,
  againstRule: row.against_rule,
  knownOn: row.known_on,
  struck: presentStruck(row),
})

export const presentCountLine = (row: CountLineReadRow): CountLine => ({
  ...presentFact(row),
  kind: row.kind,
  delta: row.delta,
  balance: row.balance,
  other: row.other,
  reason: row.reason,
  knownOn: row.known_on,
  struck: presentStruck(row),
})

export const presentDeath = (row: DeathReadRow): Death => ({
  ...presentFact(row),
  accession: row.accession,
  kind: row.kind,
  seenCount: row.seen_count,
  postedCount: row.posted_count,
  excessCount: row.seen_count - row.posted_count,
  place: presentPlace(row.place),
  carcassState: row.carcass_state,
  carcassPlace: row.carcass_place,
  note: row.note,
  struck: presentStruck(row),
})

export function presentDiscrepancy(row: DiscrepancyReadRow): Discrepancy {
  return {
    ...presentFact(row),
    accession: row.accession,
    animalName: row.name === null ? row.common_name : `${row.common_name}, ${row.name}`,
    kind: row.kind,
    forRole: row.for_role,
    facts: row.facts,
    resolution: row.outcome && {
      outcome: row.outcome,
      reason: row.resolution_reason,
      at: iso(row.resolved_at),
      by: row.resolved_by_name ?? '',
    },
  }
}

export const presentLogLine = (row: LogReadRow): LogLine => ({
  ...presentFact(row),
  kind: row.kind,
  facts: row.facts,
  knownOn: row.known_on,
  struckReason: row.struck_reason,
})
