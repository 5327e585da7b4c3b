import { dilutionFor, injectionSites } from '../injection/injection-volume.ts'
import { decimalOf, decimalText } from '../quantities/decimal.ts'
import { roundingErrorPercent } from '../quantities/rounding-error.ts'
import { roundToDivision } from '../quantities/round-to-division.ts'
import { ok, refuse, type Result } from '../result.ts'
import { convert } from '../units/convert.ts'
import { isUnitCode } from '../units/is-unit-code.ts'
import { parseQuantity, type ParsedQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import type { Measure } from './bath-product.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import type { WeightDose } from './weight-dose.ts'

type Measured = Pick<WeightDose, 'measured' | 'roundingPercent' | 'thinTo' | 'portions'>

/**
 * An amount for one animal as a syringe or a balance can take it, in the unit of its division, halves up, and divided
 * in whole steps over the places that the largest volume for one asks for.
 *
 * @param amount in grams or millilitres
 * @returns nothing without a measure
 * @refuses as parseQuantity · division-not-positive · division-of-other-kind · below-half-step: nothing would be left
 *          of it (params: thin, to how many parts) · place-below-step: a place may get less than one step
 * @source  check values injr.*, inje.*, inj.refuse3 · portions in whole steps: project-default
 */
export function measureForAnimal(
  amount: number,
  unit: 'g' | 'mL',
  { measure, mostPerPlace }: { measure?: Measure; mostPerPlace?: Quantity },
): Result<Measured, DoseRefusal> {
  if (measure === undefined) return ok({})
  const kind = unit === 'g' ? 'mass' : 'volume'
  const size = parseQuantity(measure.division, { dimension: kind, field: 'division' })
  if (!size.ok)
    return size.refusal.code === 'dimensions-differ' ? refuse('division-of-other-kind', 'division') : size
  const { entered } = size.value
  if (!isUnitCode(entered.unit) || size.value.value <= 0) return refuse('division-not-positive', 'division')
  const there = convert(amount, unit, entered.unit)
  if (!there.ok) return refuse(there.refusal.code, 'division')
  const rounded = roundToDivision(there.value, entered.value)
  if (!rounded.ok) return refuse(rounded.refusal.code, 'division')
  const thin = dilutionFor(there.value, Number(entered.value))
  const thinTo = thin.ok && thin.value > 1 ? thin.value : undefined
  if (Number(rounded.value) === 0)
    return refuse('below-half-step', 'division', thinTo === undefined ? {} : { parts: thinTo })
  const portions =
    mostPerPlace === undefined || unit === 'g'
      ? ok(undefined)
      : divide(rounded.value, { value: entered.value, unit: entered.unit }, mostPerPlace)
  if (!portions.ok) return portions
  return ok({
    measured: { value: rounded.value, unit: entered.unit },
    roundingPercent: roundingErrorPercent(Number(rounded.value), there.value),
    ...(thinTo === undefined ? {} : { thinTo }),
    ...(portions.value === undefined ? {} : { portions: portions.value }),
  })
}

/** The measured volume in whole steps, as even as they allow, none above the largest for one place. */
function divide(
  measured: string,
  step: Quantity,
  mostPerPlace: Quantity,
): Result<Quantity[] | undefined, DoseRefusal> {
  const field = 'mostPerPlace'
  const most = parseQuantity(mostPerPlace, { dimension: 'volume', above: 0, field })
  if (!most.ok) return most
  const least = parseQuantity(step, { dimension: 'volume', field: 'division' })
  if (!least.ok) return least
  const stepsOfAll = wholeSteps(measured, step.value)
  const stepsOfPlace = stepsIn(most.value, least.value)
  if (stepsOfPlace < 1) return refuse('place-below-step', field)
  const places = injectionSites(stepsOfAll, stepsOfPlace)
  if (!places.ok) return refuse('not-finite', field)
  if (places.value === 1) return ok(undefined)
  const each = Math.floor(stepsOfAll / places.value)
  const more = stepsOfAll - each * places.value
  return ok(
    Array.from({ length: places.value }, (_, i) => ({
      value: timesStep(step.value, each + (i < more ? 1 : 0)),
      unit: step.unit,
    })),
  )
}

/** How many whole steps one place may get; a share of a step that is of the binary form alone counts as the step. */
const stepsIn = (most: ParsedQuantity<'volume'>, step: ParsedQuantity<'volume'>): number =>
  Math.floor((most.value / step.value) * (1 + 1e-12))

const wholeSteps = (measured: string, division: string): number =>
  Math.round(Number(measured) / Number(division))

function timesStep(division: string, steps: number): string {
  const step = decimalOf(division)
  return step ? decimalText({ ...step, digits: step.digits * BigInt(steps) }) : division
}
