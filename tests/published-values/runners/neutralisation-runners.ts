import { ammoniaFromChloramine } from '../../../shared/domain/neutralisation/ammonia-from-chloramine.ts'
import { bleachVolume } from '../../../shared/domain/neutralisation/bleach-volume.ts'
import { thiosulfateNeeded } from '../../../shared/domain/neutralisation/thiosulfate-needed.ts'
import {
  practicalThiosulfateRatio,
  stoichiometricThiosulfateRatio,
  type ThiosulfateForm,
} from '../../../shared/domain/neutralisation/thiosulfate-ratio.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import type { Inputs, Runner } from '../published-case.ts'
import { figure, numberOf } from './reading-inputs.ts'

// a case may leave the form out, which the engine has to refuse
const formOf = (inputs: Inputs) => inputs.form as ThiosulfateForm

function litresOf(inputs: Inputs): number {
  if (!('volume_us_gal' in inputs)) return numberOf(inputs, 'volume_L')
  const litres = convert(numberOf(inputs, 'volume_us_gal'), 'gal_us', 'L')
  return litres.ok ? litres.value : NaN
}

export const neutralisationRunners: Readonly<Record<string, Runner>> = {
  thiosulfate_ratio_stoichiometric: (inputs) =>
    figure(
      stoichiometricThiosulfateRatio({
        form: formOf(inputs),
        product: inputs.product as 'tetrathionate',
      }),
      Number,
      {},
    ),
  // the case is the maker's 7.0, the least for spent disinfectant
  thiosulfate_ratio_practical: (inputs) =>
    figure(
      practicalThiosulfateRatio({ form: formOf(inputs), chlorinatedWater: 'spent-disinfectant' }),
      ({ least }) => least,
      {},
    ),
  thiosulfate_g: (inputs) =>
    figure(
      thiosulfateNeeded({
        chlorineMgPerL: numberOf(inputs, 'chlorine_mg_per_L'),
        volumeLitres: litresOf(inputs),
        ratioMgPerMg: numberOf(inputs, 'ratio_mg_per_mg'),
      }),
      Number,
      { chlorineMgPerL: 'chlorine_mg_per_L' },
    ),
  bleach_volume_mL: (inputs) =>
    figure(
      bleachVolume({
        targetChlorineMgPerL: numberOf(inputs, 'target_chlorine_mg_per_L'),
        volumeLitres: litresOf(inputs),
        availableChlorinePercentWv: numberOf(inputs, 'available_chlorine_percent_w_v'),
      }),
      Number,
      {},
    ),
  ammonia_released_from_chloramine_mg_N_per_L: (inputs) =>
    figure(
      ammoniaFromChloramine({ monochloramineMgCl2PerL: numberOf(inputs, 'monochloramine_mg_Cl2_per_L') }),
      Number,
      {},
    ),
}
