import { activeShare } from '../../../shared/domain/dose/active-share.ts'
import type { BathDose } from '../../../shared/domain/dose/bath-dose.ts'
import type { BathProduct, BathTarget } from '../../../shared/domain/dose/bath-product.ts'
import { checkDrift } from '../../../shared/domain/dose/check-drift.ts'
import { computeBathDose } from '../../../shared/domain/dose/compute-bath-dose.ts'
import { computeFlowThroughDose } from '../../../shared/domain/dose/compute-flow-through-dose.ts'
import { computeTopUp } from '../../../shared/domain/dose/compute-top-up.ts'
import { concentrationReached } from '../../../shared/domain/dose/concentration-reached.ts'
import { copperInPentahydrate } from '../../../shared/domain/dose/copper.ts'
import { productStrength } from '../../../shared/domain/dose/product-strength.ts'
import { ok, type Result } from '../../../shared/domain/result.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { volumeOfShape } from '../../../shared/domain/water/volume-of-shape.ts'
import type { Answer, Inputs, Runner } from '../published-case.ts'
import { firstOf, numberOf, quantityIn } from './reading-inputs.ts'

const inMeasure: Readonly<Record<string, UnitCode>> = { lb: 'lb', 'oz avdp': 'oz_av' }

function amountIn(unit: string, dose: Result<BathDose>): Answer {
  if (!dose.ok) return dose
  const shown = convert(dose.value.amount, dose.value.unit, inMeasure[unit] ?? dose.value.unit)
  return shown.ok ? ok({ value: shown.value, working: dose.value.working }) : shown
}

/** Litres of the case, however it gives them. */
function litresOf(inputs: Inputs): number {
  if ('tank_diameter_m' in inputs) {
    const depth = quantityIn(inputs, 'water_depth_m', 'm')
    const tank = volumeOfShape({
      shape: 'cylindrical',
      diameter: quantityIn(inputs, 'tank_diameter_m', 'm'),
      depth,
    })
    return tank.ok ? tank.value.litres : NaN
  }
  const factor = 'volume_million_us_gal' in inputs ? 1_000_000 : 1
  const given = firstOf(inputs, {
    volume_L: 'L',
    volume_ft3: 'ft3',
    volume_us_gal: 'gal_us',
    volume_million_us_gal: 'gal_us',
    volume_acre_ft: 'acre_ft',
  })
  if (!given) throw new Error('the case has no volume')
  const litres = convert(Number(given.value) * factor, given.unit, 'L')
  return litres.ok ? litres.value : NaN
}

function targetOf(inputs: Inputs): BathTarget {
  if ('target_ppm' in inputs)
    return { concentration: { value: String(inputs.target_ppm), unit: 'ppm' as UnitCode }, basis: 'product' }
  if ('target_uL_per_L' in inputs)
    return { concentration: quantityIn(inputs, 'target_uL_per_L', 'uL/L'), basis: 'product' }
  if ('target_mg_product_per_L' in inputs)
    return { concentration: quantityIn(inputs, 'target_mg_product_per_L', 'mg/L'), basis: 'product' }
  if ('target_g_per_L' in inputs)
    return { concentration: quantityIn(inputs, 'target_g_per_L', 'g/L'), basis: 'active' }
  return { concentration: quantityIn(inputs, 'target_mg_active_per_L', 'mg/L'), basis: 'active' }
}

function liquidOf(inputs: Inputs): BathProduct {
  // a purity is printed on a powder; the case that has one is refused for it
  if ('active_percent_w_w' in inputs) return solidOf(inputs)
  const strength = firstOf(inputs, {
    strength_mg_per_mL: 'mg/mL',
    percent_w_v: 'percent_w_v',
    percent_w_w: 'percent_w_w',
  })
  const density = firstOf(inputs, { product_density_g_per_mL: 'g/mL', density_g_per_mL: 'g/mL' })
  return {
    form: 'liquid',
    strengthBasis: 'active',
    ...(strength ? { strength } : {}),
    ...(density ? { density } : {}),
  }
}

function solidOf(inputs: Inputs): BathProduct {
  return {
    form: 'solid',
    strengthBasis: 'active',
    strength: quantityIn(inputs, 'active_percent_w_w', 'percent_w_w'),
  }
}

const pure: BathProduct = { form: 'solid', strengthBasis: 'active', strength: quantityOf(100, 'percent_w_w') }

const pentahydrate: BathProduct = {
  form: 'solid',
  strength: quantityOf(100, 'percent_w_w'),
  strengthBasis: 'salt',
  share: copperInPentahydrate,
}

const solidMass: Runner = (inputs, unit) =>
  amountIn(
    unit,
    computeBathDose({ target: targetOf(inputs), netLitres: litresOf(inputs), product: solidOf(inputs) }),
  )

const strength: Runner = (inputs) => {
  const found = productStrength({
    form: 'liquid',
    strength: quantityIn(inputs, 'percent_w_w', 'percent_w_w'),
    density: quantityIn(inputs, 'density_g_per_mL', 'g/mL'),
  })
  if (!found.ok) return found
  if (found.value.of !== 'volume') throw new Error('a liquid has a strength by volume')
  return ok({ value: found.value.mgPerMl, working: [found.value.line] })
}

