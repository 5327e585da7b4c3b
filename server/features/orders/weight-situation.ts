import type { WeightOrderFields } from '../../../shared/contracts/weight-orders.contract.ts'
import type { Product } from '../../../shared/contracts/formulary.contract.ts'
import { judgeWeight } from '../../../shared/domain/animals/judge-weight.ts'
import { unknown } from '../../../shared/domain/cautions/fact.ts'
import { isGivenByWeight } from '../../../shared/domain/formulary/agent.ts'
import { routeOfUse } from '../../../shared/domain/formulary/dose-line.ts'
import { judgeWeightOrder } from '../../../shared/domain/orders/judge-weight-order.ts'
import type { WeightOrderJudgement } from '../../../shared/domain/orders/judge-weight-order.ts'
import type { AnimalToTreat, WeightOrderDraft } from '../../../shared/domain/orders/weight-order-draft.ts'
import type { BathFacts } from '../../../shared/domain/orders/order-facts.ts'
import type { RouteByWeight } from '../../../shared/domain/orders/order-route.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { agentNames } from '../../../shared/messages/formulary.ts'
import { figureChanged } from '../../../shared/messages/orders.ts'
import { routeWords, weightOrderProblems } from '../../../shared/messages/weight-orders.ts'
import type { WeightOrderField } from '../../../shared/messages/weight-orders.ts'
import { isAsActedUpon, readChangedTables } from '../../platform/audit/changed-rows.ts'
import type { Db } from '../../platform/database/db.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { AnimalFacts, AnimalQuestions } from '../animals/index.ts'
import { chosenOf, refuseSchedule } from './order-situation.ts'
import type { SituationParts } from './order-situation.ts'

export interface WeightSituationParts extends SituationParts {
  animals: Pick<AnimalQuestions, 'animalsById'>
}

/** A dose by weight judged at one instant, together with everything it was judged by. */
export interface WeightSituation {
  animal: AnimalFacts
  product: Product | null
  judgement: WeightOrderJudgement | null
  zone: string
  /** Which figures somebody changed past the program, in words; nothing is worked out from them. */
  changed: string[]
}

const nothingTyped: Quantity = { value: '', unit: 'mg/kg' }

/** The draft in the terms of the engines. What nobody filled in stays missing and is refused there. */
function draftOf(fields: WeightOrderFields): WeightOrderDraft & { route: RouteByWeight } {
  return {
    route: fields.route,
    place: fields.place,
    target: { dose: (fields.target as Quantity | null) ?? nothingTyped, basis: fields.basis },
    mostPerPlace: fields.mostPerPlace as Quantity | null,
    division: (fields.division as Quantity | null) ?? { value: '', unit: 'mL' },
    doses: fields.doses,
    intervalHours: fields.intervalHours,
    startsAt: fields.startsAt,
    given: { doses: 0, lastAt: null },
    experienceWith: fields.experienceWith,
  }
}

/** The animal with its newest weight; of several that were weighed together each has the mean. */
function toTreat(animal: AnimalFacts): AnimalToTreat {
  const { animalId, accession: label, newestWeight: weight, weightBand: band } = animal
  if (!weight) return { animalId, label, weight: null }
  const verdict = judgeWeight(weight.weightKg, band, null)
  return {
    animalId,
    label,
    weight: {
      animalId,
      label,
      taxonGroup: animal.taxonGroup,
      lifeStage: animal.stage,
      grams: weight.weightKg * gramsPerKilogram,
      at: weight.happenedAt,
      measured: weight.basis === 'measured',
      plausible: band === null ? null : verdict.ok && verdict.value.verdict === 'plausible',
      entered:
        weight.animalsWeighed === 1
          ? { value: weight.value, unit: weight.unit as UnitCode }
          : quantityOf(weight.weightKg, 'kg'),
    },
  }
}

const gramsPerKilogram = 1000

async function refuseRoute(parts: SituationParts, { productId, route }: WeightOrderFields): Promise<void> {
  if (productId === null) return
  const { agent } = await parts.product(productId)
  if (isGivenByWeight(agent, route)) return
  const detail = weightOrderProblems.notByRoute({ product: agentNames[agent], route: routeWords[route] })
  throw new Problem('product-not-by-weight', {
    detail,
    errors: [{ pointer: '/productId', detail, code: 'product-not-by-weight' }],
  })
}

