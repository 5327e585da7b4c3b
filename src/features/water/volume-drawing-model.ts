import { formatVolume } from '../../../shared/domain/quantities/format-volume.ts'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { parseNumber } from '../../../shared/domain/units/parse-number.ts'
import { minusSign, noBreakSpace } from '../../../shared/domain/quantities/number-text.ts'
import type { TankShape } from '../../../shared/domain/water/tank-shape.ts'
import type { VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import type { WorkingLine } from '../../../shared/domain/working/working-line.ts'
import { shapeWords } from '../../../shared/messages/volume-form.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'

/** A vessel in the section drawing, with what is written in and beside it. */
export interface DrawnPart {
  key: string
  x: number
  width: number
  name: string
  /** "2.40 m inside", above the first tank. */
  acrossText: string
  /** "1.20 m wide", inside. */
  otherText: string
  depthText: string
  /** All measures in one line, for a part without dimension lines: "1.10 × 0.60 × 0.40 m". */
  allText: string
  litresText: string
  /** A cone below the straight wall. */
  cone: boolean
}

/** Everything the section drawing of a worksheet shows. */
export interface VolumeDrawing {
  tanks: DrawnPart[]
  sumps: DrawnPart[]
  displacedText: string | null
  pipeText: string | null
  pipeLitresText: string | null
  /** All of it in words, for readers. */
  inWords: string
}

const left = 60
const across = 410
const gap = 26
const sumpWidth = 190

/** A measure with the digits of the tape; empty while it is half typed. */
function measureText({ value, unit }: Quantity | { value: string; unit: string }): string {
  const number = parseNumber(value)
  return number.ok && isUnitCode(unit) ? formatReading({ value: number.value.text, unit }).text : ''
}

/** The measure that is drawn from wall to wall, the one into the sheet, and the depth. */
function textsOf(shape: TankShape): { across: string; other: string; depth: string } {
  const depth = 'depth' in shape ? measureText(shape.depth) : ''
  switch (shape.shape) {
    case 'rectangular':
      return {
        across: measureText(shape.length),
        other: waterWords.wide({ width: measureText(shape.width) }),
        depth,
      }
    case 'bow-front':
      return {
        across: measureText(shape.length),
        other: waterWords.wide({ width: `${shape.sideWidth.value} to ${measureText(shape.centreWidth)}` }),
        depth,
      }
    case 'elliptical':
      return {
        across: measureText(shape.longAxis),
        other: waterWords.wide({ width: measureText(shape.shortAxis) }),
        depth,
      }
    case 'cylindrical':
    case 'half-cylindrical':
    case 'cone-bottom':
      return { across: measureText(shape.diameter), other: shapeWords[shape.shape], depth }
    case 'horizontal-cylinder':
      return {
        across: measureText(shape.length),
        other: waterWords.across({ diameter: measureText(shape.diameter) }),
        depth,
      }
    case 'truncated-cone':
      return {
        across: measureText(shape.topDiameter),
        other: waterWords.across({ diameter: measureText(shape.bottomDiameter) }),
        depth,
      }
    case 'spherical-cap':
      return { across: measureText(shape.radius), other: shapeWords[shape.shape], depth }
    case 'polygon':
      return { across: measureText(shape.side), other: shapeWords.polygon, depth }
    case 'stated':
      return { across: '', other: shapeWords.stated, depth: '' }
  }
}

function allMeasures(shape: TankShape, texts: ReturnType<typeof textsOf>): string {
  if (shape.shape !== 'rectangular')
    return [texts.across, texts.other, texts.depth && waterWords.depthOf({ depth: texts.depth })]
      .filter(Boolean)
      .join(', ')
  const { length, width, depth } = shape
  const sameUnit = length.unit === width.unit && width.unit === depth.unit
  return sameUnit
    ? `${length.value} × ${width.value} × ${texts.depth}`
    : [texts.across, measureText(width), texts.depth].join(' × ')
}

/**
 * The section drawing of a worksheet by inside measures.
 *
 * @param working lines worked out from the sheet; a part without its line is drawn without its litres
 * @returns null for the other ways of finding a volume, which have no section
 */
export function volumeDrawing(sheet: VolumeSheet, working: readonly WorkingLine[]): VolumeDrawing | null {
  if (sheet.method !== 'geometry') return null
  const litresOf = (key: string) => {
    const line = working.find((one) => one.key === key)
    return line ? formatVolume(line.value, 'L').text : ''
  }
  const tanks = sheet.parts.filter((part) => part.role !== 'sump')
  const sumps = sheet.parts.filter((part) => part.role === 'sump')
  const drawn = (parts: typeof tanks, widest: number): DrawnPart[] => {
    const width = Math.min(widest, (across - gap * (parts.length - 1)) / Math.max(parts.length, 1))
    return parts.map((part, i) => {
      const texts = textsOf(part.shape)
      const word = { tank: waterWords.tankWord, sump: waterWords.sumpWord, vessel: waterWords.vesselWord }[
        part.role
      ]
      return {
        key: part.key,
        x: left + i * (width + gap),
        width,
        name: part.name ?? word,
        acrossText: texts.across,
        otherText: texts.other,
        depthText: texts.depth,
        allText: allMeasures(part.shape, texts),
        litresText: litresOf(part.key),
        cone: part.shape.shape === 'cone-bottom',
      }
    })
  }
  const displaced = working.find((line) => line.key === 'displaced')
  const pipe = sheet.pipes[0]
  const pipeLitres = working.filter((line) => sheet.pipes.some((one) => one.key === line.key))
  const allTanks = drawn(tanks, across)
  const allSumps = drawn(sumps, sumpWidth)
  const inWords = [...allTanks, ...allSumps].map((part) => `${part.name} ${part.allText}`).join('; ')
  return {
    tanks: allTanks,
    sumps: allSumps,
    displacedText: displaced ? `${minusSign}${noBreakSpace}${formatVolume(displaced.value, 'L').text}` : null,
    pipeText: pipe ? `${measureText(pipe.length)}, ${measureText(pipe.bore)}` : null,
    pipeLitresText:
      pipeLitres.length > 0
        ? `+${noBreakSpace}${
            formatVolume(
              pipeLitres.reduce((sum, line) => sum + line.value, 0),
              'L',
            ).text
          }`
        : null,
    inWords,
  }
}
