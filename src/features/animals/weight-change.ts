import type { WeightEntry } from '../../../shared/contracts/animals.contract.ts'
import { MS_PER_DAY } from '../../../shared/domain/time/instant.ts'
import { instantToMs } from '../../../shared/domain/time/instant-arithmetic.ts'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import { shownMassUnit, weightOfOne } from './weight-text.ts'

const looksBackDays = 42

/**
 * How the newest weight differs from the one about six weeks before it: "− 2.2 kg", to the digits of the balance. A shorter record is compared with
 * its first weight; a single one with nothing.
 *
 * @param weights the newest first
 */
export function weightChange(
  weights: readonly WeightEntry[],
  preferred: string | undefined,
): { by: string; since: string } | null {
  const live = weights.filter((weight) => weight.struck === null)
  const [newest] = live
  if (!newest || live.length < 2) return null
  const latest = instantToMs(newest.happenedAt) - looksBackDays * MS_PER_DAY
  const before = live.find((weight) => instantToMs(weight.happenedAt) <= latest) ?? live.at(-1)
  if (!before || before.id === newest.id) return null
  const kg = newest.weightKg - before.weightKg
  const unit = shownMassUnit(newest.unit, preferred)
  const places = (weightOfOne(newest, preferred).number.split('.')[1] ?? '').length
  const converted = convert(Math.abs(kg), 'kg', unit)
  const value = (converted.ok ? converted.value : Math.abs(kg)).toFixed(places)
  if (Number(value) === 0) return null
  const size = formatReading({ value, unit }).text
  return { by: `${kg < 0 ? '\u2212' : '+'}\u00a0${size}`, since: before.happenedAt }
}
