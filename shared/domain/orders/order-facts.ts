import type { CautionFacts, OnOff } from '../cautions/caution-facts.ts'
import { known, notApplicable, unknown } from '../cautions/fact.ts'
import type { Fact } from '../cautions/fact.ts'
import type { BathDose } from '../dose/bath-dose.ts'
import { facilityDateOf } from '../time/facility-date.ts'
import { addHours } from '../time/instant-arithmetic.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import { findUnit } from '../units/find-unit.ts'
import { unitOf } from '../units/unit-of.ts'
import type { ConcentrationUnit } from '../cautions/caution-facts.ts'
import type { BathOrderDraft, ChosenProduct } from './bath-order-draft.ts'
import { longestContactInADay } from './longest-contact-in-a-day.ts'

/** The facts of the water and its animals, as the server assembled them; order and lot are still to be put in. */
export type BathFacts = Omit<CautionFacts, 'order' | 'lot' | 'agent' | 'route'>

const orUnknown = <T>(value: T | null, source: string): Fact<T> =>
  value === null ? unknown() : known(value, null, source)

const stated = 'stated on the order'

/** A machine that somebody says is there runs, as far as anybody knows. */
const onOff = (isThere: boolean | null | undefined): OnOff | null =>
  typeof isThere === 'boolean' ? (isThere ? 'on' : 'off') : null

function targetFact({ target }: BathOrderDraft): CautionFacts['order']['target'] {
  const unit = findUnit(target.concentration.unit, {})
  if (!unit.ok) return unknown()
  const { dimension } = unitOf(unit.value)
  if (dimension !== 'massConcentration' && dimension !== 'volumeConcentration') return unknown()
  const parsed = parseQuantity(target.concentration, { dimension, above: 0 })
  if (!parsed.ok) return unknown()
  const value = Number(parsed.value.entered.value)
  return known({ value, unit: unit.value as ConcentrationUnit, basis: target.basis }, null, 'the order')
}

const storageFaults = ['stored-cold', 'precipitate']

/**
 * Whether the container was kept too cold or shows a precipitate. That nothing was noted says nothing: it is unknown
 * until somebody looked at the bottle on the day it is used.
 *
 * @source common practice for the day of use, no source
 */
function storageFault({ lot }: ChosenProduct, { at, zone }: Pick<BathFacts, 'at' | 'zone'>): Fact<boolean> {
  if (!lot) return unknown()
  if (storageFaults.includes(lot.state)) return known(true, null, 'the lot')
  const { foundClearAt } = lot
  return foundClearAt !== null && facilityDateOf(foundClearAt, zone) === facilityDateOf(at, zone)
    ? known(false, foundClearAt, 'a look at the container')
    : unknown()
}

/** What is known of the lot at the instant judged. */
export function lotFacts(chosen: ChosenProduct, base: Pick<BathFacts, 'at' | 'zone'>): CautionFacts['lot'] {
  const { lot, product } = chosen
  const density =
    product.density === undefined ? null : parseQuantity(product.density, { dimension: 'density', above: 0 })
  const lotStatus = (state: string) =>
    state === 'recalled' ? 'recalled' : state === 'set-aside' ? 'quarantined' : 'usable'
  return {
    expiresOn: lot ? known(lot.expiresOn, null, 'the lot') : unknown(),
    beyondUseOn: notApplicable(),
    status: lot ? known(lotStatus(lot.state), null, 'the lot') : unknown(),
    storageFault: storageFault(chosen, base),
    // no lot is recorded as compounded
    isFromBulk: notApplicable(),
    densityGPerMl: density?.ok ? known(density.value.value, null, 'the label') : notApplicable(),
  }
}

/**
 * Puts an order, its product and the worked-out amount into the facts of the water, so that the caution rules can be
 * asked. What the form states overrides nothing that a ledger knows.
 *
 * @param dose the amount, or null while it cannot be worked out: rules on amounts then see it as unknown
 */
export function orderFacts(
  base: BathFacts,
  draft: BathOrderDraft,
  chosen: ChosenProduct,
  dose: BathDose | null,
): CautionFacts {
  const minutes = draft.timing === 'indefinite' ? null : draft.contactMinutes
  const hours = draft.intervalHours === null ? 0 : draft.intervalHours * (draft.doses - 1)
  const endsAt =
    draft.startsAt === null || draft.timing === 'indefinite'
      ? null
      : addHours(draft.startsAt, hours + (draft.contactMinutes ?? 0) / 60)
  const { stated: said } = draft
  const fill = <T>(fact: Fact<T>, value: T | null): Fact<T> =>
    fact.state === 'unknown' && value !== null ? known(value, null, stated) : fact
  const kind = fill(base.water.kind, said.waterKind)
  const experience: Fact<readonly string[]> =
    base.animals.withoutExperience.state === 'known'
      ? {
          ...base.animals.withoutExperience,
          value: base.animals.withoutExperience.value.filter((taxon) => !said.experienceWith.includes(taxon)),
        }
      : base.animals.withoutExperience
  return {
    ...base,
    agent: chosen.agent,
    route: 'immersion',
    order: {
      target: targetFact(draft),
      timing: orUnknown(draft.timing, 'the order'),
      contactMinutes: draft.timing === 'indefinite' ? notApplicable() : orUnknown(minutes, 'the order'),
      contactMinutesPerDay:
        draft.timing === 'indefinite'
          ? notApplicable()
          : orUnknown(
              minutes === null ? null : longestContactInADay(minutes, draft.doses, draft.intervalHours),
              'the order',
            ),
      setting: orUnknown(draft.setting, 'the order'),
      startsAt: orUnknown(draft.startsAt, 'the order'),
      endsAt: orUnknown(endsAt, 'the order'),
      defaultRange: chosen.line ? known(chosen.line, null, 'the formulary') : unknown(),
      agentRanges: known(chosen.lines, null, 'the formulary'),
      amountGrams: amountFact(dose, 'g'),
      amountMillilitres: amountFact(dose, 'mL'),
      amountShareOfPlan: known(1, null, 'the order'),
      isTopUpInsideLimits: known(false, null, 'the order'),
      dosesGiven: known(draft.given.doses, null, 'the order'),
      dosesStillIn: known(draft.given.stillIn, null, 'the order'),
      changedSinceLastCalculation: known(false, null, 'the order'),
      copperCourse: notApplicable(),
      isBuffered: orUnknown(said.isBuffered ?? null, stated),
      isAired: orUnknown(said.isAired ?? null, stated),
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
              'the order',
            ),
    },
    lot: lotFacts(chosen, base),
    water: {
      ...base.water,
      kind,
      oxygenIsLogged: fill(base.water.oxygenIsLogged, said.oxygenIsLogged),
      hasBloom: fill(base.water.hasBloom, said.hasBloom),
      hasPlantsOrAlgae: fill(base.water.hasPlantsOrAlgae, said.hasPlantsOrAlgae),
    },
    lifeSupport: {
      ...base.lifeSupport,
      lights: fill(base.lifeSupport.lights, said.lights),
      biofilter: fill(base.lifeSupport.biofilter, onOff(said.hasBiofilter)),
    },
    animals: { ...base.animals, withoutExperience: experience },
  }
}

function amountFact(dose: BathDose | null, unit: 'g' | 'mL'): Fact<number> {
  if (!dose) return unknown()
  return dose.unit === unit ? known(dose.amount, null, 'the working') : notApplicable()
}
