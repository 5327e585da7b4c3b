import type { Order, OrderRow } from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import type { QueryOf } from '../../../shared/contracts/contract.ts'
import type { listOrders } from '../../../shared/contracts/orders.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { isTextSound } from '../../../shared/domain/orders/is-text-sound.ts'
import { orderProblemWords } from '../../../shared/messages/orders.ts'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import type { Db } from '../../platform/database/db.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import { withFault } from '../signing/index.ts'
import type { SigningService } from '../signing/index.ts'
import { leaveOut, mayBeSecond, readBlindness, withoutAmount, withoutBench } from './blind-order.ts'
import { benchForPreview, isBenchLeftOut, isEarlierBenchLeftOut, saidBench } from './order-bench.ts'
import type { AskBench } from './order-bench.ts'
import { readOpenOrders } from './order-work.ts'
import { isOrderText } from './is-order-text.ts'
import { faultOf } from './record-fault.ts'
import { standInGone, standInOrder } from './stand-in-order.ts'
import { differingCopies } from './compare-copies.ts'
import { plannedOf, presentOrderRow, readText } from './orders.present.ts'
import { presentRecord } from './present-record.ts'
import {
  readEvents,
  readOrder,
  readOrders,
  readOrdersNumbered,
  readRecordedDoses,
  readVersions,
} from './orders.reads.ts'
import type { OrderReadRow, VersionReadRow } from './orders.reads.ts'
import { lastSigning, missingLinks } from './signing-chain.ts'

export interface OrderQueriesParts {
  dataSource: Db
  signing: SigningService
  askBench: AskBench
  now(): Date
}

const ended = new Set(['completed', 'expired', 'discontinued'])
const mayBe: Action[] = [
  'order.draft',
  'order.sign',
  'order.amend',
  'order.hold',
  'hold.lift',
  'order.discontinue',
  'order.print',
  'dose.give',
  'dose.record',
  'dose.calculate-second',
]

const sortKeys: Record<string, (row: OrderRow) => string> = {
  number: (row) => row.number,
  startsAt: (row) => row.startsAt ?? '',
  enclosure: (row) => row.enclosureCode,
  signedAt: (row) => row.signedAt ?? '',
}

