import { ok, refuse, type Result } from '../../../domain/result.ts'
import type { SourceKey } from '../../../domain/sources.ts'
import type { ParsedQuantity } from '../../../domain/units/parse-quantity.ts'
import { changeCourse, type ChangeStep } from '../../../domain/water/flow/change-course.ts'
import { changesNeeded, singleChangeFraction } from '../../../domain/water/flow/changes-needed.ts'
import { shareKept } from '../../../domain/water/flow/losses.ts'
import { remainingAfterChanges } from '../../../domain/water/remaining-after-changes.ts'
import { waterChangeShare } from '../../../domain/water/water-change-share.ts'
import { enteredTerm } from '../../../domain/working/entered-term.ts'
import { valueTerm } from '../../../domain/working/value-term.ts'
import type { BenchCaution, BenchLine, Figure, Outcome, Schedule } from '../../definition.ts'
import { line } from '../../line.ts'

/** Of more changes than these the rows are not listed. */
export const mostRows = 60
/** From this share on the new water has to match the old one. @source treatment-practice */
const largePercent = 50
/** Below this share of the water a change is a slip, and its logarithm has no digits to check. */
const leastFraction = 1e-6

/** The three concentrations, and their terms; of a share alone, percent stand for milligrams in a litre. */
interface Water {
  initialMgPerL: number
  targetMgPerL: number
  replacementMgPerL: number
  unit: 'mg/L' | 'percent'
  terms: { initial: string; target: string; replacement: string }
  lines: BenchLine[]
  /** The input that a refused target is about. */
  targetInput: string
}

interface GivenWater {
  as: 'share' | 'concentrations'
  removed: ParsedQuantity | undefined
  initial: ParsedQuantity | undefined
  target: ParsedQuantity | undefined
  replacement: ParsedQuantity | undefined
}

/** Reads the water, by its concentrations or by a share alone. */
export function waterOf({ as, removed, initial, target, replacement }: GivenWater): Water {
  if (as === 'share') {
    const wanted = 100 - (removed?.value ?? 0)
    const lines = removed ? [line('share-left', `100 - ${enteredTerm(removed)}`, wanted, 'percent')] : []
    return {
      initialMgPerL: 100,
      targetMgPerL: wanted,
      replacementMgPerL: 0,
      unit: 'percent',
      terms: { initial: '100', target: valueTerm(wanted, 'percent'), replacement: '0' },
      lines,
      targetInput: 'removed',
    }
  }
  const term = (parsed: ParsedQuantity | undefined) => (parsed ? enteredTerm(parsed) : '0 mg/L')
  return {
    initialMgPerL: initial?.value ?? 0,
    targetMgPerL: target?.value ?? 0,
    replacementMgPerL: replacement?.value ?? 0,
    unit: 'mg/L',
    terms: { initial: term(initial), target: term(target), replacement: term(replacement) },
    lines: [],
    targetInput: 'target',
  }
}

/** What one change is: its share with the term for it, and its litres where the volume is known. */
interface Size {
  fraction: number
  /** "1 - 30 / 100" */
  keeps: string
  lines: BenchLine[]
  rests: string[]
  litres: number | undefined
  litresLines: BenchLine[]
}

interface GivenSize {
  share: ParsedQuantity | undefined
  changed: ParsedQuantity | undefined
  volume: ParsedQuantity | undefined
}

/** Reads the size of a change: a share of the water, or litres of a known volume. */
export function sizeOf({ share, changed, volume }: GivenSize): Result<Size> {
  if (changed) {
    if (!volume) return refuse('volume-missing', 'volume')
    const found = waterChangeShare({ changed: changed.entered, netVolume: volume.entered })
    if (!found.ok) return found
    const { changedLitres, working } = found.value
    // the percentage that the working shows is the one that is used: of nearly all the water the rest has few digits
    const percent = found.value.fraction * 100
    const fraction = percent / 100
    if (fraction < leastFraction) return refuse('change-too-small', 'changed')
    const keeps = `(1 - ${valueTerm(percent, 'percent')} / 100)`
    const litresLines = [line('litres-each', `${enteredTerm(changed)} to L`, changedLitres, 'L')]
    return ok({
      fraction,
      keeps,
      lines: working,
      rests: ['change-fraction'],
      litres: changedLitres,
      litresLines,
    })
  }
  const percent = share ? enteredTerm(share) : '0'
  const fraction = (share?.value ?? 0) / 100
  const litres = volume ? fraction * volume.value : undefined
  const litresLines =
    volume && litres !== undefined
      ? [line('litres-each', `${enteredTerm(volume)} * ${percent} / 100 to L`, litres, 'L')]
      : []
  return ok({ fraction, keeps: `(1 - ${percent} / 100)`, lines: [], rests: [], litres, litresLines })
}