/** mg of active substance in what the engine would add, for cases that stop at the active substance. */
function activeMilligrams(dose: Result<BathDose>): Answer {
  if (!dose.ok) return dose
  const line = dose.value.working.find((each) => each.key === 'active-needed')
  return ok({ value: line?.value ?? NaN, working: dose.value.working })
}

const topUp: Runner = (inputs) => {
  const target: BathTarget = { concentration: quantityIn(inputs, 'target_mg_per_L', 'mg/L'), basis: 'active' }
  const netLitres = numberOf(inputs, 'volume_L')
  if ('changed_L' in inputs)
    return activeMilligrams(
      computeTopUp({ target, netLitres, changed: quantityIn(inputs, 'changed_L', 'L'), product: pure }),
    )
  const present = quantityIn(inputs, 'measured_mg_per_L', 'mg/L')
  return activeMilligrams(computeBathDose({ target, netLitres, present, product: pure }))
}

const reached = (inputs: Parameters<typeof concentrationReached>[0], scale = 1): Answer => {
  const result = concentrationReached(inputs)
  return result.ok ? ok({ value: result.value.mgPerL * scale, working: result.value.working }) : result
}

export const doseRunners: Readonly<Record<string, Runner>> = {
  bath_product_volume_mL: (inputs, unit) =>
    amountIn(
      unit,
      computeBathDose({ target: targetOf(inputs), netLitres: litresOf(inputs), product: liquidOf(inputs) }),
    ),
  bath_product_mass: solidMass,
  bath_product_mass_g: solidMass,
  mass_per_volume_for_1_mg_per_L: (inputs, unit) =>
    amountIn(
      unit,
      computeBathDose({
        target: { concentration: quantityOf(1, 'mg/L'), basis: 'active' },
        netLitres: litresOf(inputs),
        product: pure,
      }),
    ),
  flow_through_product_total_mL: (inputs, unit) =>
    amountIn(
      unit,
      computeFlowThroughDose({
        target: targetOf(inputs),
        product: { form: 'liquid' },
        flow: quantityIn(inputs, 'inflow_us_gal_per_min', 'gal_us/min'),
        duration: quantityIn(inputs, 'duration_min', 'min'),
      }),
    ),
  strength_mg_per_mL_from_percent_w_w: strength,
  formaldehyde_from_formalin_uL_per_L: (inputs) =>
    reached({
      amount: quantityIn(inputs, 'target_uL_per_L', 'uL'),
      basis: 'active',
      netLitres: 1,
      product: liquidOf(inputs),
    }),
  product_mg_per_L_from_uL_per_L: (inputs) =>
    reached({
      amount: quantityIn(inputs, 'uL_per_L', 'uL'),
      basis: 'product',
      netLitres: 1,
      product: liquidOf(inputs),
    }),
  uL_per_L_from_product_mg_per_L: (inputs) => {
    const target = {
      concentration: quantityIn(inputs, 'mg_product_per_L', 'mg/L'),
      basis: 'product',
    } as const
    const dose = computeBathDose({ target, netLitres: 1, product: liquidOf(inputs) })
    return dose.ok ? ok({ value: dose.value.amount * 1000, working: dose.value.working }) : dose
  },
  active_fraction_of_hydrate: () => {
    const share = activeShare(copperInPentahydrate)
    return share.ok ? ok({ value: share.value * 100 }) : share
  },
  active_fraction_from_molar_masses: (inputs) => {
    const share = activeShare({
      activeGPerMol: numberOf(inputs, 'active_g_per_mol'),
      compoundGPerMol: numberOf(inputs, 'compound_g_per_mol'),
    })
    return share.ok ? ok({ value: share.value }) : share
  },
  topup_dose_mg: topUp,
  copper_sulfate_g: (inputs, unit) =>
    amountIn(
      unit,
      computeBathDose({
        target: { concentration: quantityIn(inputs, 'target_cu_mg_per_L', 'mg/L'), basis: 'free' },
        present: quantityIn(inputs, 'measured_cu_mg_per_L', 'mg/L'),
        netLitres: numberOf(inputs, 'volume_L'),
        product: pentahydrate,
      }),
    ),
  cu_from_copper_sulfate_pentahydrate: (inputs) =>
    reached({
      amount: quantityIn(inputs, 'copper_sulfate_pentahydrate_mg_per_L', 'mg'),
      basis: 'free',
      netLitres: 1,
      product: pentahydrate,
    }),
  stock_cu_mg_per_mL: (inputs) =>
    reached(
      {
        amount: quantityIn(inputs, 'copper_sulfate_pentahydrate_g', 'g'),
        basis: 'free',
        netLitres: numberOf(inputs, 'stock_volume_mL') / 1000,
        product: pentahydrate,
      },
      1 / 1000,
    ),
  drift_percent: (inputs) => {
    const drift = checkDrift(numberOf(inputs, 'signed'), numberOf(inputs, 'now'), 100)
    return drift.ok ? ok({ value: drift.value.percent }) : drift
  },
}
