import { ammoniaForms } from './calculators/ammonia-forms.ts'
import { barometricPressure } from './calculators/barometric-pressure.ts'
import { bathDose } from './calculators/bath-dose.ts'
import { bleachSolution } from './calculators/bleach-solution.ts'
import { contactTime } from './calculators/contact-time.ts'
import { copperByAlkalinityCalculator } from './calculators/copper-by-alkalinity.ts'
import { copperSulfate } from './calculators/copper-sulfate.ts'
import { dechlorination } from './calculators/dechlorination.ts'
import { concentrationReached } from './calculators/concentration-reached.ts'
import { conductivityFromSalinity } from './calculators/conductivity-from-salinity.ts'
import { dripAcclimation } from './calculators/drip-acclimation.ts'
import { evaporation } from './calculators/evaporation.ts'
import { flowThroughBath } from './calculators/flow-through-bath.ts'
import { groupBiomassCalculator } from './calculators/group-biomass.ts'
import { freezingPoint } from './calculators/freezing-point.ts'
import { injection } from './calculators/injection.ts'
import { lengthWeight } from './calculators/length-weight.ts'
import { makeUpDose } from './calculators/make-up-dose.ts'
import { measuredVolume } from './calculators/measured-volume.ts'
import { medicatedFeed } from './calculators/medicated-feed.ts'
import { oxygenSaturation } from './calculators/oxygen-saturation.ts'
import { ozoneDose } from './calculators/ozone-dose.ts'
import { repeatedDoses } from './calculators/repeated-doses.ts'
import { salinityChange } from './calculators/salinity-change.ts'
import { salinityFromConductivity } from './calculators/salinity-from-conductivity.ts'
import { saltMass } from './calculators/salt-mass.ts'
import { specificGravity } from './calculators/specific-gravity.ts'
import { seawaterDensity } from './calculators/seawater-density.ts'
import { stockSolution } from './calculators/stock-solution.ts'
import { tankVolume } from './calculators/tank-volume.ts'
import { tricaineBath } from './calculators/tricaine-bath.ts'
import { turnover } from './calculators/turnover.ts'
import { unionisedAmmoniaCalculator } from './calculators/unionised-ammonia.ts'
import { unitConversion } from './calculators/unit-conversion.ts'
import { washOut } from './calculators/wash-out.ts'
import { waterChanges } from './calculators/water-changes.ts'
import type { AnyCalculator } from './definition.ts'

/** Every calculator of the bench, in the order in which the bench shows them. A new one is a file and a line here. */
export const calculators: readonly AnyCalculator[] = [
  bathDose,
  copperSulfate,
  copperByAlkalinityCalculator,
  makeUpDose,
  concentrationReached,
  stockSolution,
  flowThroughBath,
  repeatedDoses,
  injection,
  tricaineBath,
  unionisedAmmoniaCalculator,
  specificGravity,
  tankVolume,
  measuredVolume,
  washOut,
  waterChanges,
  salinityChange,
  saltMass,
  evaporation,
  dripAcclimation,
  turnover,
  medicatedFeed,
  groupBiomassCalculator,
  lengthWeight,
  oxygenSaturation,
  salinityFromConductivity,
  conductivityFromSalinity,
  seawaterDensity,
  freezingPoint,
  barometricPressure,
  dechlorination,
  bleachSolution,
  contactTime,
  ozoneDose,
  unitConversion,
  ammoniaForms,
]

const byId = new Map(calculators.map((each) => [each.id, each]))

/** The calculator at an address; undefined for an address that has none. */
export function calculatorAt(id: string): AnyCalculator | undefined {
  return byId.get(id)
}
