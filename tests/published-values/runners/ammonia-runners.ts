import { freeScalePk, freshWaterPk, totalScalePk } from '../../../shared/domain/ammonia/ammonium-pk.ts'
import { ammoniaCountedAs } from '../../../shared/domain/ammonia/nitrogen-forms.ts'
import {
  unionisedAmmonia,
  unionisedConcentration,
  unionisedShare,
  type PhCalibration,
} from '../../../shared/domain/ammonia/unionised-ammonia.ts'
import type { Inputs, Runner } from '../published-case.ts'
import { figure, numberOf } from './reading-inputs.ts'

/** What a case says of its scale; a scale that the application does not know is no answer to its question. */
function calibrationOf(inputs: Inputs): PhCalibration | undefined {
  const scale = inputs.pH_scale
  if (scale === undefined) return undefined
  if (scale === 'NBS') return 'nbs'
  if (scale === 'total') return 'total'
  throw new Error(`no calibration is known for ${String(scale)}`)
}

/** A case prints the free or the total equation by its name. */
function pkOf(inputs: Inputs) {
  const water = {
    temperatureC: numberOf(inputs, 'temp_C'),
    salinityPss78: numberOf(inputs, 'salinity_pss78'),
  }
  if (inputs.pH_scale === 'total') return totalScalePk(water)
  if (inputs.pH_scale === 'free') return freeScalePk(water)
  throw new Error(`no equation is known for ${String(inputs.pH_scale)}`)
}

const waterOf = (inputs: Inputs) => ({
  ph: numberOf(inputs, 'pH'),
  temperatureC: numberOf(inputs, 'temp_C'),
  salinityPss78: numberOf(inputs, 'salinity_pss78'),
  calibration: calibrationOf(inputs),
})
const names = { ph: 'pH', temperatureC: 'temp_C', salinityPss78: 'salinity_pss78' }

export const ammoniaRunners: Readonly<Record<string, Runner>> = {
  unionized_ammonia_fraction: (inputs) =>
    figure(unionisedAmmonia(waterOf(inputs)), (value) => value.fraction, names),
  unionized_ammonia_concentration: (inputs) =>
    figure(
      unionisedConcentration({ ...waterOf(inputs), totalNMgPerL: numberOf(inputs, 'tan_mg_N_per_L') }),
      (value) => value.nMgPerL,
      names,
    ),
  ammonium_pKa_freshwater: (inputs) =>
    figure(freshWaterPk({ temperatureC: numberOf(inputs, 'temp_C') }), Number, names),
  // the printed examples go to salinity 0, where the application takes the equation for fresh water
  unionized_ammonia_fraction_clegg_whitfield: (inputs) => {
    const pk = pkOf(inputs)
    return pk.ok
      ? figure(unionisedShare({ pk: pk.value, ph: numberOf(inputs, 'pH') }), Number, names)
      : figure(pk, Number, names)
  },
  nh3_from_nh3n: (inputs) =>
    figure(ammoniaCountedAs({ mgPerL: numberOf(inputs, 'nh3_n_mg_per_L'), of: 'n', as: 'nh3' }), Number, {}),
  nh3n_from_nh3: (inputs) =>
    figure(ammoniaCountedAs({ mgPerL: numberOf(inputs, 'nh3_mg_per_L'), of: 'nh3', as: 'n' }), Number, {}),
  nh4_from_nh4n: (inputs) =>
    figure(ammoniaCountedAs({ mgPerL: numberOf(inputs, 'nh4_n_mg_per_L'), of: 'n', as: 'nh4' }), Number, {}),
}
