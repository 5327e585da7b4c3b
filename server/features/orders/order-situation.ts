import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import type { Product, DoseLine } from '../../../shared/contracts/formulary.contract.ts'
import { copperInPentahydrate } from '../../../shared/domain/dose/copper.ts'
import type { BathProduct } from '../../../shared/domain/dose/bath-product.ts'
import type { BathOrderDraft, ChosenProduct } from '../../../shared/domain/orders/bath-order-draft.ts'
import { judgeBathOrder } from '../../../shared/domain/orders/judge-bath-order.ts'
import type { OrderJudgement } from '../../../shared/domain/orders/judge-bath-order.ts'
import { isGivenInWater } from '../../../shared/domain/formulary/agent.ts'
import { routeOfUse, staysInWater } from '../../../shared/domain/formulary/dose-line.ts'
import type { DefaultRange, DoseUnit } from '../../../shared/domain/cautions/caution-facts.ts'
import type { CautionSettings, CautionStage } from '../../../shared/domain/cautions/caution-rule.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { agentNames } from '../../../shared/messages/formulary.ts'
import { figureChanged, orderMissing, orderProblemWords } from '../../../shared/messages/orders.ts'
import type { OrderField } from '../../../shared/messages/orders.ts'
import { isAsActedUpon, readChangedTables } from '../../platform/audit/changed-rows.ts'
import type { Db } from '../../platform/database/db.ts'
import { Problem } from '../../platform/http/problem.ts'
import { readGivenBefore } from './agent-history.reads.ts'
import type { BathFactsReader, BathSituation } from './bath-facts.ts'

export interface SituationParts {
  dataSource: Db
  facts: BathFactsReader
  /** The facility's confirmed thresholds as they were in force at an instant. */
  settingsAt(at: Date, db?: Db): Promise<CautionSettings>
  product(id: string): Promise<Product>
  doseLine(id: string): Promise<DoseLine>
  /** The dose lines in force for an agent. */
  doseLinesOf(agent: Product['agent']): Promise<DoseLine[]>
}

/** An order judged at one instant, together with everything it was judged by. */
export interface OrderSituation {
  situation: BathSituation
  product: Product | null
  line: DoseLine | null
  judgement: OrderJudgement | null
  /** The facility's thresholds that it was judged by. */
  settings: CautionSettings
  /** Which figures somebody changed past the program, in words; nothing is worked out from them. */
  changed: string[]
}

const nothingTyped: Quantity = { value: '', unit: 'mg/L' }

/** The draft in the terms of the engines. What nobody filled in stays missing and is refused there. */
export function draftOf(fields: BathOrderFields, given: BathOrderDraft['given']): BathOrderDraft {
  return {
    target: { concentration: (fields.target as Quantity | null) ?? nothingTyped, basis: fields.basis },
    timing: fields.timing,
    contactMinutes: fields.contactMinutes,
    doses: fields.doses,
    intervalHours: fields.intervalHours,
    startsAt: fields.startsAt,
    setting: fields.setting,
    division: (fields.division as Quantity | null) ?? { value: '', unit: 'g' },
    given,
    stated: fields.stated,
  }
}

/** A product of the formulary in the terms of the dose engine. */
export function chosenOf(
  product: Product,
  line: DoseLine | null,
  lines: readonly DoseLine[],
  lotId: string | null,
): ChosenProduct {
  const lot = product.lots.find((one) => one.id === lotId) ?? null
  const bath: BathProduct = {
    form: product.form === 'liquid' ? 'liquid' : 'solid',
    strength: { value: product.strength.value, unit: product.strength.unit as UnitCode },
    ...(product.strengthBasis === 'product' ? {} : { strengthBasis: product.strengthBasis }),
    ...(product.agent === 'copper-sulfate' ? { share: copperInPentahydrate } : {}),
    ...(product.densityGPerMl === null
      ? {}
      : { density: { value: String(product.densityGPerMl), unit: 'g/mL' as const } }),
  }
  return {
    agent: product.agent,
    product: bath,
    lot: lot && { expiresOn: lot.expiresOn, state: lot.state, foundClearAt: lot.foundClearAt },
    line: line && rangeOf(line),
    lines: lines.map(rangeOf),
  }
}

