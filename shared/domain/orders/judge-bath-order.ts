import type { CautionFacts } from '../cautions/caution-facts.ts'
import type { CautionSettings, CautionStage } from '../cautions/caution-rule.ts'
import { evaluateCautions } from '../cautions/evaluate-cautions.ts'
import type { CautionAnswer } from '../cautions/evaluate-cautions.ts'
import { valueOf } from '../cautions/fact.ts'
import type { BathDose } from '../dose/bath-dose.ts'
import { computeBathDose } from '../dose/compute-bath-dose.ts'
import type { DoseRefusal } from '../dose/dose-refusal.ts'
import type { Refusal } from '../result.ts'
import type { BathOrderDraft, ChosenProduct } from './bath-order-draft.ts'
import { orderFacts } from './order-facts.ts'
import type { BathFacts } from './order-facts.ts'

export interface OrderJudgement {
  dose: BathDose | null
  /** Why there is no amount; null when there is one. */
  refusal: Refusal<DoseRefusal | 'no-volume'> | null
  facts: CautionFacts
  answer: CautionAnswer
}

/**
 * The amount of an order for a bath, worked out from the water that is really there, and every caution about it. The
 * same function runs while the order is written, at its signature, and at the dose.
 *
 * @param base     facts of the water and animals at the instant judged
 * @param draft    the order as entered
 * @param chosen   product, lot and dose line
 * @param settings the facility's confirmed rule parameters
 * @returns the amount with its working, or why there is none; cautions either way, since a missing basis is one
 */
export function judgeBathOrder(
  base: BathFacts,
  draft: BathOrderDraft,
  chosen: ChosenProduct,
  settings: CautionSettings = {},
  stage: CautionStage = 'design',
): OrderJudgement {
  const volume = valueOf(base.volume.determination)
  const worked = volume
    ? computeBathDose({
        netLitres: volume.netVolumeLitres,
        ...(volume.errorPercent === null ? {} : { volumeErrorPercent: volume.errorPercent }),
        target: { concentration: draft.target.concentration, basis: draft.target.basis ?? undefined },
        product: chosen.product,
        measure: { division: draft.division },
      })
    : ({ ok: false, refusal: { code: 'no-volume', field: 'volume' } } as const)
  const dose = worked.ok ? worked.value : null
  const facts = orderFacts(base, draft, chosen, dose)
  return {
    dose,
    refusal: worked.ok ? null : worked.refusal,
    facts,
    answer: evaluateCautions({ facts, stage, settings }),
  }
}
