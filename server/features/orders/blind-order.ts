import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Db } from '../../platform/database/db.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import { readKnown, readNumbersToldBy } from './knowers.reads.ts'
import type { Knower } from './knowers.reads.ts'
import type { SignedOrder } from './order-content.ts'
import { blindKeys } from './orders.present.ts'
import { readOrdersNumbered } from './orders.reads.ts'
import type { OrderReadRow } from './orders.reads.ts'

/** Whether somebody's roles let them calculate a second time at all. */
export const mayBeSecond = (actor: Actor): boolean =>
  decide('dose.calculate-second', actor.roles, { 'another-person': true }).allowed

/** Doses to come of one order whose amount somebody learns. */
export interface Learnt {
  orderId: string
  number: string
  versionId: string
  keys: string[]
}

/** Whose second calculation is still to come, and for whom the amounts of which orders are left out because of it. */
export interface Blindness {
  /** In lists and files, which are the same for everybody. */
  isLeftOut(orderId: string): boolean
  /**
   * For one person: they may be the second person of a dose that is still to come, of the order or of another for its
   * drug and water, and do not know its amount.
   */
  isLeftOutFor(orderId: string, actor: Actor): boolean
  /** The doses whose amount somebody learns who is shown that of an order; none where they know it. */
  learntFrom(orderId: string, actor: Actor): Learnt[]
}

/** Whether nobody would be asked blind of these doses who knows so much. */
function knowsAll(knowers: readonly Knower[], keys: readonly string[], actor: Actor): boolean {
  const own = knowers.filter(({ personId }) => personId === actor.personId)
  return keys.every((key) => own.some((one) => one.key === null || one.key === key))
}

/**
 * Reads it for some orders.
 *
 * @param rows the orders that are shown
 * @param areAll they are all that there are; else others for the same drug and water are read beside them
 */
export async function readBlindness(
  db: Db,
  rows: readonly OrderReadRow[],
  now: string,
  { areAll }: { areAll: boolean },
): Promise<Blindness> {
  const others = areAll ? [] : await readOthers(db, rows)
  const open = [...rows, ...others].flatMap((row) => {
    const keys = row.version_id === null ? [] : blindKeys(row, now)
    return keys.length > 0 ? [{ row, keys }] : []
  })
  const { knowers, alike } = await readKnown(
    db,
    open.map(({ row }) => row.id),
  )
  /** The order itself and those whose amount it tells, as far as a second person is still to work it out. */
  const toldBy = (orderId: string) =>
    open.filter(({ row }) => row.id === orderId || alike.get(row.id)?.includes(orderId))
  const asked = (orderId: string, actor: Actor) =>
    mayBeSecond(actor)
      ? toldBy(orderId).filter(({ row, keys }) => !knowsAll(knowers.get(row.id) ?? [], keys, actor))
      : []
  return {
    isLeftOut: (orderId) => toldBy(orderId).length > 0,
    isLeftOutFor: (orderId, actor) => asked(orderId, actor).length > 0,
    learntFrom: (orderId, actor) =>
      asked(orderId, actor).flatMap(({ row, keys }) =>
        row.version_id === null
          ? []
          : [{ orderId: row.id, number: row.number, versionId: row.version_id, keys }],
      ),
  }
}

async function readOthers(db: Db, rows: readonly OrderReadRow[]): Promise<OrderReadRow[]> {
  const numbers = await readNumbersToldBy(
    db,
    rows.map(({ id }) => id),
  )
  const read = new Set(rows.map(({ number }) => number))
  const wanted = numbers.filter((number) => !read.has(number))
  return wanted.length > 0 ? readOrdersNumbered(db, wanted) : []
}

/** A row of a list or of the worklist, without the amount where somebody has yet to work it out. */
export const leaveOut = (row: OrderRow, blindness: Blindness): OrderRow =>
  blindness.isLeftOut(row.id) ? { ...row, amountText: null } : row

/** What was signed, without the amount and all that it could be read off from. */
export function withoutAmount(content: SignedOrder | null) {
  if (content === null) return null
  const { bench: _said, ...rest } = content
  return { ...rest, fields: withoutBench(rest.fields), amount: null, working: [], facts: null }
}

/** An order's fields without what was asked on the bench: whoever asks it again has the amount. */
export function withoutBench({ bench: _asked, ...fields }: BathOrderFields): BathOrderFields {
  return fields
}