/** The one change that does it. */
export function singleChange(water: Water, volume: ParsedQuantity | undefined): Result<Outcome> {
  const fraction = singleChangeFraction(water)
  if (!fraction.ok) return about(fraction, water)
  const percent = fraction.value * 100
  const { initial, target, replacement } = water.terms
  const expression =
    percent === 0 || percent === 100
      ? String(percent)
      : `(${initial} - ${target}) / (${initial} - ${replacement}) * 100`
  const figures: [Figure, ...Figure[]] = [{ key: 'single', value: percent, unit: 'percent' }]
  const working = [...water.lines, line('single', expression, percent, 'percent')]
  if (volume) {
    const litres = fraction.value * volume.value
    figures.push({ key: 'litres-each', value: litres, unit: 'L', kind: 'volume' })
    const term = `${enteredTerm(volume)} * ${valueTerm(percent, 'percent')} / 100 to L`
    working.push(line('litres-each', term, litres, 'L', ['single']))
  }
  return ok({ figures, working, ...large(fraction.value) })
}

/** How many changes it takes, and what they leave. */
export function countedChanges(water: Water, size: Size): Result<Outcome> {
  const { fraction, keeps } = size
  const needed = changesNeeded({ ...water, changeFraction: fraction })
  if (!needed.ok) return about(needed, water)
  const changes = needed.value
  const after = remainingAfterChanges({ ...water, changeFraction: fraction, changes })
  if (!after.ok) return after
  const course =
    changes > mostRows ? undefined : changeCourse({ ...water, changeFraction: fraction, changes })
  if (course && !course.ok) return course
  const { initial, target, replacement } = water.terms
  const share =
    water.unit === 'percent'
      ? `${target} / 100`
      : `(${target} - ${replacement}) / (${initial} - ${replacement})`
  // a whole change has no logarithm, and where nothing is to go there is nothing to divide by
  const expression = changes === 0 || fraction === 1 ? String(changes) : `ceil(log(${share}) / log(${keeps}))`
  const count = line(
    'changes',
    expression,
    changes,
    'ratio',
    changes === 0 || fraction === 1 ? [] : size.rests,
  )
  const { figures, lines } = litresOf(size, changes)
  const risk = large(fraction)
  return ok({
    figures: [
      { key: 'changes', value: changes, unit: 'ratio', whole: true },
      { key: 'left', value: after.value, unit: water.unit },
      ...figures,
    ],
    working: [...water.lines, ...size.lines, count, leftLine(water, size, after.value, count), ...lines],
    ...(course ? { schedule: rowsOf(course.value, water) } : {}),
    sources: risk.sources,
    cautions: [
      ...risk.cautions,
      ...(course ? [] : [{ code: 'not-listed', level: 'note', params: { most: mostRows } } as const]),
    ],
  })
}

/** What is left, from the number of changes as it stands in an earlier line or as it was typed. */
function leftLine(water: Water, size: Size, value: number, count: BenchLine | ParsedQuantity): BenchLine {
  const { initial, replacement } = water.terms
  const counts = 'key' in count
  const power = counts ? valueTerm(count.value, 'ratio') : enteredTerm(count)
  const shrunk = `${size.keeps}^(${power})`
  const expression =
    water.unit === 'percent'
      ? `100 * ${shrunk}`
      : `${replacement} + (${initial} - ${replacement}) * ${shrunk} to mg/L`
  return line('left', expression, value, water.unit, [...size.rests, ...(counts ? [count.key] : [])])
}

/** A loss of first order between the changes. */
interface Loss {
  halfLife: ParsedQuantity
  interval: ParsedQuantity
}

const minutesPerHour = 60

