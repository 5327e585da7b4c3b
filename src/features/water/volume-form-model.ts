import { computeVolume } from '../../../shared/domain/water/compute-volume.ts'
import type { Refusal, Result } from '../../../shared/domain/result.ts'
import type { ShapeName, TankShape } from '../../../shared/domain/water/tank-shape.ts'
import type { VolumeDetermination } from '../../../shared/domain/water/volume-determination.ts'
import type { VolumeRefusal } from '../../../shared/domain/water/volume-refusal.ts'
import type { Displacement, VolumeMethod, VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { parseNumber } from '../../../shared/domain/units/parse-number.ts'
import type { TypedQuantity } from '../../ui/use-quantity-field.ts'

/** Names of the measures of each shape, in the order people take them. */
export const measuresOf = {
  rectangular: ['length', 'width', 'depth'],
  cylindrical: ['diameter', 'depth'],
  'half-cylindrical': ['diameter', 'depth'],
  'cone-bottom': ['diameter', 'coneHeight', 'depth'],
  'bow-front': ['length', 'sideWidth', 'centreWidth', 'depth'],
  elliptical: ['longAxis', 'shortAxis', 'depth'],
  polygon: ['side', 'depth'],
  'truncated-cone': ['topDiameter', 'bottomDiameter', 'depth'],
  'spherical-cap': ['radius', 'depth'],
  'horizontal-cylinder': ['diameter', 'length', 'depth'],
  stated: ['volume'],
} as const satisfies Record<ShapeName, readonly string[]>
export type MeasureName = (typeof measuresOf)[ShapeName][number]

/** A part as it is being filled in. Measures are kept by name, so that changing the shape loses none that it shares. */
export interface PartDraft {
  key: string
  role: 'tank' | 'sump' | 'vessel'
  name: string
  shape: ShapeName
  measures: Partial<Record<MeasureName, TypedQuantity>>
  sides: string
  measured: 'side' | 'across-flats'
  error: string
}

export interface PipeDraft {
  key: string
  bore: TypedQuantity
  length: TypedQuantity
  error: string
}

/** The whole form. Every way of finding a volume keeps what was typed while another is looked at. */
export interface VolumeDraft {
  method: VolumeMethod
  parts: PartDraft[]
  pipes: PipeDraft[]
  /** `by` is null until somebody has said whether anything stands in the water. */
  displacement: {
    by: Displacement['by'] | 'none' | null
    volume: TypedQuantity
    share: TypedQuantity
    error: string
  }
  startReading: TypedQuantity
  endReading: TypedQuantity
  statedVolume: TypedQuantity
  saltMass: TypedQuantity
  salinityRise: TypedQuantity
  /** Error of a volume that is found in one step. */
  error: string
}

const empty = (unit: string): TypedQuantity => ({ value: '', unit })

/** A part of a role, empty; lengths open on the unit the person reads lengths in. */
export function emptyPart(key: string, role: PartDraft['role'], name: string): PartDraft {
  return { key, role, name, shape: 'rectangular', measures: {}, sides: '6', measured: 'side', error: '2' }
}

export function emptyPipe(key: string): PipeDraft {
  return { key, bore: empty('mm'), length: empty('m'), error: '10' }
}

/** An empty form for a water: a part for each enclosure and each sump that it covers. */
export function emptyDraft(
  bodies: readonly { code: string; kind: 'enclosure' | 'sump' | 'loop' }[],
  isVessel: boolean,
): VolumeDraft {
  const parts = bodies
    .filter((body) => body.kind !== 'loop')
    .sort((a, b) => (a.kind === b.kind ? 0 : a.kind === 'enclosure' ? -1 : 1))
    .map((body) =>
      emptyPart(keyOf(body.code), body.kind === 'sump' ? 'sump' : isVessel ? 'vessel' : 'tank', body.code),
    )
  return {
    method: 'geometry',
    parts,
    pipes: [],
    displacement: { by: null, volume: empty('L'), share: empty('percent'), error: '10' },
    startReading: empty('L'),
    endReading: empty('L'),
    statedVolume: empty('L'),
    saltMass: empty('kg'),
    salinityRise: empty('g/L'),
    error: '5',
  }
}

/** The key of a part in the working: lower case, as the contract wants it. */
export const keyOf = (code: string) =>
  code
    .toLowerCase()
    .replace(/[^a-z0-9-]/g, '-')
    .slice(0, 40)

/**
 * The form for measuring again: parts, shapes and the lengths of walls and pipes as they were found last time. The depth
 * of the water and what stands in it are left empty: they are what has changed.
 */
export function draftOfSheet(sheet: VolumeSheet, start: VolumeDraft): VolumeDraft {
  if (sheet.method !== 'geometry') return { ...start, method: sheet.method }
  return {
    ...start,
    method: 'geometry',
    parts: sheet.parts.map((part) => {
      const {
        shape,
        depth: _depth,
        sides,
        measured,
        ...lengths
      } = part.shape as { shape: ShapeName } & Record<string, unknown>
      return {
        ...emptyPart(part.key, part.role, part.name ?? ''),
        shape,
        measures: lengths as PartDraft['measures'],
        sides: typeof sides === 'number' ? String(sides) : '6',
        measured: measured === 'across-flats' ? 'across-flats' : 'side',
        error: String(part.errorPercent),
      }
    }),
    pipes: sheet.pipes.map((pipe) => ({
      key: pipe.key,
      bore: pipe.bore,
      length: pipe.length,
      error: String(pipe.errorPercent),
    })),
  }
}

// The engine reads units and digits itself and refuses what it cannot read.
const asQuantity = (typed: TypedQuantity | undefined) =>
  (typed ?? { value: '', unit: 'm' }) as Quantity<never>
const percent = (typed: string) => {
  const number = parseNumber(typed)
  return number.ok ? number.value.value : Number.NaN
}

function shapeOf(part: PartDraft): TankShape {
  const measures = Object.fromEntries(
    measuresOf[part.shape].map((name) => [name, asQuantity(part.measures[name])]),
  )
  const more = part.shape === 'polygon' ? { sides: percent(part.sides), measured: part.measured } : {}
  return { shape: part.shape, ...more, ...measures } as unknown as TankShape
}

/** The sheet that a form says. */
export function sheetOf(draft: VolumeDraft): VolumeSheet {
  const errorPercent = percent(draft.error)
  switch (draft.method) {
    case 'metered':
      return {
        method: 'metered',
        startReading: asQuantity(draft.startReading),
        endReading: asQuantity(draft.endReading),
        errorPercent,
      }
    case 'stated':
      return { method: 'stated', volume: asQuantity(draft.statedVolume), errorPercent }
    case 'salt-dilution':
      return {
        method: 'salt-dilution',
        saltMass: asQuantity(draft.saltMass),
        salinityRise: asQuantity(draft.salinityRise),
        errorPercent,
      }
    case 'geometry':
      return {
        method: 'geometry',
        parts: draft.parts.map((part) => ({
          key: part.key,
          role: part.role,
          ...(part.name.trim() ? { name: part.name.trim() } : {}),
          shape: shapeOf(part),
          errorPercent: percent(part.error),
        })),
        pipes: draft.pipes.map((pipe) => ({
          key: pipe.key,
          bore: asQuantity(pipe.bore),
          length: asQuantity(pipe.length),
          errorPercent: percent(pipe.error),
        })),
        ...displacementOf(draft.displacement),
      }
  }
}

function displacementOf({ by, volume, share, error }: VolumeDraft['displacement']): {
  displacement?: Displacement
} {
  const errorPercent = percent(error)
  if (by === 'volume') return { displacement: { by, volume: asQuantity(volume), errorPercent } }
  if (by === 'share') return { displacement: { by, share: asQuantity(share), errorPercent } }
  return {}
}

/** The same engine as on the server: the volume with its working, or what has to be filled in or changed. */
export function workOut(draft: VolumeDraft): Result<VolumeDetermination, VolumeRefusal> {
  return computeVolume(sheetOf(draft))
}

/** What has to be said besides the measures; null when nothing is missing. */
export function isDisplacementOpen(draft: VolumeDraft): boolean {
  return draft.method === 'geometry' && draft.displacement.by === null
}

/** Whether a refusal only says that the form is not filled in yet. */
export function isUnfinished(refusal: Refusal<VolumeRefusal>): boolean {
  return refusal.code === 'blank' || refusal.code === 'no-water-part'
}
