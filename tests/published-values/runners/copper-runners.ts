import {
  copperByAlkalinity,
  copperSulfatePounds,
  type CopperByAlkalinity,
} from '../../../shared/domain/dose/copper-by-alkalinity.ts'
import type { Answer, Inputs, Runner } from '../published-case.ts'
import { figure, numberOf } from './reading-inputs.ts'

const names = { alkalinityMgPerLCaCO3: 'total_alkalinity_mg_per_L_CaCO3', salinityPss78: 'salinity' }

const water = (inputs: Inputs) => ({
  alkalinityMgPerLCaCO3: numberOf(inputs, 'total_alkalinity_mg_per_L_CaCO3'),
  // a case of a pond says no salinity: its water is fresh
  salinityPss78: 'salinity' in inputs ? numberOf(inputs, 'salinity') : 0,
})
const rule = (inputs: Inputs, pick: 'copperSulfateMgPerL' | 'copperMgPerL'): Answer =>
  figure<CopperByAlkalinity>(copperByAlkalinity(water(inputs)), (value) => value[pick], names)

export const copperRunners: Readonly<Record<string, Runner>> = {
  alkalinity_rule_copper_sulfate_mg_per_L: (inputs) => rule(inputs, 'copperSulfateMgPerL'),
  alkalinity_rule_cu_mg_per_L: (inputs) => rule(inputs, 'copperMgPerL'),
  alkalinity_rule_copper_sulfate_lb: (inputs) =>
    figure(
      copperSulfatePounds({ ...water(inputs), volumeAcreFt: numberOf(inputs, 'volume_acre_ft') }),
      Number,
      names,
    ),
}
