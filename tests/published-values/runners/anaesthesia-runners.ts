import {
  concentrationOfDilution,
  exactBathConcentration,
  nominalBathConcentration,
} from '../../../shared/domain/anaesthesia/bath-concentration.ts'
import { bufferMass } from '../../../shared/domain/anaesthesia/buffer-mass.ts'
import { stockVolumeInBath, stockVolumeOnTop } from '../../../shared/domain/anaesthesia/stock-volume.ts'
import type { Inputs, Runner } from '../published-case.ts'
import { figure, numberOf } from './reading-inputs.ts'

const names = {
  targetMgPerL: 'target_mg_per_L',
  stockGPerL: 'stock_g_per_L',
  bicarbonateRatio: 'bicarbonate_ratio',
}
const stock = (inputs: Inputs) => ({
  targetMgPerL: numberOf(inputs, 'target_mg_per_L'),
  stockGPerL: numberOf(inputs, 'stock_g_per_L'),
})
const inWater = (inputs: Inputs) => ({
  stockMgPerMl: numberOf(inputs, 'stock_mg_per_mL'),
  stockMl: numberOf(inputs, 'stock_mL'),
  waterMl: numberOf(inputs, 'water_mL'),
})

/** n of "1:n". */
const partsOf = (text: unknown): number => Number(/^1:(\d+)$/.exec(String(text))?.[1] ?? NaN)

export const anaesthesiaRunners: Readonly<Record<string, Runner>> = {
  stock_volume_mL_simple: (inputs) =>
    figure(
      stockVolumeInBath({ ...stock(inputs), bathLitres: numberOf(inputs, 'bath_volume_L') }),
      Number,
      names,
    ),
  stock_volume_mL_exact: (inputs) =>
    figure(
      stockVolumeOnTop({ ...stock(inputs), waterLitres: numberOf(inputs, 'water_volume_L') }),
      Number,
      names,
    ),
  buffer_mass_g: (inputs) =>
    figure(
      bufferMass({
        tricaineG: numberOf(inputs, 'tricaine_g'),
        bicarbonateRatio: numberOf(inputs, 'bicarbonate_ratio'),
      }),
      Number,
      names,
    ),
  bath_concentration_mg_per_L_nominal: (inputs) =>
    figure(nominalBathConcentration(inWater(inputs)), Number, {}),
  bath_concentration_mg_per_L_exact: (inputs) => figure(exactBathConcentration(inWater(inputs)), Number, {}),
  tricaine_mg_per_L_from_dilution: (inputs) =>
    figure(concentrationOfDilution({ dilutionParts: partsOf(inputs.dilution) }), Number, {}),
}
