import type { BathOrderFields, OrderRow } from '../../../shared/contracts/orders.contract.ts'
import { orderPhase } from '../../../shared/domain/orders/order-phase.ts'
import type { OrderStanding } from '../../../shared/domain/orders/order-phase.ts'
import { plannedDoses } from '../../../shared/domain/orders/planned-doses.ts'
import type { PlannedDose } from '../../../shared/domain/schedule/plan-doses.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { SignedOrder } from './order-content.ts'
import type { OrderReadRow } from './orders.reads.ts'

interface SignedText {
  content?: SignedOrder
  signedBy?: { zone?: string }
}

/** What is made of a row only once: a list asks each of its rows several things, and some cost much. */
function oncePerRow<T>(make: (row: OrderReadRow) => T): (row: OrderReadRow) => T {
  const made = new WeakMap<OrderReadRow, { value: T }>()
  return (row) => {
    const kept = made.get(row) ?? { value: make(row) }
    made.set(row, kept)
    return kept.value
  }
}

/** The signed text of a row; null where there is none, or where it is no longer readable. */
const signedText = oncePerRow((row): SignedText | null => {
  try {
    return row.signed_text === null ? null : (JSON.parse(row.signed_text) as SignedText)
  } catch {
    // altered in the database: the screens that show the signature say so
    return null
  }
})

/** What the signature froze beside the content: the zone by whose clock the doses were planned. */
export const signedZone = (row: OrderReadRow): string => signedText(row)?.signedBy?.zone ?? 'UTC'

/** The doses that the signed version in force plans; none for a draft. */
export const plannedOf = oncePerRow((row): PlannedDose[] => {
  if (!row.starts_at || row.doses === null) return []
  return plannedDoses(
    { startsAt: row.starts_at.toISOString(), doses: row.doses, intervalHours: row.interval_hours },
    signedZone(row),
  )
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
  }
}

/** What the signature says, read for showing; columns beside the text are never shown in its place. */
export const signedContent = (row: OrderReadRow): SignedOrder | null => signedText(row)?.content ?? null

export function presentOrderRow(row: OrderReadRow, now: string): OrderRow {
  const standing = standingOfRow(row)
  const phase = orderPhase(standing, now)
  const content = signedContent(row)
  const draft = row.draft_text === null ? null : (JSON.parse(row.draft_text) as BathOrderFields)
  const isOpen = phase === 'not-started' || phase === 'in-progress' || phase === 'held'
  const next = standing.signed?.planned.find((dose) => !row.done_keys.includes(dose.key))
  return {
    id: row.id,
    number: row.number,
    phase,
    enclosureCode: row.enclosure_code,
    enclosureName: row.enclosure_name,
    agent: row.agent as OrderRow['agent'],
    problem: content?.fields.problem ?? draft?.problem ?? '',
    amountText:
      row.amount_entered_value === null
        ? null
        : formatDose(row.amount_entered_value, row.amount_entered_unit as UnitCode).text,
    targetText: content?.targetText ?? null,
    startsAt: row.starts_at?.toISOString() ?? draft?.startsAt ?? null,
    signedBy: row.signed_by_name,
    signedAt: row.signed_at?.toISOString() ?? null,
    versionNo: row.version_no,
    dosesGiven: row.given,
    doses: row.doses,
    nextDueAt: isOpen && next ? next.dueAt : null,
  }
}