const rangeOf = ({ low, high, unit, basis, longestContactMinutes, water, use }: DoseLine): DefaultRange => ({
  low,
  high,
  unit: unit as DoseUnit,
  basis,
  longestContactMinutes,
  water,
  stays: staysInWater(use),
})

/** Refuses a bath of a drug that is given to the animal itself. */
async function refuseProduct(parts: SituationParts, { productId }: BathOrderFields): Promise<void> {
  if (productId === null) return
  const { agent } = await parts.product(productId)
  if (isGivenInWater(agent, await parts.doseLinesOf(agent))) return
  const detail = orderProblemWords.notForWater({ product: agentNames[agent] })
  throw new Problem('product-not-for-water', {
    detail,
    errors: [{ pointer: '/fields/productId', detail, code: 'product-not-for-water' }],
  })
}

const isForBath = ({ use }: DoseLine): boolean => routeOfUse(use) === 'immersion'

/**
 * Refuses an order that names a dose line of another drug, or one that is not in force. A signed order keeps the line it
 * was signed with, whatever becomes of it.
 */
async function refuseDoseLine(parts: SituationParts, fields: BathOrderFields): Promise<void> {
  const { productId, doseLineId } = fields
  if (productId === null || doseLineId === null) return
  const { agent } = await parts.product(productId)
  const line = await parts.doseLine(doseLineId)
  const inForce = await parts.doseLinesOf(agent)
  const isByWeight = !isForBath(line)
  if (!isByWeight && inForce.some((one) => one.id === line.id)) return
  const detail =
    line.agent === agent
      ? isByWeight
        ? orderProblemWords.lineByWeight
        : orderProblemWords.lineNotInForce
      : orderProblemWords.lineOfOther({ line: agentNames[line.agent], product: agentNames[agent] })
  throw new Problem('dose-line-not-usable', {
    detail,
    errors: [{ pointer: '/fields/doseLineId', detail, code: 'dose-line-not-usable' }],
  })
}

/** The refusal of an enclosure that is not there or that nothing can be dissolved in. */
export const noWaterProblem = () =>
  new Problem('not-found', { detail: 'There is no such enclosure, or it holds no water.' })

const mostYearsOff = 2
const hourMs = 3_600_000
const yearMs = 366 * 24 * hourMs

type Schedule = Pick<BathOrderFields, 'startsAt' | 'doses' | 'intervalHours'>

/** Refuses a first dose whose year cannot be meant: nothing planned or done is that far from today. */
function refuseStart({ startsAt }: Schedule, now: Date, at: string): void {
  if (startsAt === null) return
  if (Math.abs(Date.parse(startsAt) - now.getTime()) <= mostYearsOff * yearMs) return
  const detail = orderProblemWords.startYears({ years: mostYearsOff })
  throw new Problem('bad-input', {
    detail,
    errors: [{ pointer: `${at}/startsAt`, detail, code: 'start-beyond-reason' }],
  })
}

/** Refuses a plan over years: nobody can know the animals and the water of its last dose. */
function refusePlan({ doses, intervalHours }: Schedule, at: string): void {
  if (intervalHours === null || (doses - 1) * intervalHours * hourMs <= mostYearsOff * yearMs) return
  const detail = orderProblemWords.planYears({ years: mostYearsOff })
  throw new Problem('bad-input', {
    detail,
    errors: [{ pointer: `${at}/doses`, detail, code: 'plan-beyond-reason' }],
  })
}

/**
 * Refuses times that nobody can mean, whatever is ordered.
 *
 * @param at where the fields stand in what was sent: "/fields"
 */
export function refuseSchedule(schedule: Schedule, now: Date, at: string): void {
  refuseStart(schedule, now, at)
  refusePlan(schedule, at)
}

/** Refuses what an order cannot mean, whatever else is still missing. */
export async function refuseUnfit(parts: SituationParts, fields: BathOrderFields, now: Date): Promise<void> {
  refuseSchedule(fields, now, '/fields')
  await refuseProduct(parts, fields)
  await refuseDoseLine(parts, fields)
}

