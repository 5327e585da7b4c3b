import type { ShapeName } from '../../../shared/domain/water/tank-shape.ts'
import type { VolumePart, VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import { keyOf } from './volume-form-model.ts'
import type { PartDraft, VolumeDraft } from './volume-form-model.ts'

/** An error of zero was not stated on the bench: it is open until somebody says it. */
const errorText = (percent: number) => (percent > 0 ? String(percent) : '')

/**
 * The form with a sheet from the bench in it. Its tank is that of the enclosure and its sump the first one of the water;
 * parts of the water that the bench did not know of stay in the form, to be measured or taken away.
 *
 * @param start the empty form of this water
 * @param code  the enclosure that the sheet is for
 */
export function draftOfCarried(sheet: VolumeSheet, start: VolumeDraft, code: string): VolumeDraft {
  switch (sheet.method) {
    case 'stated':
      return { ...start, method: 'stated', statedVolume: sheet.volume, error: errorText(sheet.errorPercent) }
    case 'metered': {
      const { startReading, endReading, errorPercent } = sheet
      return { ...start, method: 'metered', startReading, endReading, error: errorText(errorPercent) }
    }
    case 'salt-dilution': {
      const { saltMass, salinityRise, errorPercent } = sheet
      return { ...start, method: 'salt-dilution', saltMass, salinityRise, error: errorText(errorPercent) }
    }
    case 'geometry':
      return geometry(sheet, start, code)
  }
}

function geometry(
  sheet: Extract<VolumeSheet, { method: 'geometry' }>,
  start: VolumeDraft,
  code: string,
): VolumeDraft {
  const left = [...start.parts]
  const parts = sheet.parts.map((part): PartDraft => {
    const at = left.findIndex((one) => (part.role === 'sump' ? one.role === 'sump' : one.key === keyOf(code)))
    const [place] = at === -1 ? [] : left.splice(at, 1)
    return partOf(part, place)
  })
  const { displacement } = sheet
  return {
    ...start,
    method: 'geometry',
    parts: [...parts, ...left],
    pipes: sheet.pipes.map((pipe) => ({
      key: pipe.key,
      bore: pipe.bore,
      length: pipe.length,
      error: errorText(pipe.errorPercent),
    })),
    displacement: displacement
      ? {
          ...start.displacement,
          ...displacement,
          error: errorText(displacement.errorPercent),
        }
      : start.displacement,
  }
}

function partOf(part: VolumePart, place: PartDraft | undefined): PartDraft {
  const { shape, sides, measured, ...measures } = part.shape as { shape: ShapeName } & Record<string, unknown>
  return {
    key: place?.key ?? part.key,
    role: place?.role ?? part.role,
    name: place?.name ?? part.name ?? '',
    shape,
    measures: measures as PartDraft['measures'],
    sides: typeof sides === 'number' ? String(sides) : '6',
    measured: measured === 'across-flats' ? 'across-flats' : 'side',
    error: errorText(part.errorPercent),
  }
}
