import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import type { QuantityInput } from '../../../shared/bench/inputs.ts'
import { roundedTo } from '../../../shared/bench/round-figure.ts'
import type { WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import type { ReadingRow, Volume } from '../../../shared/contracts/water-facts.ts'
import { readingAgeLimitMinutes } from '../../../shared/domain/cautions/reading-age-limit.ts'
import { isVolumeOld, volumeAgeLimit } from '../../../shared/domain/cautions/rules/r32-volume.ts'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import { withoutTrailingZeros } from '../../../shared/domain/quantities/number-text.ts'
import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { minutesBetween } from '../../../shared/domain/time/instant-arithmetic.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { benchEnclosureWords as words } from '../../../shared/messages/bench-enclosure.ts'
import { sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import { parameterNames, volumeMethodNames } from '../../../shared/messages/water.ts'
import { volumeRefusalWords, waterWords } from '../../../shared/messages/water-sheet.ts'
import { netVolumeText, readingText } from '../water/index.ts'
import type { Draft } from './bench-draft.ts'

/** What the water of an enclosure says for one input. */
export interface FoundFigure {
  /** As it goes into the field; null where nothing is known that may go in. */
  fill: { value: string; unit: string } | null
  /** How it is written where the field holds something else. */
  shown: string
  /** When it was found out, for the age; null where nobody has. */
  at: string | null
  /** Where it comes from, given when that was: how long ago, or the time. */
  says(when: string): string
  /** Set once it is older than it may be. */
  oldAt(now: string): string | null
  /** Answers of choices that go with it. */
  answers?: Readonly<Record<string, string>>
}

const volumeFigures = 6
const errorFigures = 3

/** The inputs that the water of an enclosure can fill. */
export function fillableInputs(of: AnyCalculator): string[] {
  return Object.entries(of.inputs)
    .filter(
      ([, input]) =>
        input.kind === 'quantity' && (input.netVolume ?? input.reading ?? isVolumeError(of, input)),
    )
    .map(([name]) => name)
}

const isVolumeError = (of: AnyCalculator, input: QuantityInput): boolean => {
  const other = input.errorOf === undefined ? undefined : of.inputs[input.errorOf]
  return other?.kind === 'quantity' && other.netVolume === true
}

/** What the water of an enclosure says for every input that it can fill; what is not known is said to be unknown. */
export function enclosureFigures(
  of: AnyCalculator,
  water: WaterOfEnclosure,
  zone: string,
): Record<string, FoundFigure> {
  const found: Record<string, FoundFigure> = {}
  for (const name of fillableInputs(of)) {
    const input = of.inputs[name]
    if (input?.kind !== 'quantity') continue
    found[name] = input.netVolume
      ? volumeFigure(water, zone)
      : input.reading
        ? readingFigure(water, input, input.reading)
        : errorFigure(water, zone)
  }
  return found
}

const unknown = (says: string): FoundFigure => ({
  fill: null,
  shown: '',
  at: null,
  says: () => says,
  oldAt: () => null,
})

function readingFigure(
  water: WaterOfEnclosure,
  input: QuantityInput,
  parameter: ReadingParameter,
): FoundFigure {
  const { code } = water.enclosure
  const row = water.latest.find((one) => one.parameter === parameter)
  if (!row) return unknown(words.readingNone({ code, parameter: parameterNames[parameter] }))
  const fill = row.below ? null : inUnitsOf(input, row)
  const { text: shown } = readingText(row)
  const minutes = readingAgeLimitMinutes(parameter)
  return {
    fill,
    shown,
    at: row.happenedAt,
    says: (ago) =>
      [
        words.reading({ code: row.waterBodyCode, shown, ago, by: row.recordedBy }),
        ...(row.below ? [words.readingBelow] : fill ? [] : [words.readingUnit]),
      ].join(' '),
    oldAt: (now) => (minutesBetween(row.happenedAt, now) > minutes ? words.readingOld({ minutes }) : null),
    answers: {
      ...input.readingSays,
      // a scale that nobody noted is asked of the person, not left at what stood there before
      ...(input.readingScaleIn ? { [input.readingScaleIn]: row.scale ?? '' } : {}),
    },
  }
}

/** A reading as read where the field takes its unit, otherwise in the field's first unit of that dimension. */
function inUnitsOf(input: QuantityInput, { value: { value, unit } }: ReadingRow): FoundFigure['fill'] {
  if (!isUnitCode(unit)) return null
  if (input.units.includes(unit)) return { value, unit }
  const other = input.units.find((one) => unitOf(one).dimension === unitOf(unit).dimension)
  if (other === undefined) return null
  const there = formatReading({ value, unit }, other).number.replaceAll(',', '').replace('−', '-')
  return { value: there.replace(/[^\d.-]/g, ''), unit: other }
}

function usableVolume(water: WaterOfEnclosure): Volume | null {
  return water.volume.usable ? water.volume.volume : null
}

function volumeFigure(water: WaterOfEnclosure, zone: string): FoundFigure {
  const { code } = water.enclosure
  const volume = usableVolume(water)
  if (!volume) return unknown(words.volumeNone({ code, why: whyNoVolume(water) }))
  const { text: shown } = netVolumeText(volume, 'L')
  const months = volumeAgeLimit.default
  return {
    fill: { value: digits(volume.netVolumeLitres, volumeFigures), unit: 'L' },
    shown,
    at: volume.happenedAt,
    says: (ago) =>
      words.volume({
        code,
        shown,
        ago,
        by: volume.recordedBy,
        method: volumeMethodNames[volume.method],
        covers: volume.codes.join(', '),
      }),
    oldAt: (now) =>
      isVolumeOld(volume.happenedOn, facilityDateOf(now, zone), months) ? words.volumeOld({ months }) : null,
  }
}

function whyNoVolume(water: WaterOfEnclosure): string {
  if (water.bodies.length === 0) return words.noWater
  const { refusal } = water.volume
  return refusal !== null && refusal in volumeRefusalWords
    ? volumeRefusalWords[refusal as keyof typeof volumeRefusalWords]
    : volumeRefusalWords['no-determination']
}

/** The error belongs to the volume: without a volume to dose by there is none either. */
function errorFigure(water: WaterOfEnclosure, zone: string): FoundFigure {
  const { code } = water.enclosure
  const volume = usableVolume(water)
  if (!volume || volume.errorPercent === null) return unknown(words.errorNone({ code }))
  const fill = { value: digits(volume.errorPercent, errorFigures), unit: 'percent' }
  const { text: shown } = formatReading({ value: fill.value, unit: 'percent' })
  return {
    fill,
    shown,
    at: null,
    says: () => words.error({ code, shown }),
    oldAt: volumeFigure(water, zone).oldAt,
  }
}

/** A computed figure as it goes into a field; six digits lie far below what any volume is known to. */
const digits = (value: number, figures: number) =>
  value === 0 ? '0' : withoutTrailingZeros(roundedTo(value, figures))

/** Whether a field holds exactly what the enclosure said. */
export function isFilledBy(figure: FoundFigure, given: Draft[string] | undefined): boolean {
  return (
    typeof given === 'object' &&
    figure.fill !== null &&
    given.value === figure.fill.value &&
    given.unit === figure.fill.unit
  )
}

/**
 * The fields after an enclosure was chosen: what its water says goes in. A figure that a person typed is kept; one that
 * another enclosure had filled in goes, also where this one says nothing.
 *
 * @param before what the enclosure chosen before had said
 */
export function withEnclosureFigures(
  draft: Draft,
  found: Readonly<Record<string, FoundFigure>>,
  before: Readonly<Record<string, FoundFigure>>,
): Draft {
  const next = { ...draft }
  for (const name of new Set([...Object.keys(before), ...Object.keys(found)])) {
    const given = draft[name]
    if (typeof given !== 'object') continue
    const earlier = before[name]
    const isTyped = given.value.trim() !== '' && !(earlier && isFilledBy(earlier, given))
    if (isTyped) continue
    next[name] = found[name]?.fill ?? { value: '', unit: given.unit }
    if (found[name]?.fill) Object.assign(next, found[name].answers)
  }
  return next
}

/** Where the figure in a field comes from, with the time at which it was found; undefined where a person typed it. */
export function originOf(
  figure: FoundFigure | undefined,
  given: Draft[string] | undefined,
  zone: string,
): string | undefined {
  if (!figure || !isFilledBy(figure, given)) return undefined
  const at = figure.at === null ? '' : sayInstantWithOffset(figure.at, zone)
  return figure.says(at).replace(/\.$/, '')
}

/** What is said beside a field that an enclosure can fill. */
export interface FieldNote {
  says: string
  /** Why the figure is too old; undefined while it counts. */
  old?: string | undefined
  /** The figure that stands ready, where the field holds another. */
  take?: { value: string; unit: string; shown: string } | undefined
}

/** @param now the instant by the server's clock */
export function noteOf(figure: FoundFigure, given: Draft[string] | undefined, now: string): FieldNote {
  const ago =
    figure.at === null ? '' : waterWords.ago({ minutes: Math.max(0, minutesBetween(figure.at, now)) })
  const says = figure.says(ago)
  const old = figure.oldAt(now) ?? undefined
  if (figure.fill === null) return { says, old }
  if (isFilledBy(figure, given)) return { says, old }
  return { says: words.changed({ says }), old, take: { ...figure.fill, shown: figure.shown } }
}
