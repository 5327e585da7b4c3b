import type { CautionFacts } from '../cautions/caution-facts.ts'
import type { CautionSettings, CautionStage } from '../cautions/caution-rule.ts'
import { evaluateCautions } from '../cautions/evaluate-cautions.ts'
import type { CautionAnswer } from '../cautions/evaluate-cautions.ts'
import { computeWeightDose } from '../dose/compute-weight-dose.ts'
import type { DoseRefusal } from '../dose/dose-refusal.ts'
import type { WeightDose } from '../dose/weight-dose.ts'
import type { Refusal } from '../result.ts'
import type { ChosenProduct } from './bath-order-draft.ts'
import type { BathFacts } from './order-facts.ts'
import type { RouteByWeight } from './order-route.ts'
import type { AnimalToTreat, WeightOrderDraft } from './weight-order-draft.ts'
import { weightOrderFacts } from './weight-order-facts.ts'

/** The amount for one animal, or why there is none. */
export interface AnimalAmount {
  animalId: string
  label: string
  dose: WeightDose | null
  refusal: Refusal<DoseRefusal | 'no-weight'> | null
}

export interface WeightOrderJudgement {
  /** One for each animal, in the order in which they are named. */
  amounts: AnimalAmount[]
  facts: CautionFacts
  answer: CautionAnswer
}

/**
 * The amounts of an order by weight, each worked out from the newest weight of its animal, and every caution about
 * them. The same function runs while the order is written, at its signature, and at the dose.
 *
 * @param base     facts of the animals and their water at the instant judged; their weights are put in here
 * @param animals  those whom the order names, with their newest weights
 * @param draft    the order as entered, its route chosen
 * @param chosen   product, lot and dose line
 * @param settings the facility's confirmed rule parameters
 * @returns an amount for each animal with its working, or why there is none; cautions either way
 */
export function judgeWeightOrder(
  base: BathFacts,
  animals: readonly AnimalToTreat[],
  draft: WeightOrderDraft & { route: RouteByWeight },
  chosen: ChosenProduct,
  settings: CautionSettings = {},
  stage: CautionStage = 'design',
): WeightOrderJudgement {
  const amounts = animals.map((animal) => amountFor(animal, draft, chosen))
  const facts = weightOrderFacts(base, animals, draft, chosen, amounts)
  return { amounts, facts, answer: evaluateCautions({ facts, stage, settings }) }
}

function amountFor(
  { animalId, label, weight }: AnimalToTreat,
  draft: WeightOrderDraft,
  { product }: ChosenProduct,
): AnimalAmount {
  if (!weight) return { animalId, label, dose: null, refusal: { code: 'no-weight', field: 'weight' } }
  const worked = computeWeightDose({
    weight: weight.entered,
    target: { dose: draft.target.dose, basis: draft.target.basis ?? undefined },
    product,
    measure: { division: draft.division },
    ...(draft.route !== 'injection' || draft.mostPerPlace === null
      ? {}
      : { mostPerPlace: draft.mostPerPlace }),
  })
  return worked.ok
    ? { animalId, label, dose: worked.value, refusal: null }
    : { animalId, label, dose: null, refusal: worked.refusal }
}
