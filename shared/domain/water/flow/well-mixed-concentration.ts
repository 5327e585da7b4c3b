import { ok, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import { finiteOrRefuse } from '../../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { concentrationRules, flowRules, timeRules, volumeRules } from './flow-limits.ts'

/**
 * A concentration in well-mixed water through which water flows, with a loss of first order: dC/dt = Q/V (Cin − C) − kC,
 * so that C = Css + (C0 − Css) e^(−λt), λ = Q/V + k, Css = Q/V × Cin ÷ λ. Without flow and loss it stays as it is.
 *
 * @param input.lossPerMin k, 0…1,000 per minute
 * @returns mg/L, between the concentrations of water and inflow, or below them where there is loss
 * @refuses not-finite (volumeLitres, where the exchange is beyond any number) · not-above-zero (volume) · below-least,
 *          above-most
 * @source  stirred-tank · check values flow.01 to flow.06, against an ODE solver
 */
export function wellMixedConcentration(input: {
  initialMgPerL: number
  inflowMgPerL: number
  flowLPerMin: number
  volumeLitres: number
  lossPerMin: number
  minutes: number
}): Result<number, LimitRefusal | 'not-finite'> {
  const { initialMgPerL, inflowMgPerL, flowLPerMin, volumeLitres, lossPerMin, minutes } = input
  const refused = checkNumbers([
    [initialMgPerL, concentrationRules('initialMgPerL')],
    [inflowMgPerL, concentrationRules('inflowMgPerL')],
    [flowLPerMin, flowRules('flowLPerMin')],
    [volumeLitres, volumeRules('volumeLitres')],
    [lossPerMin, { field: 'lossPerMin', unit: 'per_min', min: 0, max: 1000 }],
    [minutes, timeRules('minutes')],
  ])
  if (refused) return refused
  const exchanges = finiteOrRefuse(flowLPerMin / volumeLitres, 'volumeLitres')
  if (!exchanges.ok) return exchanges
  const exchange = exchanges.value
  const rate = exchange + lossPerMin
  if (rate === 0) return ok(initialMgPerL)
  const steady = (exchange / rate) * inflowMgPerL
  return ok(steady + (initialMgPerL - steady) * Math.exp(-rate * minutes))
}