/** Which of the figures that an amount is worked out from are not what was entered, in words. */
async function readChangedFigures(
  db: Db,
  fields: BathOrderFields,
  { product, lines, water }: { product: Product | null; lines: DoseLine[]; water: BathSituation['water'] },
): Promise<string[]> {
  // a lot that is not of this product is refused for that
  const lotId = product?.lots.find(({ id }) => id === fields.lotId)?.id ?? null
  const volumeId = water.volume?.id ?? null
  const used = [
    ['products', fields.productId],
    ['product_lots', lotId],
    ['dose_lines', fields.doseLineId],
    // without a line of its own an order is held against every line of the drug
    ...lines.map(({ id }) => ['dose_lines', id] as const),
    ['volume_determinations', volumeId],
  ] as const
  const rows = used.flatMap(([table, key]) => (key === null ? [] : [[table, key] as const]))
  const changed = new Set<string>(await readChangedTables(db, rows))
  // a recall that was taken away, or the withdrawal of a volume, leaves no row that is changed
  if (lotId !== null && !(await isAsActedUpon(db, 'lot', lotId))) changed.add('product_lots')
  if (volumeId !== null && !(await isAsActedUpon(db, 'volume', volumeId)))
    changed.add('volume_determinations')
  return [...new Set(used.map(([table]) => table))]
    .filter((table) => changed.has(table))
    .map((table) => figureChanged[table])
}

/** Reads the facts of an instant and judges the order by them: the one way, while writing, at signing and at the dose. */
export async function readSituation(
  parts: SituationParts,
  fields: BathOrderFields,
  at: Date,
  options: { db?: Db; exceptOrderId?: string | null; stage?: CautionStage } = {},
): Promise<OrderSituation> {
  const product = fields.productId === null ? null : await parts.product(fields.productId)
  const line = fields.doseLineId === null ? null : await parts.doseLine(fields.doseLineId)
  const situation = await parts.facts.read(fields.enclosureId, product?.agent ?? null, at, {
    ...options,
    named: fields.animalIds,
  })
  if (!situation) throw noWaterProblem()
  const lines = product === null ? [] : (await parts.doseLinesOf(product.agent)).filter(isForBath)
  const changed = await readChangedFigures(options.db ?? parts.dataSource, fields, {
    product,
    lines,
    water: situation.water,
  })
  const settings = await parts.settingsAt(at, options.db)
  const given = await readGivenBefore(options.db ?? parts.dataSource, options.exceptOrderId ?? null)
  const judgement =
    product && changed.length === 0
      ? judgeBathOrder(
          situation.base,
          draftOf(fields, given),
          chosenOf(product, line, lines, fields.lotId),
          settings,
          options.stage,
        )
      : null
  return { situation, product, line, judgement, settings, changed }
}

/** Fields that have to be filled before the order can be signed. */
export function missingFields(fields: BathOrderFields): OrderField[] {
  const missing: OrderField[] = []
  const need = (field: OrderField, there: boolean) => void (there || missing.push(field))
  need('animalIds', fields.animalIds.length > 0)
  need('productId', fields.productId !== null)
  need('problem', fields.problem !== '')
  need('use', fields.use !== null)
  need('target', fields.target !== null)
  need('basis', fields.basis !== null)
  need('timing', fields.timing !== null)
  need('contactMinutes', fields.timing !== 'timed' || fields.contactMinutes !== null)
  need('intervalHours', fields.doses === 1 || fields.intervalHours !== null)
  need('startsAt', fields.startsAt !== null)
  need('setting', fields.setting !== null)
  need('division', fields.division !== null)
  need('stopIf', fields.stopIf !== '')
  return missing
}

export function missingProblem(missing: readonly OrderField[]): Problem {
  return new Problem('order-incomplete', {
    detail: missing.map((field) => orderMissing[field]).join(' '),
    errors: missing.map((field) => ({
      pointer: `/fields/${field}`,
      detail: orderMissing[field],
      code: 'missing',
    })),
  })
}
