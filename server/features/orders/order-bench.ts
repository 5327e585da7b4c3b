import type { BathOrderFields, BenchAsked, SaidBench } from '../../../shared/contracts/order-primitives.ts'
import { compareWithBench } from '../../../shared/domain/orders/compare-with-bench.ts'
import type { BathDose } from '../../../shared/domain/dose/bath-dose.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { orderBenchWords as words } from '../../../shared/messages/orders.ts'
import type { Db } from '../../platform/database/db.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import { mayBeSecond } from './blind-order.ts'
import { signedContent } from './orders.present.ts'
import { readHasPreviewed } from './knowers.reads.ts'
import { readOrder } from './orders.reads.ts'
import type { OrderReadRow } from './orders.reads.ts'
import { saidAmount } from './say-order.ts'

/** A calculator's answer in words, and its result to be compared. */
export interface BenchWords {
  name: string
  result: string
  figure: { value: number; rounded: string; unit: UnitCode; text: string }
  inputs: string[]
  working: string[]
  sources: { citation: string; mark: string }[]
}

/** Asks a calculator of the bench, every line evaluated a second way; or says why it has no answer. */
export type AskBench = (
  asked: BenchAsked,
) => Promise<{ ok: true; answer: BenchWords } | { ok: false; why: string }>

/**
 * What the bench says to what an order keeps of it, asked now.
 *
 * @param dose the order's own amount, which it is compared with; null while there is none
 * @returns null where the order keeps nothing of the bench
 * @throws Problem bad-input at /fields/bench
 */
export async function saidBench(
  ask: AskBench,
  { bench }: Pick<BathOrderFields, 'bench'>,
  dose: BathDose | null,
): Promise<SaidBench | null> {
  if (!bench) return null
  const asked = await ask(bench)
  if (!asked.ok)
    throw refusedInput('/fields/bench', words.refused({ why: asked.why }), 'bench-not-computable')
  const { answer } = asked
  return {
    head: words.head(answer),
    inputs: answer.inputs,
    working: answer.working,
    sources: answer.sources.map((source) => words.source(source)),
    comparison: dose === null ? null : comparisonOf(answer, dose),
  }
}

/** The two figures side by side; they are never shown as one. */
function comparisonOf({ figure }: BenchWords, dose: BathDose): string | null {
  const { measured } = dose
  const found = compareWithBench(figure, {
    value: dose.amount,
    unit: dose.unit,
    shown: measured ? { value: measured.value, unit: measured.unit as UnitCode } : null,
  })
  if (found === null) return null
  return words[found]({ own: saidAmount(dose).text, bench: figure.text })
}

/** What is kept of the bench with a draft, or with the version in force where there is no draft. */
const keptIn = (row: OrderReadRow): BathOrderFields | null =>
  row.draft_text === null
    ? (signedContent(row)?.fields ?? null)
    : (JSON.parse(row.draft_text) as BathOrderFields)

/** The same of an order by its number; nothing where it keeps nothing, for the fields that are saved again. */
export async function keptBench(db: Db, number: string): Promise<Pick<BathOrderFields, 'bench'>> {
  const row = await readOrder(db, number)
  const bench = row && keptIn(row)?.bench
  return bench ? { bench } : {}
}

/** Whoever reads an order, and what is known of them. */
interface Reader {
  actor: Actor
  /** Its amount is left out for them. */
  isBlind: boolean
  now: Date
}

const rememberedMs = 30 * 24 * 60 * 60_000

/**
 * Whether what a draft keeps of the bench is left out for a reader: they may be asked to calculate the amount blind once
 * it is signed, and are not known to have seen it. Known are who began the draft, and who worked it out in its form.
 */
export async function isBenchLeftOut(db: Db, row: OrderReadRow, reader: Reader): Promise<boolean> {
  const { actor, isBlind, now } = reader
  const kept = keptIn(row)
  if (!kept?.bench || !mayBeSecond(actor)) return false
  if (isBlind) return true
  const inForce = signedContent(row)?.fields.bench
  if (JSON.stringify(inForce) === JSON.stringify(kept.bench)) return false
  return !(await knowsDraft(db, row, { actor, now }))
}

/** Whether what drafts of an order kept of the bench at any time is left out for a reader, in the audit trail. */
export async function isEarlierBenchLeftOut(db: Db, row: OrderReadRow, reader: Reader): Promise<boolean> {
  if (!mayBeSecond(reader.actor)) return false
  return reader.isBlind || (row.draft_text !== null && !(await knowsDraft(db, row, reader)))
}

async function knowsDraft(
  db: Db,
  row: OrderReadRow,
  { actor: { personId }, now }: Pick<Reader, 'actor' | 'now'>,
): Promise<boolean> {
  if (personId !== null && row.created_by === personId) return true
  const { productId, enclosureId } = keptIn(row) ?? { productId: null, enclosureId: '' }
  if (productId === null || personId === null) return false
  const since = new Date(now.getTime() - rememberedMs)
  return readHasPreviewed(db, { productId, enclosureId, personId, since })
}

/**
 * What is kept of the bench with an order that is worked out in its form by whoever was not shown it. Working it out is
 * noted, for the drug and the water; so it is shown for these alone, and only once there is an amount.
 */
export async function benchForPreview(
  db: Db,
  row: OrderReadRow,
  { body, isWorkedOut, ...reader }: Reader & { body: BathOrderFields; isWorkedOut: boolean },
): Promise<Pick<BathOrderFields, 'bench'>> {
  const kept = keptIn(row)
  if (!kept?.bench) return {}
  const isSame =
    kept.enclosureId === body.enclosureId && (kept.productId ?? body.productId) === body.productId
  const shown = (isWorkedOut && isSame) || !(await isBenchLeftOut(db, row, reader))
  return shown ? { bench: kept.bench } : {}
}
