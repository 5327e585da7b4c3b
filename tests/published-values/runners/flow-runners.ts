import { roundInjection, injectionVolume } from '../../../shared/domain/injection/injection-volume.ts'
import { ok } from '../../../shared/domain/result.ts'
import { changesNeeded, singleChangeFraction } from '../../../shared/domain/water/flow/changes-needed.ts'
import { dripRate, primingVolume } from '../../../shared/domain/water/flow/drip-rate.ts'
import { concentrationAfterLoss, repeatDoseSteadyState } from '../../../shared/domain/water/flow/losses.ts'
import {
  minutesToFraction,
  percentReplaced,
  turnoversToFraction,
} from '../../../shared/domain/water/flow/wash-out.ts'
import { wellMixedConcentration } from '../../../shared/domain/water/flow/well-mixed-concentration.ts'
import { evaporationTopUp } from '../../../shared/domain/water/salinity-change/evaporation.ts'
import {
  saltMassByBalance,
  saltMassSimple,
  saltMassWithMoisture,
} from '../../../shared/domain/water/salinity-change/salt-mass.ts'
import { stepwiseDays, stepwiseSchedule } from '../../../shared/domain/water/salinity-change/stepwise.ts'
import {
  continuousExchangeLitres,
  swapFraction,
  swapLitres,
} from '../../../shared/domain/water/salinity-change/swap.ts'
import type { Answer, Inputs, Runner } from '../published-case.ts'
import { figure, numberOf } from './reading-inputs.ts'

const same = (value: number) => value

const concentrations = (inputs: Inputs) => ({
  initialMgPerL: numberOf(inputs, 'initial_mg_per_L'),
  targetMgPerL: numberOf(inputs, 'target_mg_per_L'),
  replacementMgPerL: numberOf(inputs, 'replacement_mg_per_L'),
})
const changeNames = { targetMgPerL: 'target_mg_per_L' }

const salinities = (inputs: Inputs) => ({
  startSalinity: numberOf(inputs, 'start_salinity'),
  targetSalinity: numberOf(inputs, 'target_salinity'),
  // a plan of days does not say what comes in; fresh water reaches every target below the start
  replacementSalinity: 'replacement_salinity' in inputs ? numberOf(inputs, 'replacement_salinity') : 0,
})
const salinityNames = { startSalinity: 'start_salinity', targetSalinity: 'target_salinity' }
const withVolume = (inputs: Inputs) => ({
  ...salinities(inputs),
  volumeLitres: numberOf(inputs, 'system_volume_L'),
})

const steps = (inputs: Inputs) =>
  stepwiseSchedule({
    ...salinities(inputs),
    volumeLitres: 'system_volume_L' in inputs ? numberOf(inputs, 'system_volume_L') : 1,
    mostPerDay: numberOf(inputs, 'max_change_per_day'),
  })

const injection = (inputs: Inputs) =>
  injectionVolume({
    doseMgPerKg: numberOf(inputs, 'dose_mg_per_kg'),
    weightKg: numberOf(inputs, 'weight_kg'),
    strengthMgPerMl: numberOf(inputs, 'strength_mg_per_mL'),
  })
const injectionNames = {
  weightKg: 'weight_kg',
  strengthMgPerMl: 'strength_mg_per_mL',
  graduationMl: 'graduation_mL',
}

function rounded(inputs: Inputs, pick: 'millilitres' | 'errorPercent'): Answer {
  const result = roundInjection(numberOf(inputs, 'volume_mL'), String(numberOf(inputs, 'graduation_mL')))
  return figure(result, (value) => value[pick], injectionNames)
}