/** Refuses what a dose by weight cannot mean, whatever else is still missing. */
export async function refuseUnfitByWeight(
  parts: SituationParts,
  fields: WeightOrderFields,
  now: Date,
): Promise<void> {
  refuseSchedule(fields, now, '')
  if (fields.route !== 'injection') {
    if (fields.place !== null)
      throw refusedInput('/place', weightOrderProblems.placeOfOther, 'place-of-other-route')
    if (fields.mostPerPlace !== null)
      throw refusedInput('/mostPerPlace', weightOrderProblems.perPlaceOfOther, 'place-of-other-route')
  }
  await refuseRoute(parts, fields)
}

/** Which of the figures that the amount is worked out from are not what was entered, in words. */
async function readChangedFigures(
  db: Db,
  { productId, lotId }: WeightOrderFields,
  weightId: string | null,
): Promise<string[]> {
  const used = [
    ['products', productId],
    ['product_lots', lotId],
    ['weights', weightId],
  ] as const
  const rows = used.flatMap(([table, key]) => (key === null ? [] : [[table, key] as const]))
  const changed = new Set<string>(await readChangedTables(db, rows))
  // a recall that was taken away leaves no row that is changed
  if (lotId !== null && !(await isAsActedUpon(db, 'lot', lotId))) changed.add('product_lots')
  return used.map(([table]) => table).flatMap((table) => (changed.has(table) ? [figureChanged[table]] : []))
}

/** Reads the facts of an instant about the animal and its water, and judges the dose by them. */
export async function readWeightSituation(
  parts: WeightSituationParts,
  fields: WeightOrderFields,
  at: Date,
): Promise<WeightSituation> {
  const [animal] = await parts.animals.animalsById([fields.animalId], at)
  if (animal?.enclosureId == null || animal.count.high === 0)
    throw new Problem('not-found', {
      detail: weightOrderProblems.noAnimal,
      errors: [{ pointer: '/animalId', detail: weightOrderProblems.noAnimal, code: 'no-such-animal' }],
    })
  const product = fields.productId === null ? null : await parts.product(fields.productId)
  if (product && fields.lotId !== null && !product.lots.some(({ id }) => id === fields.lotId))
    throw refusedInput('/lotId', weightOrderProblems.lotOfOther, 'lot-of-other-product')
  const changed = await readChangedFigures(parts.dataSource, fields, animal.newestWeightId)
  const found = await parts.facts.read(animal.enclosureId, product?.agent ?? null, at, {
    named: [fields.animalId],
  })
  if (!found)
    throw new Problem('not-found', {
      detail: weightOrderProblems.noAnimal,
      errors: [{ pointer: '/animalId', detail: weightOrderProblems.noAnimal, code: 'no-such-animal' }],
    })
  // no record of a dose by weight is kept yet, so what else the animal had is not known
  const base: BathFacts = { ...found.base, history: { ...found.base.history, animalUses: unknown() } }
  const lines = product === null ? [] : await parts.doseLinesOf(product.agent)
  const byWeight = lines.filter(({ use }) => routeOfUse(use) === fields.route)
  const settings = await parts.settingsAt(at)
  const judgement =
    product && changed.length === 0
      ? judgeWeightOrder(
          base,
          [toTreat(animal)],
          draftOf(fields),
          chosenOf(product, null, byWeight, fields.lotId),
          settings,
        )
      : null
  return { animal, product, judgement, zone: found.base.zone, changed }
}

/** What has to be filled before a dose by weight could be signed. */
export function missingByWeight(fields: WeightOrderFields): WeightOrderField[] {
  const missing: WeightOrderField[] = []
  const need = (field: WeightOrderField, there: boolean) => void (there || missing.push(field))
  need('place', fields.route !== 'injection' || fields.place !== null)
  need('productId', fields.productId !== null)
  need('problem', fields.problem !== '')
  need('use', fields.use !== null)
  need('target', fields.target !== null)
  need('basis', fields.basis !== null)
  need('intervalHours', fields.doses === 1 || fields.intervalHours !== null)
  need('startsAt', fields.startsAt !== null)
  need('division', fields.division !== null)
  need('stopIf', fields.stopIf !== '')
  return missing
}
