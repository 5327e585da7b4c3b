import { ok, refuse } from '../result.ts'
import type { Result } from '../result.ts'
import type { RuleParameter } from './caution-rule.ts'

/** Water in which nobody here keeps anything alive lies outside. Project default: no outside authority. */
const temperatures = { least: -2, most: 45 }
const wholePh = { least: 0, most: 14 }
const wholePercent = { least: 0, most: 100 }
/** How many times a default may be moved either way before it is taken for a slip. Project default. */
const span = 10

/** What a facility may confirm: both ends are allowed, save that a share, a time or a strength is above zero. */
export interface ParameterLimits {
  least: number
  most: number
  aboveZero: boolean
}

function limitsOfUnit({ unit, default: standard }: RuleParameter): Omit<ParameterLimits, 'aboveZero'> {
  if (unit === 'degC') return temperatures
  if (unit === 'pH') return wholePh
  const wide = { least: standard / span, most: standard * span }
  if (unit === 'percent') return { least: wide.least, most: Math.min(wide.most, wholePercent.most) }
  // below one it is a part of something, above one it is so many times something: neither turns into the other
  if (unit === 'factor' && standard < 1) return { least: wide.least, most: 1 }
  if (unit === 'factor' && standard > 1) return { least: Math.max(1, wide.least), most: wide.most }
  return wide
}

/**
 * The hard limits of a parameter, in its unit: what no confirmation takes it beyond, however it is reasoned. Those of
 * the rule, or else by the unit: a tenth of the default to ten times the default, inside what the unit can mean.
 */
export function parameterLimits(parameter: RuleParameter): ParameterLimits {
  const wide = limitsOfUnit(parameter)
  return {
    least: parameter.least ?? wide.least,
    most: parameter.most ?? wide.most,
    aboveZero: parameter.unit !== 'degC' && parameter.unit !== 'pH',
  }
}

/** Whether a value lets through what the default would not. */
export function loosens({ tighter, default: standard }: RuleParameter, value: number): boolean {
  return tighter === 'lower' ? value > standard : value < standard
}

/** A limit of a law or a label that somebody read there: loosened only with a reason and for a jurisdiction. */
export const isLegal = ({ mark }: Pick<RuleParameter, 'mark'>): boolean => mark === 'V'

export type ParameterRefusal =
  'no-such-parameter' | 'not-a-number' | 'other-unit' | 'not-above-zero' | 'below-least' | 'above-most'

/**
 * Whether a typed value can be proposed for a parameter.
 *
 * @param typed digits and the unit that they are in: that of the parameter, since no limit is converted on the way
 * @returns the value, finite and inside the hard limits
 * @refuses a ParameterRefusal, with the limit that it breaks
 */
export function checkParameter(
  parameter: RuleParameter | undefined,
  typed: { value: string; unit: string },
): Result<number, ParameterRefusal> {
  if (!parameter) return refuse('no-such-parameter')
  if (typed.unit !== parameter.unit) return refuse('other-unit', 'unit')
  const digits = typed.value.trim()
  if (!/^-?\d{1,12}(\.\d{1,12})?$/.test(digits)) return refuse('not-a-number', 'value')
  const value = Number(digits)
  const { least, most, aboveZero } = parameterLimits(parameter)
  if (aboveZero && value <= 0) return refuse('not-above-zero', 'value')
  if (value < least) return refuse('below-least', 'value', { limit: least })
  return value > most ? refuse('above-most', 'value', { limit: most }) : ok(value)
}