export const flowRunners: Readonly<Record<string, Runner>> = {
  well_mixed_concentration: (inputs) =>
    figure(
      wellMixedConcentration({
        initialMgPerL: numberOf(inputs, 'initial_mg_per_L'),
        inflowMgPerL: numberOf(inputs, 'inflow_mg_per_L'),
        flowLPerMin: numberOf(inputs, 'flow_L_per_min'),
        volumeLitres: numberOf(inputs, 'volume_L'),
        lossPerMin: numberOf(inputs, 'loss_rate_per_min'),
        minutes: numberOf(inputs, 'time_min'),
      }),
      same,
      { volumeLitres: 'volume_L' },
    ),
  turnovers_to_fraction_remaining: (inputs) =>
    figure(turnoversToFraction(numberOf(inputs, 'fraction_remaining')), same, {}),
  time_to_fraction_remaining_min: (inputs) =>
    figure(
      minutesToFraction({
        fraction: numberOf(inputs, 'fraction_remaining'),
        volumeLitres: numberOf(inputs, 'volume_L'),
        flowLPerMin: numberOf(inputs, 'flow_L_per_min'),
      }),
      same,
      {},
    ),
  percent_replaced_after_turnovers: (inputs) =>
    figure(percentReplaced(numberOf(inputs, 'turnovers')), same, {}),
  drip_rate_mL_per_min: (inputs) => {
    // the undiluted liquid of a target in µL/L: a million µL of it in a litre, as mg/L is to mg/mL
    const byVolume = 'target_uL_per_L' in inputs
    const result = dripRate({
      inflowLPerMin: byVolume
        ? numberOf(inputs, 'inflow_us_gal_per_min') * 3.785411784
        : numberOf(inputs, 'inflow_L_per_min'),
      targetMgPerL: byVolume ? numberOf(inputs, 'target_uL_per_L') : numberOf(inputs, 'target_mg_per_L'),
      stockMgPerMl: byVolume ? 1000 : numberOf(inputs, 'stock_mg_per_mL'),
    })
    return figure(result, same, {})
  },
  priming_dose_mL: (inputs) =>
    figure(
      primingVolume({
        volumeLitres: numberOf(inputs, 'volume_L'),
        targetMgPerL: numberOf(inputs, 'target_mg_per_L'),
        stockMgPerMl: numberOf(inputs, 'stock_mg_per_mL'),
      }),
      same,
      {},
    ),
  partial_changes_needed: (inputs) =>
    figure(
      changesNeeded({ ...concentrations(inputs), changeFraction: numberOf(inputs, 'change_fraction') }),
      same,
      changeNames,
    ),
  single_change_fraction_needed: (inputs) =>
    figure(singleChangeFraction(concentrations(inputs)), same, changeNames),
  repeat_dose_peak_steady_state: (inputs) =>
    figure(
      repeatDoseSteadyState({
        doseMgPerL: numberOf(inputs, 'dose_increment_mg_per_L'),
        changeFraction: numberOf(inputs, 'change_fraction'),
        lossPerHour: numberOf(inputs, 'loss_rate_per_h'),
        intervalHours: numberOf(inputs, 'interval_h'),
      }),
      (value) => value.peakMgPerL,
      {},
    ),
  concentration_after_first_order_loss: (inputs) =>
    figure(
      concentrationAfterLoss({
        initialMgPerL: numberOf(inputs, 'initial_mg_per_L'),
        halfLifeHours: numberOf(inputs, 'half_life_h'),
        hours: numberOf(inputs, 'time_h'),
      }),
      same,
      {},
    ),
  water_swap_fraction: (inputs) => figure(swapFraction(salinities(inputs)), same, salinityNames),
  water_swap_litres: (inputs) => figure(swapLitres(withVolume(inputs)), same, salinityNames),
  continuous_dilution_litres: (inputs) =>
    figure(continuousExchangeLitres(withVolume(inputs)), same, salinityNames),
  stepwise_days: (inputs) =>
    figure(
      stepwiseDays({ ...salinities(inputs), mostPerDay: numberOf(inputs, 'max_change_per_day') }),
      same,
      salinityNames,
    ),
  stepwise_schedule_salinity: (inputs) => {
    const plan = steps(inputs)
    if (!plan.ok) return plan
    const [first] = plan.value
    return ok({ value: [first?.fromSalinity ?? NaN, ...plan.value.map((step) => step.toSalinity)] })
  },
  stepwise_schedule_swap_litres: (inputs) => {
    const plan = steps(inputs)
    return plan.ok ? ok({ value: plan.value.map((step) => step.swapLitres) }) : plan
  },
  salt_mass_simple_kg: (inputs) =>
    figure(
      saltMassSimple({
        systemLitres: numberOf(inputs, 'system_volume_L'),
        startGPerL: numberOf(inputs, 'start_salinity_g_per_L'),
        targetGPerL: numberOf(inputs, 'target_salinity_g_per_L'),
      }),
      same,
      {},
    ),
  salt_mass_by_mass_balance_kg: (inputs) =>
    figure(
      saltMassByBalance({
        systemLitres: numberOf(inputs, 'system_volume_L'),
        startGPerKg: numberOf(inputs, 'start_salinity_g_per_kg'),
        targetGPerKg: numberOf(inputs, 'target_salinity_g_per_kg'),
        temperatureC: numberOf(inputs, 'temp_t90_C'),
      }),
      same,
      {},
    ),
  salt_mass_with_moisture_kg: (inputs) =>
    figure(
      saltMassWithMoisture({
        anhydrousKg: numberOf(inputs, 'anhydrous_salt_kg'),
        purityPercent: numberOf(inputs, 'salt_purity_percent'),
      }),
      same,
      {},
    ),
  evaporation_topup_L: (inputs) =>
    figure(
      evaporationTopUp({
        systemLitres: numberOf(inputs, 'system_volume_L'),
        readingSalinity: numberOf(inputs, 'reading_salinity'),
        targetSalinity: numberOf(inputs, 'target_salinity'),
      }),
      same,
      {},
    ),
  injection_volume_mL: (inputs) => {
    const volume = injection(inputs)
    if (!volume.ok || !('graduation_mL' in inputs)) return figure(volume, same, injectionNames)
    const taken = roundInjection(volume.value, String(numberOf(inputs, 'graduation_mL')))
    return figure(taken, (value) => value.millilitres, injectionNames)
  },
  injection_volume_rounded_mL: (inputs) => rounded(inputs, 'millilitres'),
  injection_rounding_error_percent: (inputs) => rounded(inputs, 'errorPercent'),
}
