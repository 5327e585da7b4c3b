import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/water-map.contract.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import { listConnectedWaters } from '../../../shared/domain/connections/connected-water.ts'
import { waterDetails } from '../../../shared/messages/water.ts'
import type { AuditDraft } from '../../platform/audit/append-to-chain.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { timeNotAhead } from '../../platform/http/check-time.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { bodyOf } from './measurements.service.ts'
import type { WaterServiceParts } from './measurements.service.ts'
import { readWaterMapAt } from './read-water-map.ts'
import { recordedStamps } from './recorded-stamps.ts'
import { readIsolations } from './volumes.reads.ts'
import * as repository from './water.repository.ts'

type Thing = { id: string; code: string; name: string; inUseUntil: Date | null }
type Stamps = Awaited<ReturnType<typeof recordedStamps>>
type Created = Promise<{ created: boolean }>
const labelled = (kind: string, row: Pick<Thing, 'id' | 'code'>) => ({ kind, id: row.id, label: row.code })

const isolationSubject = (id: string, of: { codes: readonly string[] }) => ({
  kind: 'isolation',
  id,
  label: of.codes.join(', '),
})

/** Valves, pumps and machines with their ledgers, and isolations. */
export function createWaterMapService(parts: WaterServiceParts) {
  const { facility } = parts
  const { checkMayConfigure, lockWaterBodies } = parts.enclosures.service
  const inTransaction = parts.transactions.inTransaction.bind(parts.transactions)

  /** A new valve, pump or machine as it stands in its table. */
  const newThing = (
    tx: Tx,
    given: { id: string; code: string; name: string; inUseFrom?: string | undefined },
  ) => ({
    id: given.id,
    code: given.code,
    name: given.name,
    inUseFrom: given.inUseFrom ? timeNotAhead(given.inUseFrom, tx.at, '/inUseFrom') : tx.at,
    inUseUntil: null,
    recordedAt: tx.at,
    recordedBy: tx.actor.personId,
    version: 1,
  })

  /** Corrects the name of a valve, pump or machine, or says until when it was in use. */
  async function correctThing(
    tx: Tx,
    kind: 'connection' | 'life-support',
    before: Thing | null,
    given: BodyOf<typeof contracts.correctConnection | typeof contracts.correctLifeSupport>,
    save: typeof repository.saveConnection,
  ): Promise<void> {
    checkMayConfigure(tx)
    if (!before) throw new Problem('not-found')
    const inUseUntil = given.inUseUntil ? timeNotAhead(given.inUseUntil, tx.at, '/inUseUntil') : null
    const key = { id: before.id, version: given.expectedVersion }
    await save(tx, key, { name: given.name, inUseUntil })
    tx.audit({
      action: `${kind}.correct`,
      subject: labelled(kind, before),
      before: { name: before.name, inUseUntil: before.inUseUntil?.toISOString() ?? null },
      after: { name: given.name, inUseUntil: inUseUntil?.toISOString() ?? null },
    })
  }

  /** Writes a fact of what is locked already into its ledger; into the audit trail unless it stood there before. */
  async function recordFact(
    tx: Tx,
    given: { id: string; happenedAt: string },
    insert: (fact: { id: string } & Stamps) => Created,
    audit: Pick<AuditDraft, 'action' | 'subject'> & { after: Record<string, Json> },
  ): Promise<void> {
    const fact = { id: given.id, ...(await recordedStamps(tx, facility, given.happenedAt)) }
    const { created } = await insert(fact)
    if (created) tx.audit({ ...audit, after: { ...audit.after, happenedAt: fact.happenedAt.toISOString() } })
  }

  /** The isolation; refused when there is none or it was struck through. */
  async function isolationOf(tx: Tx, id: string) {
    const [row] = await readIsolations(tx.manager, { id, withVoided: true })
    if (!row) throw new Problem('not-found')
    if (row.void_reason !== null) throw new Problem('already-void')
    await lockWaterBodies(tx, row.water_body_ids)
    return row
  }

  return {
    /** Enters a valve or pump together with how it stands, so that it is never unknown. */
    async enterConnection(
      context: RequestContext,
      given: BodyOf<typeof contracts.enterConnection>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        checkMayConfigure(tx)
        if (given.fromBodyId === given.toBodyId) throw new Problem('same-body-twice')
        const bodies = await lockWaterBodies(tx, [given.fromBodyId, given.toBodyId])
        if (bodies.length < 2) throw new Problem('not-found', { detail: waterDetails.bodyNotHere })
        const { kind, fromBodyId, toBodyId } = given
        const row = { ...newThing(tx, given), kind, fromBodyId, toBodyId }
        const { created } = await repository.insertConnection(tx, row)
        if (!created) return
        await repository.insertConnectionState(tx, {
          id: parts.ids.next(),
          connectionId: row.id,
          open: given.open,
          note: null,
          ...(await recordedStamps(tx, facility, row.inUseFrom.toISOString())),
        })
        tx.audit({
          action: 'connection.enter',
          subject: labelled('connection', row),
          after: {
            name: row.name,
            kind: row.kind,
            between: bodies.map((body) => body.code),
            open: given.open,
          },
        })
      })
    },

    async correctConnection(
      context: RequestContext,
      id: string,
      given: BodyOf<typeof contracts.correctConnection>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const before = await repository.lockConnection(tx, id)
        await correctThing(tx, 'connection', before, given, repository.saveConnection)
      })
    },

    /** Records that a valve was opened or shut, a pump started or stopped. May be back-dated: it is a fact. */
    async recordConnectionState(
      context: RequestContext,
      id: string,
      given: BodyOf<typeof contracts.recordConnectionState>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const connection = await repository.lockConnection(tx, id)
        if (!connection) throw new Problem('not-found')
        const { open, note = null } = given
        const state = { connectionId: id, open, note }
        await recordFact(tx, given, (fact) => repository.insertConnectionState(tx, { ...fact, ...state }), {
          action: open ? 'connection.open' : 'connection.shut',
          subject: labelled('connection', connection),
          after: { note },
        })
      })
    },

    async enterLifeSupport(
      context: RequestContext,
      given: BodyOf<typeof contracts.enterLifeSupport>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        checkMayConfigure(tx)
        const body = await bodyOf(tx, parts, given.waterBodyId)
        const row = { ...newThing(tx, given), kind: given.kind, waterBodyId: body.id }
        const { created } = await repository.insertLifeSupport(tx, row)
        if (!created) return
        await repository.insertLifeSupportState(tx, {
          id: parts.ids.next(),
          unitId: row.id,
          isOn: given.on,
          note: null,
          ...(await recordedStamps(tx, facility, row.inUseFrom.toISOString())),
        })
        tx.audit({
          action: 'life-support.enter',
          subject: labelled('life-support', row),
          after: { name: row.name, kind: row.kind, water: body.code, on: given.on },
        })
      })
    },

    async correctLifeSupport(
      context: RequestContext,
      id: string,
      given: BodyOf<typeof contracts.correctLifeSupport>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const before = await repository.lockLifeSupport(tx, id)
        await correctThing(tx, 'life-support', before, given, repository.saveLifeSupport)
      })
    },

    /** Records that a machine was switched on or off. */
    async recordLifeSupportState(
      context: RequestContext,
      id: string,
      given: BodyOf<typeof contracts.recordLifeSupportState>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const unit = await repository.lockLifeSupport(tx, id)
        if (!unit) throw new Problem('not-found')
        const { on, note = null } = given
        const state = { unitId: id, isOn: on, note }
        await recordFact(tx, given, (fact) => repository.insertLifeSupportState(tx, { ...fact, ...state }), {
          action: on ? 'life-support.switch-on' : 'life-support.switch-off',
          subject: labelled('life-support', unit),
          after: { note },
        })
      })
    },

    /** Records that part of one connected water was shut off. It counts for a dose once its test has passed. */
    async recordIsolation(
      context: RequestContext,
      given: BodyOf<typeof contracts.recordIsolation>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const wanted = [...new Set(given.waterBodyIds)].sort()
        const bodies = await lockWaterBodies(tx, wanted)
        if (bodies.length < wanted.length)
          throw new Problem('not-found', { detail: waterDetails.bodyNotHere })
        const codes = bodies.map((body) => body.code).sort()
        const note = given.note ?? null
        await recordFact(
          tx,
          given,
          async (fact) => {
            const { map } = await readWaterMapAt(tx.manager, fact.happenedAt)
            const waters = listConnectedWaters(map, fact.happenedAt.toISOString())
            if (
              !waters.ok ||
              !waters.value.some((one) => wanted.every((id) => one.waterBodyIds.includes(id)))
            )
              throw new Problem('not-one-water')
            return repository.insertIsolation(tx, { ...fact, note }, wanted)
          },
          {
            action: 'isolation.record',
            subject: isolationSubject(given.id, { codes }),
            after: { bodies: codes, note },
          },
        )
      })
    },

    async recordIsolationTest(
      context: RequestContext,
      isolationId: string,
      given: BodyOf<typeof contracts.recordIsolationTest>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const isolation = await isolationOf(tx, isolationId)
        const { method, passed } = given
        const test = { isolationId, method, passed }
        await recordFact(tx, given, (fact) => repository.insertIsolationTest(tx, { ...fact, ...test }), {
          action: 'isolation.test',
          subject: isolationSubject(isolationId, isolation),
          after: { method, passed },
        })
      })
    },

    async endIsolation(
      context: RequestContext,
      isolationId: string,
      given: BodyOf<typeof contracts.endIsolation>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const isolation = await isolationOf(tx, isolationId)
        const note = given.note ?? null
        await recordFact(
          tx,
          given,
          (fact) => {
            if (fact.happenedAt <= isolation.happened_at)
              throw new Problem('period-reversed', { detail: waterDetails.endBeforeStart })
            return repository.insertIsolationEnd(tx, { ...fact, isolationId, note })
          },
          { action: 'isolation.end', subject: isolationSubject(isolationId, isolation), after: { note } },
        )
      })
    },
  }
}

export type WaterMapService = ReturnType<typeof createWaterMapService>