export function createOrderQueries(parts: OrderQueriesParts) {
  const { signer } = parts.signing

  async function rowOf(number: string) {
    const row = await readOrder(parts.dataSource, number)
    if (!row) throw new Problem('not-found')
    return row
  }

  /**
   * A signed version checked now: its text against the signature, the columns beside it against the text, and that no
   * signature of the order is missing.
   */
  async function readVersion(order: OrderReadRow, version: VersionReadRow) {
    const { content, block, text } = await parts.signing.readSealed(version.signed_text_id, order.created_at)
    const differ = differingCopies({ ...version.copies, order }, readText(text))
    const read = isOrderText(content) ? content : null
    // a text that is not the one signed gives no figure to anybody; what columns say does not change the text
    const isChanged = block.state === 'broken'
    // of a key from elsewhere nobody can say more than that
    const fault =
      block.state === 'unknown-key'
        ? null
        : faultOf(block.state, differ, missingLinks(order.chain).length > 0)
    return {
      content: isChanged ? null : read,
      isChanged: read !== null && isChanged,
      block: fault ? withFault(block, fault) : block,
    }
  }

  /** What a draft keeps of the bench, in words; null where the bench has no answer to it any more. */
  const draftBench = (draft: BathOrderFields) =>
    saidBench(parts.askBench, draft, null).catch((error: unknown) => {
      if (error instanceof Problem && error.code === 'bad-input') return null
      throw error
    })

  return {
    /** Every order that matches, sorted. */
    async find(query: Omit<QueryOf<typeof listOrders>, 'cursor' | 'limit'>): Promise<OrderRow[]> {
      const now = parts.now().toISOString()
      const read = await readOrders(parts.dataSource, query)
      const areAll = query.q === undefined && query.enclosureCode === undefined
      const blindness = await readBlindness(parts.dataSource, read, now, { areAll })
      const rows = read.map((row) => leaveOut(presentOrderRow(row, now, signer), blindness))
      const { phase } = query
      const found = rows.filter((row) =>
        phase === undefined ? true : phase === 'open' ? !ended.has(row.phase) : row.phase === phase,
      )
      const key = sortKeys[query.sort ?? 'number']
      const sign = query.direction === 'asc' ? 1 : -1
      if (key) found.sort((a, b) => sign * key(a).localeCompare(key(b)))
      return found
    },

    async list(query: QueryOf<typeof listOrders>) {
      const page = pageOf(query)
      const found = await this.find(query)
      return {
        rows: found.slice(page.offset, page.offset + page.limit),
        total: found.length,
        nextCursor: nextCursorOf(page, found.length),
      }
    },

    async order(number: string, actor: Actor): Promise<Order> {
      const row = await rowOf(number)
      const [versions, events, recorded] = await Promise.all([
        readVersions(parts.dataSource, row.id),
        readEvents(parts.dataSource, row.id),
        readRecordedDoses(parts.dataSource, row.id),
      ])
      const sealed = await Promise.all(
        versions.map(async (version) => {
          const { content, block } = await readVersion(row, version)
          return { versionNo: version.version_no, content: isTextSound(block.fault) ? content : null, block }
        }),
      )
      const now = parts.now().toISOString()
      const blindness = await readBlindness(parts.dataSource, [row], now, { areAll: false })
      const isBlind = blindness.isLeftOutFor(row.id, actor)
      const shown = presentOrderRow(row, now, signer)
      const inForce = sealed[0]
      const draft = row.draft_text === null ? null : (JSON.parse(row.draft_text) as BathOrderFields)
      const benchWithheld = await isBenchLeftOut(parts.dataSource, row, { actor, isBlind, now: parts.now() })
      return {
        ...shown,
        record: inForce?.block.state === 'broken' ? 'broken' : shown.record,
        amountText: isBlind ? null : (inForce?.content?.amount.text ?? null),
        targetText: inForce?.content?.targetText ?? null,
        amountsWithheld: isBlind,
        version: row.version,
        draft: draft && benchWithheld ? withoutBench(draft) : draft,
        draftBench: draft && !benchWithheld ? await draftBench(draft) : null,
        benchWithheld,
        createdBy: row.created_by_name ?? '',
        createdAt: row.created_at.toISOString(),
        versions: sealed.map(({ versionNo, block, content }, i) => ({
          versionNo,
          signature: block,
          content: isBlind ? withoutAmount(content) : content,
          superseded: i > 0,
        })),
        events: events.map((event) => ({
          id: event.id,
          kind: event.kind,
          reason: event.reason,
          happenedAt: event.happened_at.toISOString(),
          by: event.by_name ?? '',
        })),
        calendar: plannedOf(row).map(({ key, dueAt, opensAt, closesAt }) => {
          const own = recorded.filter((dose) => dose.dose_key === key)
          const records = own.map(presentRecord).reverse()
          return { key, dueAt, opensAt, closesAt, recorded: own[0]?.kind ?? null, records }
        }),
        may: mayBe.filter((action) => decide(action, actor.roles).allowed),
      }
    },

    /** The doses, of the order and of others like it, whose amount somebody learns who is shown that of the order. */
    async amountsToNote(number: string, actor: Actor) {
      const row = await rowOf(number)
      const now = parts.now().toISOString()
      const blindness = await readBlindness(parts.dataSource, [row], now, { areAll: false })
      return blindness.learntFrom(row.id, actor)
    },

    /** Of some orders those whose amount is left out for somebody. */
    async blindAmong(numbers: readonly string[], actor: Actor): Promise<Set<string>> {
      if (numbers.length === 0 || !mayBeSecond(actor)) return new Set()
      const now = parts.now().toISOString()
      const rows = await readOrdersNumbered(parts.dataSource, numbers)
      const blindness = await readBlindness(parts.dataSource, rows, now, { areAll: false })
      return new Set(rows.filter((row) => blindness.isLeftOutFor(row.id, actor)).map((row) => row.number))
    },

    /** What is kept of the bench with an order whose form does not say; see benchForPreview. */
    async benchForPreview(
      number: string,
      actor: Actor,
      worked: { body: BathOrderFields; isWorkedOut: boolean },
    ): Promise<Pick<BathOrderFields, 'bench'>> {
      const row = await rowOf(number)
      const at = parts.now()
      const blindness = await readBlindness(parts.dataSource, [row], at.toISOString(), { areAll: false })
      const isBlind = blindness.isLeftOutFor(row.id, actor)
      return benchForPreview(parts.dataSource, row, { ...worked, actor, isBlind, now: at })
    },

    /** Of some orders those of which somebody is not to see what a draft kept of the bench. */
    async benchLeftOutAmong(numbers: readonly string[], actor: Actor): Promise<Set<string>> {
      if (numbers.length === 0 || !mayBeSecond(actor)) return new Set()
      const at = parts.now()
      const rows = await readOrdersNumbered(parts.dataSource, numbers)
      const blindness = await readBlindness(parts.dataSource, rows, at.toISOString(), { areAll: false })
      const leftOut = await Promise.all(
        rows.map((row) => {
          const isBlind = blindness.isLeftOutFor(row.id, actor)
          return isEarlierBenchLeftOut(parts.dataSource, row, { actor, isBlind, now: at })
        }),
      )
      return new Set(rows.filter((_, i) => leftOut[i]).map(({ number }) => number))
    },

    idOf: async (number: string): Promise<string> => (await rowOf(number)).id,

    /** Signed orders that are not ended, with their plan: what worklists ask. */
    open: () => readOpenOrders(parts.dataSource, parts.now().toISOString(), signer),

    /** Holds and ends of an order, the newest first. */
    events: (orderId: string) => readEvents(parts.dataSource, orderId),

    /** The version in force for the tank: where every version is gone, what is left to record a fact under. */
    async sealedForDose(number: string) {
      const row = await rowOf(number)
      if (row.version_id !== null || missingLinks(row.chain).length === 0)
        return this.sealed(number, undefined)
      const { versionNo, at } = lastSigning(row.chain) ?? { versionNo: 0, at: row.created_at }
      return {
        row: presentOrderRow(row, parts.now().toISOString(), signer),
        versionId: null,
        versionNo,
        content: null,
        standIn: standInGone(row, { versionNo, at }),
        block: parts.signing.goneBlock(at),
      }
    },

    /** One signed version, checked now, with where the order stands, for paper. */
    async sealed(number: string, versionNo: number | undefined) {
      const row = await rowOf(number)
      const versions = await readVersions(parts.dataSource, row.id)
      const wanted = versions.find((version) => versionNo === undefined || version.version_no === versionNo)
      if (!wanted && missingLinks(row.chain).length > 0)
        throw new Problem('broken-record', { detail: orderProblemWords.versionGone })
      if (!wanted) throw new Problem('not-found', { detail: 'This order has no such signed version.' })
      const { content, isChanged, block } = await readVersion(row, wanted)
      return {
        row: presentOrderRow(row, parts.now().toISOString(), signer),
        recorded: await readRecordedDoses(parts.dataSource, row.id),
        versionId: wanted.id,
        versionNo: wanted.version_no,
        superseded: wanted !== versions[0],
        content,
        /** The text can be read, and is not the one that was signed. */
        isChanged,
        /** What the columns tell of a version whose text cannot be read, or was changed. */
        standIn: standInOrder(row, wanted.copies),
        block,
      }
    },
  }
}

export type OrderQueries = ReturnType<typeof createOrderQueries>
