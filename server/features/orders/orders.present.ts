import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import { orderPhase } from '../../../shared/domain/orders/order-phase.ts'
import type { OrderPhase, OrderStanding } from '../../../shared/domain/orders/order-phase.ts'
import { plannedDoses } from '../../../shared/domain/orders/planned-doses.ts'
import type { PlannedDose } from '../../../shared/domain/schedule/plan-doses.ts'
import { differingCopies } from './compare-copies.ts'
import { isOrderText } from './is-order-text.ts'
import type { ReadText } from './compare-copies.ts'
import type { SignedOrder } from './order-content.ts'
import type { OrderReadRow } from './orders.reads.ts'
import type { Signer } from '../../platform/signatures/signer.ts'
import { missingLinks } from './signing-chain.ts'

/** What is made of a row only once: a list asks each of its rows several things, and some cost much. */
function oncePerRow<T>(make: (row: OrderReadRow) => T): (row: OrderReadRow) => T {
  const made = new WeakMap<OrderReadRow, { value: T }>()
  return (row) => {
    const kept = made.get(row) ?? { value: make(row) }
    made.set(row, kept)
    return kept.value
  }
}

/** A canonical text; null where it is no longer readable: altered in the database, and shown as broken. */
export function readText(text: string | null): ReadText | null {
  try {
    const read: unknown = text === null ? null : JSON.parse(text)
    if (typeof read !== 'object' || read === null) return null
    const { content, ...rest } = read as ReadText
    return isOrderText(content) ? { content, ...rest } : rest
  } catch {
    return null
  }
}

const signedText = oncePerRow((row): ReadText | null => readText(row.signed_text))

/**
 * Whether every signature is there with its version, the one in force can be read and its columns say what was signed;
 * null while none was signed.
 */
const recordOf = oncePerRow((row): OrderRow['record'] => {
  if (missingLinks(row.chain).length > 0) return 'broken'
  if (row.copies === null) return null
  return differingCopies({ ...row.copies, order: row }, signedText(row)).length === 0 ? 'intact' : 'broken'
})

/** What the signature froze beside the content: the zone by whose clock the doses were planned. */
export const signedZone = (row: OrderReadRow): string => signedText(row)?.signedBy?.zone ?? 'UTC'

/** What the signature says, read for showing; columns beside the text are never shown in its place. */
export const signedContent = (row: OrderReadRow): SignedOrder | null => signedText(row)?.content ?? null

/** The course that was signed. The columns stand in only for a text that cannot be read, so that the order is not lost. */
function courseOf(row: OrderReadRow) {
  const fields = signedContent(row)?.fields
  if (fields?.startsAt)
    return {
      startsAt: new Date(fields.startsAt).toISOString(),
      doses: fields.doses,
      intervalHours: fields.intervalHours,
    }
  return row.starts_at && row.doses !== null
    ? { startsAt: row.starts_at.toISOString(), doses: row.doses, intervalHours: row.interval_hours }
    : null
}

/** The doses that the signed version in force plans; none for a draft. */
export const plannedOf = oncePerRow((row): PlannedDose[] => {
  const course = courseOf(row)
  return course ? plannedDoses(course, signedZone(row)) : []
})

function standingOfRow(row: OrderReadRow): OrderStanding {
  const signed = plannedOf(row)
  const last = signed.at(-1)
  return {
    stage: row.stage,
    signed: last
      ? {
          planned: signed,
          doneKeys: row.done_keys,
          lastWindowUntil: last.closesAt,
        }
      : null,
    held: row.held,
    ended: row.ended,
    running: row.running,
    hasRecords: row.done_keys.length > 0,
  }
}

/** Whether the signed text asks for a second calculation, at a caution or at a condition. */
export function asksForSecond(row: OrderReadRow): boolean {
  const content = signedContent(row)
  const said = [...(content?.cautions ?? []), ...(content?.conditions ?? [])]
  return said.some(({ secondCalculation }) => secondCalculation)
}

/**
 * The doses of an order that asks for a second calculation for which somebody may still be asked: those to come, and
 * until the last window is over those that a strike would open again with no two calculations that agree. Until then
 * the amount is for nobody who may be the one to calculate it blind.
 */
export function blindKeys(row: OrderReadRow, now: string): string[] {
  const standing = standingOfRow(row)
  const phase = orderPhase(standing, now)
  // completed: as it would stand with its records struck out
  const isOpen = (one: OrderPhase) => one === 'not-started' || one === 'in-progress' || one === 'held'
  const mayOpen =
    isOpen(phase) || (phase === 'completed' && isOpen(orderPhase(withoutRecords(standing), now)))
  if (!mayOpen || !asksForSecond(row)) return []
  return plannedOf(row)
    .map(({ key }) => key)
    .filter((key) => !row.done_keys.includes(key) || !row.agreed_keys.includes(key))
}

const withoutRecords = ({ signed, ...standing }: OrderStanding): OrderStanding => ({
  ...standing,
  signed: signed && { ...signed, doneKeys: [] },
})

/** Whether the text in force is still the one that was sealed; a key from elsewhere says nothing against it. */
const isSealBroken = ({ signed_text, seal }: OrderReadRow, signer: Pick<Signer, 'check'>): boolean =>
  signed_text !== null && seal !== null && signer.check(signed_text, seal) === 'broken'

export function presentOrderRow(row: OrderReadRow, now: string, signer: Pick<Signer, 'check'>): OrderRow {
  const standing = standingOfRow(row)
  const phase = orderPhase(standing, now)
  const content = signedContent(row)
  const draft = row.draft_text === null ? null : (JSON.parse(row.draft_text) as BathOrderFields)
  const isOpen = phase === 'not-started' || phase === 'in-progress' || phase === 'held'
  const record = isSealBroken(row, signer) ? 'broken' : recordOf(row)
  const isBroken = record === 'broken'
  const next = standing.signed?.planned.find((dose) => !row.done_keys.includes(dose.key))
  return {
    id: row.id,
    number: row.number,
    phase,
    enclosureCode: content?.enclosure.code ?? row.enclosure_code,
    enclosureName: content?.enclosure.name ?? row.enclosure_name,
    agent: (content?.product.agent ?? row.agent) as OrderRow['agent'],
    problem: content?.fields.problem ?? draft?.problem ?? '',
    // beside a broken record stands no figure that somebody could dose by
    amountText: isBroken ? null : (content?.amount.text ?? null),
    targetText: isBroken ? null : (content?.targetText ?? null),
    startsAt: courseOf(row)?.startsAt ?? draft?.startsAt ?? null,
    signedBy: signedText(row)?.signedBy?.printedName ?? row.signed_by_name,
    signedAt: signedText(row)?.signedBy?.signedAt ?? row.signed_at?.toISOString() ?? null,
    versionNo: content?.versionNo ?? row.version_no,
    record,
    dosesGiven: row.given,
    dosesIrregular: row.irregular,
    doses: courseOf(row)?.doses ?? null,
    nextDueAt: isOpen && next ? next.dueAt : null,
  }
}
