import { freeScalePk, freshWaterPk, totalScalePk } from '../../../shared/domain/ammonia/ammonium-pk.ts'
import { gramsPerGramOfNitrogen } from '../../../shared/domain/ammonia/nitrogen-forms.ts'
import { unionisedAmmonia } from '../../../shared/domain/ammonia/unionised-ammonia.ts'
import { ok } from '../../../shared/domain/result.ts'
import type { Inputs, Runner } from '../published-case.ts'
import { figure, numberOf } from './reading-inputs.ts'

const ask = (inputs: Inputs) =>
  unionisedAmmonia({
    ph: numberOf(inputs, 'pH'),
    temperatureC: numberOf(inputs, 'temp_C'),
    salinityPss78: numberOf(inputs, 'salinity_pss78'),
    calibration:
      inputs['pH_scale'] === undefined ? undefined : inputs['pH_scale'] === 'total' ? 'total' : 'nbs',
  })
const names = { ph: 'pH', temperatureC: 'temp_C', salinityPss78: 'salinity_pss78' }

export const ammoniaRunners: Readonly<Record<string, Runner>> = {
  unionized_ammonia_fraction: (inputs) => figure(ask(inputs), (value) => value.fraction, names),
  unionized_ammonia_concentration: (inputs) =>
    figure(ask(inputs), (value) => value.fraction * numberOf(inputs, 'tan_mg_N_per_L'), names),
  ammonium_pKa_freshwater: (inputs) => ok({ value: freshWaterPk(numberOf(inputs, 'temp_C')) }),
  // the printed examples go to salinity 0, where the application takes the equation for fresh water
  unionized_ammonia_fraction_clegg_whitfield: (inputs) => {
    const pkOf = inputs['pH_scale'] === 'total' ? totalScalePk : freeScalePk
    const pk = pkOf(numberOf(inputs, 'temp_C'), numberOf(inputs, 'salinity_pss78'))
    return ok({ value: 1 / (1 + 10 ** (pk - numberOf(inputs, 'pH'))) })
  },
  nh3_from_nh3n: (inputs) => ok({ value: numberOf(inputs, 'nh3_n_mg_per_L') * gramsPerGramOfNitrogen.nh3 }),
  nh3n_from_nh3: (inputs) => ok({ value: numberOf(inputs, 'nh3_mg_per_L') / gramsPerGramOfNitrogen.nh3 }),
  nh4_from_nh4n: (inputs) => ok({ value: numberOf(inputs, 'nh4_n_mg_per_L') * gramsPerGramOfNitrogen.nh4 }),
}
