import type { Db } from '../../platform/database/db.ts'

/** Somebody who knows the amount of a dose without having worked it out blind. */
export interface Knower {
  personId: string
  /** Null: of every dose of the order. */
  key: string | null
  /** The version for which they made a first calculation; null where they learnt it otherwise. */
  firstOf: string | null
}

/** What was learnt of an order so long before another like it was signed is not what comes out now. */
const rememberedMs = 30 * 24 * 60 * 60_000

interface AlikeRow {
  order_id: string
  alike_id: string
  signed_at: Date
}

/** Other orders for the drug and the water of some: their amounts are those of the others. */
function readAlike(db: Db, orderIds: readonly string[]): Promise<AlikeRow[]> {
  return db.query(
    `SELECT order_id, alike_id, min(signed_at) AS signed_at FROM orders_alike
      WHERE order_id = ANY($1::uuid[]) GROUP BY order_id, alike_id`,
    [orderIds],
  )
}

export interface Known {
  /** By order: who knows the amounts of its doses. */
  knowers: Map<string, Knower[]>
  /** By order: the others for its drug and water. */
  alike: Map<string, string[]>
}

interface LearntRow {
  order_id: string
  dose_key: string | null
  person_id: string
  learnt_at: Date
  first_of: string | null
  worked_out_blind: boolean
}

/**
 * Who knows the amounts of some orders: from the order itself, under any of its versions, or from another for the same
 * drug in the same water, since a month before it was signed. Whoever recorded an amount of that one which they had
 * worked out blind has earned it, and may do so again.
 */
export async function readKnown(db: Db, orderIds: readonly string[]): Promise<Known> {
  const known: Known = { knowers: new Map(), alike: new Map() }
  if (orderIds.length === 0) return known
  const alike = await readAlike(db, orderIds)
  const told = [...new Set([...orderIds, ...alike.map((row) => row.alike_id)])]
  const learnt: LearntRow[] = await db.query(
    `SELECT order_id, dose_key, person_id, learnt_at, first_of, worked_out_blind FROM amounts_learnt
      WHERE order_id = ANY($1::uuid[])`,
    [told],
  )
  const byOrder = new Map<string, LearntRow[]>()
  for (const row of learnt) byOrder.set(row.order_id, [...(byOrder.get(row.order_id) ?? []), row])
  for (const id of orderIds) {
    const others = alike.filter((row) => row.order_id === id)
    known.alike.set(
      id,
      others.map((row) => row.alike_id),
    )
    known.knowers.set(id, [
      ...(byOrder.get(id) ?? []).map(ofTheOrder),
      ...others.flatMap((row) => (byOrder.get(row.alike_id) ?? []).flatMap((one) => ofOneAlike(one, row))),
    ])
  }
  return known
}

const ofTheOrder = (row: LearntRow): Knower => ({
  personId: row.person_id,
  key: row.dose_key,
  firstOf: row.first_of,
})

function ofOneAlike(row: LearntRow, { signed_at }: AlikeRow): Knower[] {
  const isForgotten = row.learnt_at.getTime() < signed_at.getTime() - rememberedMs
  return isForgotten || row.worked_out_blind ? [] : [{ personId: row.person_id, key: null, firstOf: null }]
}

/**
 * Orders that were not discontinued and have a dose without a record, or with one that no two calculations stand behind:
 * struck out, it is to come again. Of the order that a query calls o.
 */
const hasDosesToCome = `NOT EXISTS (SELECT 1 FROM order_events e WHERE e.order_id = o.id AND e.kind = 'discontinued')
  AND (SELECT count(DISTINCT d.dose_key) FROM live_doses d JOIN order_versions x ON x.id = d.order_version_id
         JOIN calculations_agreed a ON a.dose_key = d.dose_key
          AND a.order_version_id = (SELECT n.id FROM order_versions n WHERE n.order_id = o.id
                                     ORDER BY n.version_no DESC LIMIT 1)
        WHERE x.order_id = o.id) < (SELECT max(x.doses) FROM order_versions x WHERE x.order_id = o.id)`

/** Orders for a drug in some enclosures with a dose to come: an amount worked out there is theirs as well. */
export async function readNumbersLike(
  db: Db,
  { enclosureIds, agent }: { enclosureIds: readonly string[]; agent: string },
): Promise<string[]> {
  const rows: { number: string }[] = await db.query(
    `SELECT DISTINCT o.number FROM order_versions v JOIN orders o ON o.id = v.order_id
      WHERE v.enclosure_id = ANY($1::uuid[]) AND v.agent = $2 AND ${hasDosesToCome} ORDER BY o.number`,
    [enclosureIds, agent],
  )
  return rows.map(({ number }) => number)
}

/** Orders with a dose to come that are for the drug and the water of some others. */
export async function readNumbersToldBy(db: Db, orderIds: readonly string[]): Promise<string[]> {
  const rows: { number: string }[] = await db.query(
    `SELECT o.number FROM orders o
      WHERE o.id IN (SELECT a.order_id FROM orders_alike a WHERE a.alike_id = ANY($1::uuid[])) AND ${hasDosesToCome}
      ORDER BY o.number`,
    [orderIds],
  )
  return rows.map(({ number }) => number)
}

/** Whether a person worked out the drug of a product for the water of an enclosure, as an order being written. */
export async function readHasPreviewed(
  db: Db,
  asked: { productId: string; enclosureId: string; personId: string; since: Date },
): Promise<boolean> {
  const rows: unknown[] = await db.query(
    `SELECT 1 FROM amounts_previewed a JOIN products p ON p.agent = a.agent
      WHERE p.id = $1 AND a.enclosure_id = $2 AND a.person_id = $3 AND a.recorded_at >= $4 LIMIT 1`,
    [asked.productId, asked.enclosureId, asked.personId, asked.since],
  )
  return rows.length > 0
}
