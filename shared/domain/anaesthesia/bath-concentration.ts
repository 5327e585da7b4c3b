import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import { doseLimits } from '../dose/dose-limits.ts'
import { waterLimits } from '../water/water-limits.ts'
import type { AnaesthesiaRefusal } from './anaesthesia-refusal.ts'

/** A stock poured into water that is there already. */
export interface StockInWater {
  /** Above 0, at most 2,000. */
  stockMgPerMl: number
  /** Above 0, at most 100,000,000,000. */
  stockMl: number
  /** Before the stock goes in; above 0, at most 100,000,000,000. */
  waterMl: number
}

const mlPerLitre = 1000

function checkStockInWater({ stockMgPerMl, stockMl, waterMl }: StockInWater) {
  const max = waterLimits.mostLitres * mlPerLitre
  return checkNumbers([
    [stockMgPerMl, { field: 'stockMgPerMl', unit: 'mg/mL', above: 0, max: doseLimits.mostStrengthMgPerMl }],
    [stockMl, { field: 'stockMl', unit: 'mL', above: 0, max }],
    [waterMl, { field: 'waterMl', unit: 'mL', above: 0, max }],
  ])
}

/**
 * The strength of a bath as recipes print it, the stock's own volume left out: strength × stock ÷ water. Too high, by 4 % and
 * by 10 % in two printed recipes.
 *
 * @returns mg/L
 * @refuses not-finite · not-above-zero, above-most
 * @source  check value tri.04
 */
export function nominalBathConcentration(input: StockInWater): Result<number, AnaesthesiaRefusal> {
  const { stockMgPerMl, stockMl, waterMl } = input
  const refused = checkStockInWater(input)
  return refused ?? finiteOrRefuse(((stockMgPerMl * stockMl) / waterMl) * mlPerLitre, 'waterMl')
}

/**
 * The strength of a bath with the stock's own volume in it: strength × stock ÷ (water + stock).
 *
 * @returns mg/L, never as much as the stock
 * @refuses not-finite · not-above-zero, above-most
 * @source  mass balance · check values tri.05, tri.06
 */
export function exactBathConcentration(input: StockInWater): Result<number, AnaesthesiaRefusal> {
  const { stockMgPerMl, stockMl, waterMl } = input
  const refused = checkStockInWater(input)
  return refused ?? ok(((stockMgPerMl * stockMl) / (waterMl + stockMl)) * mlPerLitre)
}

const mgPerLOfOneToOne = 1_000_000

/**
 * What a dilution of 1 : n means: a gram of the powder in n millilitres.
 *
 * @param input.dilutionParts n, 10…1,000,000,000; the label's range is 1,000 to 20,000
 * @returns mg/L
 * @refuses not-finite · below-least, above-most
 * @source  check values tri.07, tri.08, from memory of the label
 */
export function concentrationOfDilution(input: {
  dilutionParts: number
}): Result<number, AnaesthesiaRefusal> {
  const parts = checkNumber(input.dilutionParts, {
    field: 'dilutionParts',
    unit: 'ratio',
    min: mgPerLOfOneToOne / doseLimits.mostTargetMgPerL,
    max: 1_000_000_000,
  })
  return parts.ok ? ok(mgPerLOfOneToOne / parts.value) : parts
}