/** What a number of changes leaves, with what is lost between them. */
export function leftAfter(
  water: Water,
  size: Size,
  changes: ParsedQuantity,
  loss: Loss | undefined,
): Result<Outcome> {
  const hours = loss && {
    halfLifeHours: loss.halfLife.value / minutesPerHour,
    intervalHours: loss.interval.value / minutesPerHour,
  }
  const course = changeCourse({
    ...water,
    changeFraction: size.fraction,
    changes: changes.value,
    ...(hours ? { loss: hours } : {}),
  })
  if (!course.ok) return course
  const value = course.value.at(-1)?.afterMgPerL ?? water.initialMgPerL
  const { figures, lines } = litresOf(size, changes.value)
  const kept = hours && shareKept({ halfLifeHours: hours.halfLifeHours, hours: hours.intervalHours })
  if (kept && !kept.ok) return kept
  const last =
    loss && kept && changes.value > 1
      ? lossLines(water, size, course.value, loss, kept.value)
      : [leftLine(water, size, value, changes)]
  return ok({
    figures: [{ key: 'left', value, unit: water.unit }, ...figures],
    working: [...size.lines, ...last, ...lines],
    schedule: rowsOf(course.value, water),
    ...large(size.fraction),
  })
}

/** Each change with the loss before it: the value of one line goes into the next. */
function lossLines(
  water: Water,
  size: Size,
  course: readonly ChangeStep[],
  loss: Loss,
  kept: number,
): BenchLine[] {
  const { initial, replacement } = water.terms
  const keptLine = line(
    'kept',
    `2^(-${enteredTerm(loss.interval)} / (${enteredTerm(loss.halfLife)})) * 100`,
    kept * 100,
    'percent',
  )
  const to = water.unit === 'mg/L' ? ' to mg/L' : ''
  const after = (key: string, before: string, step: ChangeStep, rests: string[]) =>
    line(
      key,
      `${replacement} + (${before} - ${replacement}) * ${size.keeps}${to}`,
      step.afterMgPerL,
      water.unit,
      [...size.rests, ...rests],
      { code: key === 'first' ? 'first' : 'left' },
    )
  const term = valueTerm(kept * 100, 'percent')
  return [
    keptLine,
    ...course.map((step, at) => {
      const previous = course[at - 1]
      if (previous === undefined) return after('first', initial, step, [])
      const key = at === course.length - 1 ? 'left' : `left-${String(step.change)}`
      const earlier = at === 1 ? 'first' : `left-${String(previous.change)}`
      const before = `${valueTerm(previous.afterMgPerL, water.unit)} * ${term} / 100`
      return after(key, before, step, ['kept', earlier])
    }),
  ]
}

function litresOf(size: Size, changes: number): { figures: Figure[]; lines: BenchLine[] } {
  const { litres, litresLines } = size
  if (litres === undefined) return { figures: [], lines: [] }
  const all = litres * changes
  const sum = `${valueTerm(litres, 'L')} * ${valueTerm(changes, 'ratio')} to L`
  return {
    figures: [
      { key: 'litres-each', value: litres, unit: 'L', kind: 'volume' },
      { key: 'litres-all', value: all, unit: 'L', kind: 'volume' },
    ],
    lines: [...litresLines, line('litres-all', sum, all, 'L', ['litres-each'])],
  }
}

const rowsOf = (course: readonly ChangeStep[], water: Water): Schedule => ({
  columns: [
    { key: 'change', unit: 'ratio', whole: true },
    { key: 'before', unit: water.unit },
    { key: 'after', unit: water.unit },
  ],
  rows: course.map((step) => [step.change, step.beforeMgPerL, step.afterMgPerL]),
})

/** The caution of a large change, with the work that it rests on. */
function large(fraction: number): { cautions: BenchCaution[]; sources: SourceKey[] } {
  if (fraction * 100 <= largePercent) return { cautions: [], sources: [] }
  return { cautions: [{ code: 'large', level: 'warning' }], sources: ['treatment-practice'] }
}

/** A refused target, pointed at the input that it came from. */
function about<T>(
  result: Extract<Result<T>, { ok: false }>,
  water: Water,
): Extract<Result<T>, { ok: false }> {
  if (result.refusal.field !== 'targetMgPerL') return result
  return { ok: false, refusal: { ...result.refusal, field: water.targetInput } }
}
