import type { CautionFacts } from '../cautions/caution-facts.ts'
import { known, notApplicable, unknown } from '../cautions/fact.ts'
import type { Fact } from '../cautions/fact.ts'
import type { WeightDose } from '../dose/weight-dose.ts'
import { addHours } from '../time/instant-arithmetic.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { ChosenProduct } from './bath-order-draft.ts'
import { lotFacts } from './order-facts.ts'
import type { BathFacts } from './order-facts.ts'
import type { RouteByWeight } from './order-route.ts'
import type { AnimalToTreat, WeightOrderDraft } from './weight-order-draft.ts'

const order = 'the order'

function targetFact({ target }: WeightOrderDraft): CautionFacts['order']['target'] {
  const parsed = parseQuantity(target.dose, { dimension: 'bodyDose', above: 0 })
  return parsed.ok
    ? known({ value: parsed.value.value, unit: 'mg/kg', basis: target.basis }, null, order)
    : unknown()
}

/** The largest amount for one animal: what a second person is asked for is the one that a slip would make largest. */
function largest(doses: readonly (WeightDose | null)[], unit: 'g' | 'mL'): Fact<number> {
  const amounts = doses.flatMap((dose) => (dose ? [dose] : []))
  if (amounts.length < doses.length || amounts.length === 0) return unknown()
  const ofUnit = amounts.filter((dose) => dose.unit === unit).map(({ amount }) => amount)
  return ofUnit.length === 0 ? notApplicable() : known(Math.max(...ofUnit), null, 'the working')
}

/**
 * Puts an order by weight, its product and the amounts worked out into the facts of the animals, so that the caution
 * rules can be asked. Nothing goes into the water: what is asked of a bath alone does not apply.
 *
 * @param amounts one for each animal; without one of them rules on amounts see them as unknown
 */
export function weightOrderFacts(
  base: BathFacts,
  animals: readonly AnimalToTreat[],
  draft: WeightOrderDraft & { route: RouteByWeight },
  chosen: ChosenProduct,
  amounts: readonly { dose: WeightDose | null }[],
): CautionFacts {
  const doses = amounts.map(({ dose }) => dose)
  const hours = draft.intervalHours === null ? 0 : draft.intervalHours * (draft.doses - 1)
  const { withoutExperience } = base.animals
  return {
    ...base,
    agent: chosen.agent,
    route: draft.route,
    order: {
      target: targetFact(draft),
      timing: notApplicable(),
      contactMinutes: notApplicable(),
      contactMinutesPerDay: notApplicable(),
      setting: notApplicable(),
      startsAt: draft.startsAt === null ? unknown() : known(draft.startsAt, null, order),
      endsAt: draft.startsAt === null ? unknown() : known(addHours(draft.startsAt, hours), null, order),
      defaultRange: chosen.line ? known(chosen.line, null, 'the formulary') : unknown(),
      agentRanges: known(chosen.lines, null, 'the formulary'),
      amountGrams: largest(doses, 'g'),
      amountMillilitres: largest(doses, 'mL'),
      amountShareOfPlan: known(1, null, order),
      isTopUpInsideLimits: known(false, null, order),
      dosesGiven: known(draft.given.doses, null, order),
      dosesStillIn: notApplicable(),
      changedSinceLastCalculation: known(false, null, order),
      copperCourse: notApplicable(),
      isBuffered: notApplicable(),
      isAired: notApplicable(),
      spacing:
        draft.intervalHours === null && draft.given.doses === 0
          ? notApplicable()
          : known(
              {
                intervalHours: draft.intervalHours ?? 0,
                lastGivenAt: draft.given.lastAt,
                givenDoses: draft.given.doses,
                plannedDoses: draft.doses,
                readingDriven: false,
              },
              null,
              order,
            ),
    },
    lot: lotFacts(chosen, base),
    volume: { determination: notApplicable() },
    animals: {
      ...base.animals,
      withoutExperience:
        withoutExperience.state === 'known'
          ? {
              ...withoutExperience,
              value: withoutExperience.value.filter((taxon) => !draft.experienceWith.includes(taxon)),
            }
          : withoutExperience,
      ...weightFacts(animals),
    },
  }
}

/** Nobody named yet is nothing known; whoever was never weighed is named. */
function weightFacts(
  animals: readonly AnimalToTreat[],
): Pick<CautionFacts['animals'], 'weights' | 'neverWeighed'> {
  if (animals.length === 0) return { weights: unknown(), neverWeighed: unknown() }
  const weighed = animals.flatMap(({ weight }) => {
    if (!weight) return []
    const { entered: _, ...fact } = weight
    return [fact]
  })
  const never = animals.filter(({ weight }) => !weight).map(({ label }) => label)
  const newestAt =
    weighed
      .map(({ at }) => at)
      .sort()
      .at(-1) ?? null
  return {
    weights: known(weighed, newestAt, 'the weights'),
    neverWeighed: known(never, null, 'the weights'),
  }
}
