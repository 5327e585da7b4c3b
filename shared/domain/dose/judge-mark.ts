import { convert } from '../units/convert.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { doseLimits } from './dose-limits.ts'

/** What is on file of how high the water stands: nothing of it is shown to whoever reads the mark. */
export interface MarksOnFile {
  /** Depths by which the volume was determined, as entered. */
  depths: readonly Quantity[]
  /** Fill mark of a treatment vessel. */
  fillMark: { mark: string; volume: Quantity } | null
}

/**
 * - `not-on-file` the volume was not determined by a depth and the vessel has no fill mark: nothing to compare with
 * - `unreadable`  a depth is on file, and what was typed is no length with its unit
 */
export type MarkJudgement = 'agrees' | 'differs' | 'not-on-file' | 'unreadable'

const leastDepthMetres = 0.01
// the whole of what was typed: "not at 0.68 m" and "0.68 m or 6.8 m" name no depth
const numberAndUnit = /^(?:(?:depth|water)\s+)*(\d+(?:[.,]\d+)?)\s*([a-zA-Zµ″"'’.]+)$/i
/** As somebody names a mark: "at the Red  line" is "red line". */
const plain = (text: string) =>
  text
    .trim()
    .toLowerCase()
    .replace(/\s+/g, ' ')
    .replace(/^(?:(?:filled|up|to|at|on|the)\s)+/, '')

/**
 * Whether the mark that a second person saw is the one that the volume rests on: a depth within the drift that the order
 * allows, and at least a centimetre; or the fill mark by its name or its volume.
 *
 * @param read                as typed: "0.68 m", "68 cm", "red line"
 * @param allowedDriftPercent what the order allows the volume to have moved
 * @source project-default
 */
export function judgeMark(read: string, onFile: MarksOnFile, allowedDriftPercent: number): MarkJudgement {
  const { depths, fillMark } = onFile
  if (depths.length === 0 && !fillMark) return 'not-on-file'
  const [, value = '', unit = ''] = numberAndUnit.exec(read.trim()) ?? []
  if (fillMark) {
    if (plain(fillMark.mark) !== '' && plain(read) === plain(fillMark.mark)) return 'agrees'
    const volume = parseQuantity({ value, unit }, { dimension: 'volume', above: 0 })
    if (volume.ok) return isNear(volume.value.value, fillMark.volume, doseLimits.agreementPercent, 0)
    if (depths.length === 0) return 'differs'
  }
  const depth = parseQuantity({ value, unit }, { dimension: 'length', above: 0 })
  if (!depth.ok) return fillMark ? 'differs' : 'unreadable'
  const near = depths.map((one) => isNear(depth.value.value, one, allowedDriftPercent, leastDepthMetres))
  return near.includes('agrees') ? 'agrees' : 'differs'
}

/** Both in the canonical unit of the dimension: metres or litres. */
function isNear(read: number, onFile: Quantity, percent: number, least: number): 'agrees' | 'differs' {
  const wanted = convert(Number(onFile.value), onFile.unit, least > 0 ? 'm' : 'L')
  if (!wanted.ok) return 'differs'
  const allowed = Math.max(least, (wanted.value * percent) / 100)
  return Math.abs(read - wanted.value) <= allowed * (1 + 1e-9) ? 'agrees' : 'differs'
}
