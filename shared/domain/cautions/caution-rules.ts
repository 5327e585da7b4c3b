import type { CautionRule } from './caution-rule.ts'
import { oxygen } from './rules/r01-oxygen.ts'
import { formalinOxygenDemand } from './rules/r02-formalin-oxygen-demand.ts'
import { formalinPond } from './rules/r03-formalin-pond.ts'
import { formalinTime } from './rules/r04-formalin-time.ts'
import { formalinCeiling } from './rules/r05-formalin-ceiling.ts'
import { formalinWarmWater } from './rules/r06-formalin-warm-water.ts'
import { formalinStorage } from './rules/r07-formalin-storage.ts'
import { formalinPermanganate } from './rules/r08-formalin-permanganate.ts'
import { copperInvertebrates } from './rules/r09-copper-invertebrates.ts'
import { copperAlkalinity } from './rules/r10-copper-alkalinity.ts'
import { copperFreshDose } from './rules/r11-copper-fresh-dose.ts'
import { copperMarineLevel } from './rules/r12-copper-marine-level.ts'
import { copperForms } from './rules/r13-copper-forms.ts'
import { carbon } from './rules/r14-carbon.ts'
import { ozoneAndUv } from './rules/r15-ozone-and-uv.ts'
import { foamFractionator } from './rules/r16-foam-fractionator.ts'
import { chloroquine } from './rules/r17-chloroquine.ts'
import { tricaine } from './rules/r18-tricaine.ts'
import { tricaineFood } from './rules/r19-tricaine-food.ts'
import { peroxideSpecies } from './rules/r22-peroxide-species.ts'
import { chloramineWater } from './rules/r23-chloramine-water.ts'
import { permanganate } from './rules/r24-permanganate.ts'
import { methyleneBlue } from './rules/r25-methylene-blue.ts'
import { defaultRange } from './rules/r26-default-range.ts'
import { basis } from './rules/r27-basis.ts'
import { doseSpacing } from './rules/r28-dose-spacing.ts'
import { otherAgents } from './rules/r29-other-agents.ts'
import { nitrogenRises } from './rules/r30-nitrogen-rises.ts'
import { staleReadings } from './rules/r31-stale-readings.ts'
import { volume } from './rules/r32-volume.ts'
import { weights } from './rules/r33-weights.ts'
import { lot } from './rules/r34-lot.ts'
import { prohibitedFood } from './rules/r37-prohibited-in-food.ts'
import { secondCalculation } from './rules/r39-second-calculation.ts'
import { reentry } from './rules/r40-reentry.ts'
import { weakAnimals } from './rules/r41-weak-animals.ts'
import { firstUse } from './rules/r42-first-use.ts'
import { itraconazoleBulk } from './rules/r43-itraconazole-bulk.ts'
import { antiInflammatories } from './rules/r44-anti-inflammatories.ts'
import { beyondEveryLine } from './rules/r47-beyond-every-line.ts'
import { plannedTime } from './rules/r48-planned-time.ts'
import { lineConditions } from './rules/r49-line-conditions.ts'
import { dosesAddUp } from './rules/r50-doses-add-up.ts'

/** Every rule, in the order of its number, which is also the order of equal cautions on screen. */
export const cautionRules: readonly CautionRule[] = [
  oxygen,
  formalinOxygenDemand,
  formalinPond,
  formalinTime,
  formalinCeiling,
  formalinWarmWater,
  formalinStorage,
  formalinPermanganate,
  copperInvertebrates,
  copperAlkalinity,
  copperFreshDose,
  copperMarineLevel,
  copperForms,
  carbon,
  ozoneAndUv,
  foamFractionator,
  chloroquine,
  tricaine,
  tricaineFood,
  peroxideSpecies,
  chloramineWater,
  permanganate,
  methyleneBlue,
  defaultRange,
  basis,
  doseSpacing,
  otherAgents,
  nitrogenRises,
  staleReadings,
  volume,
  weights,
  lot,
  prohibitedFood,
  secondCalculation,
  reentry,
  weakAnimals,
  firstUse,
  itraconazoleBulk,
  antiInflammatories,
  beyondEveryLine,
  plannedTime,
  lineConditions,
  dosesAddUp,
]
