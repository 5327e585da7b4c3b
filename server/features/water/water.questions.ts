import type { ConnectionState, WaterMap } from '../../../shared/domain/connections/water-map.ts'
import { listWaterSources } from '../../../shared/domain/connections/list-water-sources.ts'
import type { WaterSourceSpell } from '../../../shared/domain/connections/list-water-sources.ts'
import type { VolumeMethod } from '../../../shared/domain/connections/volume-determination.ts'
import type { VolumeChoiceRefusal } from '../../../shared/domain/connections/choose-volume.ts'
import { findVolumeMismatches } from '../../../shared/domain/connections/volume-determination.ts'
import type { VolumeMismatch } from '../../../shared/domain/connections/volume-determination.ts'
import type { LifeSupportKind } from '../../../shared/domain/places/life-support-kind.ts'
import { judgeReading } from '../../../shared/domain/readings/judge-reading.ts'
import type { ReadingJudgement } from '../../../shared/domain/readings/judge-reading.ts'
import type { PhScale, ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import type { Refusal } from '../../../shared/domain/result.ts'
import { VolumeSheetBody } from '../../../shared/contracts/volume-sheet.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { Db } from '../../platform/database/db.ts'
import { placeReads } from '../enclosures/index.ts'
import { readParameterSince } from './measurement.reads.ts'
import { readWholeWaterMap } from './read-water-map.ts'
import { readVolumeWork } from './volume-work.reads.ts'
import { determinationOf } from './volume-now.ts'
import { readConnectedWater, readEnclosureWater } from './water-at.ts'
import type { EnclosureWater } from './water-at.ts'
import { rangeOf } from './water.present.ts'

/** A volume determination as a dose, a caution or a signature needs it. */
export interface VolumeFact {
  id: string
  netVolumeLitres: number
  grossVolumeLitres: number | null
  /** What was confirmed for the same water before it, in litres; null when nothing was */
  previousLitres: number | null
  /** Relative error, percent of the net volume, one side */
  errorPercent: number | null
  method: VolumeMethod
  displacementSubtracted: boolean
  /** Facility date and instant of the measurement */
  measuredOn: string
  measuredAt: string
  /** Confirmed by a second person by the instant asked about */
  confirmed: boolean
  holdsForThisValveState: boolean
  /** Why it does not hold, in codes; empty when it holds */
  mismatches: VolumeMismatch[]
  waterBodyIds: string[]
  /** Depths of the water that it was worked out from, as entered; none where it was metered or stated */
  depths: Quantity[]
  /** Set when it covers a part of the joined water, under a recorded and tested isolation */
  isolationId: string | null
}

/** The newest reading of one parameter, and how old it was. */
export interface ReadingFact {
  id: string
  parameter: ReadingParameter
  value: string
  unit: UnitCode
  below: boolean
  scale: PhScale | null
  canonicalValue: number
  canonicalUnit: UnitCode
  at: string
  ageMinutes: number
  waterBodyId: string
  waterBodyCode: string
  judgement: ReadingJudgement
}

/** The water of an enclosure at an instant: what cautions, doses, clocks and tracing ask for. */
export interface WaterFacts {
  at: string
  enclosureId: string
  enclosureCode: string
  bodies: { id: string; code: string; kind: 'enclosure' | 'sump' | 'loop'; enclosureId: string | null }[]
  /** Enclosures whose animals share this water, itself among them */
  enclosures: {
    id: string
    code: string
    name: string
    boundary: string | null
    /** Animals are brought to it for a bath, and keep their home. */
    treatmentVessel: boolean
  }[]
  connections: {
    id: string
    code: string
    kind: 'valve' | 'pump'
    state: ConnectionState | 'unknown'
    inside: boolean
  }[]
  unknownConnectionIds: string[]
  /** The one to dose by when `confirmed` and `holdsForThisValveState`; else the nearest there is; null when none */
  volume: VolumeFact | null
  /** Why no volume can be used; null when one can */
  volumeRefusal: Refusal<VolumeChoiceRefusal> | null
  latestReadings: ReadingFact[]
  lifeSupport: {
    id: string
    code: string
    kind: LifeSupportKind
    waterBodyId: string
    /** null: nobody ever recorded it */
    on: boolean | null
    since: string | null
  }[]
}

/** How deep the tanks and vessels of a determination were; sumps are left out, nobody doses by their level. */
function depthsOf(inputs: string): Quantity[] {
  const sheet = VolumeSheetBody.safeParse(JSON.parse(inputs))
  if (!sheet.success || sheet.data.method !== 'geometry') return []
  return sheet.data.parts.flatMap(({ role, shape }) =>
    role !== 'sump' && 'depth' in shape ? [shape.depth as Quantity] : [],
  )
}

function volumeFact(found: EnclosureWater): VolumeFact | null {
  const { row, usable, holds, isolationId } = found.volume
  if (!row) return null
  const confirmed = row.confirmed_at !== null && row.confirmed_at <= found.at
  return {
    id: row.id,
    netVolumeLitres: row.net_volume_litres,
    grossVolumeLitres: row.gross_volume_litres,
    previousLitres: found.volume.previousLitres,
    errorPercent: row.error_percent,
    method: row.method,
    displacementSubtracted: row.displacement_subtracted,
    measuredOn: row.happened_on,
    measuredAt: row.happened_at.toISOString(),
    confirmed,
    holdsForThisValveState: holds,
    mismatches: holds ? [] : findVolumeMismatches(determinationOf(row, found.at), found.water),
    waterBodyIds: row.water_body_ids,
    depths: depthsOf(row.inputs),
    isolationId: usable ? isolationId : row.isolation_id,
  }
}

function factsOf(found: EnclosureWater): WaterFacts {
  const { enclosure, water, at } = found
  const byConnection = new Map(found.map.connections.map((row) => [row.id, row]))
  return {
    at: at.toISOString(),
    enclosureId: enclosure.id,
    enclosureCode: enclosure.code,
    bodies: found.bodies.map(({ id, code, kind, enclosure_id }) => ({
      id,
      code,
      kind,
      enclosureId: enclosure_id,
    })),
    enclosures: found.enclosures.map(({ id, code, name, boundary, treatment_vessel }) => ({
      id,
      code,
      name,
      boundary,
      treatmentVessel: treatment_vessel,
    })),
    connections: water.connections.flatMap(({ connectionId, state, inside }) => {
      const row = byConnection.get(connectionId)
      return row ? [{ id: row.id, code: row.code, kind: row.kind, state, inside }] : []
    }),
    unknownConnectionIds: water.unknownConnectionIds,
    volume: volumeFact(found),
    volumeRefusal: found.volume.refusal,
    latestReadings: found.latest.map((row) => ({
      id: row.id,
      parameter: row.parameter,
      value: row.entered_value,
      unit: row.entered_unit,
      below: row.below,
      scale: row.scale,
      canonicalValue: row.canonical_value,
      canonicalUnit: row.canonical_unit,
      at: row.happened_at.toISOString(),
      ageMinutes: Math.max(0, at.getTime() - row.happened_at.getTime()) / 60_000,
      waterBodyId: row.water_body_id,
      waterBodyCode: row.water_body_code,
      judgement: judgeReading(
        { value: row.canonical_value, unit: row.canonical_unit, below: row.below },
        rangeOf(found.ranges.find((range) => range.parameter === row.parameter)),
      ),
    })),
    lifeSupport: found.lifeSupport.map((row) => ({
      id: row.id,
      code: row.code,
      kind: row.kind,
      waterBodyId: row.water_body_id,
      on: row.is_on,
      since: row.since?.toISOString() ?? null,
    })),
  }
}

/** Narrow answers about water; each takes the transaction of the asker, or reads what is committed. */
export function createWaterQuestions(parts: { dataSource: Db }) {
  return {
    /**
     * The water that an enclosure shares at an instant, its volume, newest readings and machines.
     * @returns null when there is no such enclosure, or it has no water then (a land area)
     */
    async connectedWaterAt(
      enclosureId: string,
      at: Date,
      db: Db = parts.dataSource,
    ): Promise<WaterFacts | null> {
      const enclosure = await placeReads.readEnclosure(db, { id: enclosureId })
      const found = enclosure && (await readEnclosureWater(db, enclosure, at))
      return found && factsOf(found)
    },
    /** Whether there is such an enclosure and it has water at an instant. */
    async hasWaterAt(enclosureId: string, at: Date, db: Db = parts.dataSource): Promise<boolean> {
      const enclosure = await placeReads.readEnclosure(db, { id: enclosureId })
      return enclosure !== null && (await readConnectedWater(db, enclosure, at)) !== null
    },
    /** The enclosures whose animals share the water of one at an instant, itself among them; itself alone on land. */
    async enclosuresSharing(enclosureId: string, at: Date, db: Db = parts.dataSource): Promise<string[]> {
      const enclosure = await placeReads.readEnclosure(db, { id: enclosureId })
      const found = enclosure && (await readConnectedWater(db, enclosure, at))
      return [...new Set([enclosureId, ...(found?.water.enclosureIds ?? [])])]
    },
    /**
     * Where the water of an enclosure came from since an instant: what went into these enclosures during a spell is in it
     * by `at`, also through a valve that was shut since. None on land.
     */
    async waterSources(
      enclosureId: string,
      since: Date,
      at: Date,
      db: Db = parts.dataSource,
    ): Promise<WaterSourceSpell[]> {
      const enclosure = await placeReads.readEnclosure(db, { id: enclosureId })
      if (!enclosure || enclosure.water_body_id === null) return []
      const map = await readWholeWaterMap(db)
      const found = listWaterSources(map, enclosure.water_body_id, since.toISOString(), at.toISOString())
      return found.ok ? found.value : []
    },
    /** Readings of one parameter in these bodies after `from` up to `until`, the newest first; void ones left out. */
    async recentReadings(
      waterBodyIds: readonly string[],
      parameter: ReadingParameter,
      from: Date,
      until: Date,
      db: Db = parts.dataSource,
    ): Promise<{ canonicalValue: number; at: string }[]> {
      const rows = await readParameterSince(db, waterBodyIds, parameter, from, until)
      return rows.map((row) => ({ canonicalValue: row.canonical_value, at: row.happened_at.toISOString() }))
    },
    /** Volumes that wait for a second person, or that are to be checked again by a day. */
    volumeWork(checkUntilOn: string, db: Db = parts.dataSource) {
      return readVolumeWork(db, checkUntilOn)
    },
    /** The whole map with its open/shut ledger, as the engines of clocks and tracing take it. */
    waterMap(db: Db = parts.dataSource): Promise<WaterMap> {
      return readWholeWaterMap(db)
    },
  }
}

export type WaterQuestions = ReturnType<typeof createWaterQuestions>
