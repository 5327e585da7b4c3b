import { ok, refuse, type Result } from '../result.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import { combineErrors, type PartError } from './combine-errors.ts'
import { displacedVolume } from './displaced-volume.ts'
import { isErrorPercent } from './is-error-percent.ts'
import type { VolumeDetermination } from './volume-determination.ts'
import { volumeOfPipe } from './volume-of-pipe.ts'
import { volumeOfShape } from './volume-of-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import type { VolumeSheet } from './volume-sheet.ts'
import { waterLimits } from './water-limits.ts'

const litresLine = (
  key: string,
  code: WorkingLine['code'],
  expression: string,
  value: number,
  rests: string[],
): WorkingLine => ({ key, code, params: {}, expression: `${expression} to L`, value, unit: 'L', rests })

const ownKeys = ['gross-volume', 'displaced', 'net-volume', 'volume-error', 'volume-error-percent']

/**
 * Gross and net volume of connected water from its measured parts: tanks and sumps at their running level, plus full
 * pipework, minus what stands in the tanks.
 *
 * The error is combined as in combineErrors.
 *
 * @refuses as the shapes, with paths such as "parts.0.depth" · no-water-part · part-named-twice · error-outside-range ·
 *          error-above-volume when the errors together are more than the net water · as displacedVolume
 *          · below-least, above-most when the whole is no volume of a system (field netVolume)
 * @source  mensuration · check values geom.*
 */
export function volumeByGeometry(
  sheet: Extract<VolumeSheet, { method: 'geometry' }>,
): Result<VolumeDetermination, VolumeRefusal> {
  if (sheet.parts.length === 0) return refuse('no-water-part', 'parts')
  const keys = [...sheet.parts, ...sheet.pipes].map((part) => part.key)
  if (new Set([...keys, ...ownKeys]).size !== keys.length + ownKeys.length)
    return refuse('part-named-twice', 'parts')
  const working: WorkingLine[] = []
  const errors: PartError[] = []
  const terms: string[] = []
  let grossLitres = 0
  let tankLitres = 0

  for (const [index, part] of sheet.parts.entries()) {
    const params = { role: part.role, ...(part.name === undefined ? {} : { name: part.name }) }
    const path = `parts.${index}.`
    if (!isErrorPercent(part.errorPercent)) return refuse('error-outside-range', `${path}errorPercent`)
    const volume = volumeOfShape(part.shape, { key: part.key, path, params })
    if (!volume.ok) return volume
    working.push(...volume.value.lines)
    errors.push({ key: part.key, litres: volume.value.litres, errorPercent: part.errorPercent })
    terms.push(valueTerm(volume.value.litres, 'L'))
    grossLitres += volume.value.litres
    if (part.role !== 'sump') tankLitres += volume.value.litres
  }
  for (const [index, pipe] of sheet.pipes.entries()) {
    const params = { role: 'pipe', ...(pipe.name === undefined ? {} : { name: pipe.name }) }
    const path = `pipes.${index}.`
    if (!isErrorPercent(pipe.errorPercent)) return refuse('error-outside-range', `${path}errorPercent`)
    const volume = volumeOfPipe(pipe, { key: pipe.key, path, params })
    if (!volume.ok) return volume
    working.push(...volume.value.lines)
    errors.push({ key: pipe.key, litres: volume.value.litres, errorPercent: pipe.errorPercent })
    terms.push(valueTerm(volume.value.litres, 'L'))
    grossLitres += volume.value.litres
  }
  const partKeys = errors.map((part) => part.key)
  working.push(litresLine('gross-volume', 'gross-volume', terms.join(' + '), grossLitres, partKeys))

  const tankKeys = sheet.parts.filter((part) => part.role !== 'sump').map((part) => part.key)
  const displaced = displacedVolume(sheet.displacement, tankLitres, errors, tankKeys)
  if (!displaced.ok) return displaced
  const { litres: displacedLitres, lines, error } = displaced.value
  working.push(...lines)
  if (error) errors.push(error)

  const netLitres = grossLitres - displacedLitres
  const { leastLitres, mostLitres } = waterLimits
  if (netLitres < leastLitres) return refuse('below-least', 'netVolume', { limit: leastLitres, unit: 'L' })
  if (netLitres > mostLitres) return refuse('above-most', 'netVolume', { limit: mostLitres, unit: 'L' })
  const less = error ? ` - ${valueTerm(displacedLitres, 'L')}` : ''
  const netRests = ['gross-volume', ...(error ? [error.key] : [])]
  working.push(
    litresLine('net-volume', 'net-volume', `${valueTerm(grossLitres, 'L')}${less}`, netLitres, netRests),
  )

  const { displacement } = sheet
  // what is a share of the tanks is larger where they are: their error is counted on the water that is left
  const countedPercent = displacement?.by === 'share' ? percentLeft(displacedLitres, tankLitres) : undefined
  const counted = errors.map((part) =>
    countedPercent !== undefined && tankKeys.includes(part.key) ? { ...part, countedPercent } : part,
  )
  const combined = combineErrors(counted, netLitres)
  if (!isErrorPercent(combined.errorPercent)) return refuse('error-above-volume', 'parts')
  working.push(...combined.lines)
  return ok({
    method: 'geometry',
    grossLitres,
    displacedLitres,
    netLitres,
    errorLitres: combined.errorLitres,
    errorPercent: combined.errorPercent,
    displacement: !sheet.displacement
      ? 'not-measured'
      : sheet.displacement.by === 'volume'
        ? 'measured'
        : 'guessed',
    working,
  })
}

/** 88 for a share of 12: without the binary noise of the division, which the working would print. */
const percentLeft = (displacedLitres: number, tankLitres: number): number =>
  Number((100 - (displacedLitres / tankLitres) * 100).toPrecision(12))
