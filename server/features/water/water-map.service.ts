import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/water-map.contract.ts'
import { listConnectedWaters } from '../../../shared/domain/connections/connected-water.ts'
import { waterDetails } from '../../../shared/messages/water.ts'
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

const startOf = (tx: Tx, given: string | undefined) =>
  given ? timeNotAhead(given, tx.at, '/inUseFrom') : tx.at
const labelled = (kind: string, row: { id: string; code: string }) => ({ kind, id: row.id, label: row.code })

/** Valves, pumps and machines with their ledgers, and isolations. */
export function createWaterMapService(parts: WaterServiceParts) {
  const { facility } = parts
  const { checkMayConfigure, lockWaterBodies } = parts.enclosures.service
  const inTransaction = parts.transactions.inTransaction.bind(parts.transactions)

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
        const inUseFrom = startOf(tx, given.inUseFrom)
        const row = {
          id: given.id,
          code: given.code,
          name: given.name,
          kind: given.kind,
          fromBodyId: given.fromBodyId,
          toBodyId: given.toBodyId,
          inUseFrom,
          inUseUntil: null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
          version: 1,
        }
        const { created } = await repository.insertConnection(tx, row)
        if (!created) return
        await repository.insertConnectionState(tx, {
          id: parts.ids.next(),
          connectionId: row.id,
          open: given.open,
          note: null,
          ...(await recordedStamps(tx, facility, inUseFrom.toISOString())),
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
        checkMayConfigure(tx)
        const before = await repository.lockConnection(tx, id)
        if (!before) throw new Problem('not-found')
        const inUseUntil = given.inUseUntil ? timeNotAhead(given.inUseUntil, tx.at, '/inUseUntil') : null
        await repository.saveConnection(
          tx,
          { id, version: given.expectedVersion },
          { name: given.name, inUseUntil },
        )
        tx.audit({
          action: 'connection.correct',
          subject: labelled('connection', before),
          before: { name: before.name, inUseUntil: before.inUseUntil?.toISOString() ?? null },
          after: { name: given.name, inUseUntil: inUseUntil?.toISOString() ?? null },
        })
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
        const stamps = await recordedStamps(tx, facility, given.happenedAt)
        const { created } = await repository.insertConnectionState(tx, {
          id: given.id,
          connectionId: id,
          open: given.open,
          note: given.note ?? null,
          ...stamps,
        })
        if (created)
          tx.audit({
            action: given.open ? 'connection.open' : 'connection.shut',
            subject: labelled('connection', connection),
            after: { happenedAt: stamps.happenedAt.toISOString(), note: given.note ?? null },
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
        const inUseFrom = startOf(tx, given.inUseFrom)
        const row = {
          id: given.id,
          code: given.code,
          name: given.name,
          kind: given.kind,
          waterBodyId: body.id,
          inUseFrom,
          inUseUntil: null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
          version: 1,
        }
        const { created } = await repository.insertLifeSupport(tx, row)
        if (!created) return
        await repository.insertLifeSupportState(tx, {
          id: parts.ids.next(),
          unitId: row.id,
          isOn: given.on,
          note: null,
          ...(await recordedStamps(tx, facility, inUseFrom.toISOString())),
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
        checkMayConfigure(tx)
        const before = await repository.lockLifeSupport(tx, id)
        if (!before) throw new Problem('not-found')
        const inUseUntil = given.inUseUntil ? timeNotAhead(given.inUseUntil, tx.at, '/inUseUntil') : null
        await repository.saveLifeSupport(
          tx,
          { id, version: given.expectedVersion },
          { name: given.name, inUseUntil },
        )
        tx.audit({
          action: 'life-support.correct',
          subject: labelled('life-support', before),
          before: { name: before.name, inUseUntil: before.inUseUntil?.toISOString() ?? null },
          after: { name: given.name, inUseUntil: inUseUntil?.toISOString() ?? null },
        })
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
        const stamps = await recordedStamps(tx, facility, given.happenedAt)
        const { created } = await repository.insertLifeSupportState(tx, {
          id: given.id,
          unitId: id,
          isOn: given.on,
          note: given.note ?? null,
          ...stamps,
        })
        if (created)
          tx.audit({
            action: given.on ? 'life-support.switch-on' : 'life-support.switch-off',
            subject: labelled('life-support', unit),
            after: { happenedAt: stamps.happenedAt.toISOString(), note: given.note ?? null },
          })
      })
    },

    /** Records that part of one connected water was shut off. It counts for a dose once its test has passed. */
    async recordIsolation(
      context: RequestContext,
      given: BodyOf<typeof contracts.recordIsolation>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const stamps = await recordedStamps(tx, facility, given.happenedAt)
        const wanted = [...new Set(given.waterBodyIds)].sort()
        const bodies = await lockWaterBodies(tx, wanted)
        if (bodies.length < wanted.length)
          throw new Problem('not-found', { detail: waterDetails.bodyNotHere })
        const { map } = await readWaterMapAt(tx.manager, stamps.happenedAt)
        const waters = listConnectedWaters(map, stamps.happenedAt.toISOString())
        if (!waters.ok || !waters.value.some((one) => wanted.every((id) => one.waterBodyIds.includes(id))))
          throw new Problem('not-one-water')
        const row = { id: given.id, note: given.note ?? null, ...stamps }
        const { created } = await repository.insertIsolation(tx, row, wanted)
        const codes = bodies.map((body) => body.code).sort()
        if (created)
          tx.audit({
            action: 'isolation.record',
            subject: { kind: 'isolation', id: row.id, label: codes.join(', ') },
            after: { bodies: codes, happenedAt: stamps.happenedAt.toISOString(), note: row.note },
          })
      })
    },

    async recordIsolationTest(
      context: RequestContext,
      isolationId: string,
      given: BodyOf<typeof contracts.recordIsolationTest>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const isolation = await isolationOf(tx, isolationId)
        const stamps = await recordedStamps(tx, facility, given.happenedAt)
        const { method, passed } = given
        const { created } = await repository.insertIsolationTest(tx, {
          id: given.id,
          isolationId,
          method,
          passed,
          ...stamps,
        })
        if (created)
          tx.audit({
            action: 'isolation.test',
            subject: { kind: 'isolation', id: isolationId, label: isolation.codes.join(', ') },
            after: { method, passed, happenedAt: stamps.happenedAt.toISOString() },
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
        const stamps = await recordedStamps(tx, facility, given.happenedAt)
        if (stamps.happenedAt <= isolation.happened_at)
          throw new Problem('period-reversed', { detail: waterDetails.endBeforeStart })
        const { created } = await repository.insertIsolationEnd(tx, {
          id: given.id,
          isolationId,
          note: given.note ?? null,
          ...stamps,
        })
        if (created)
          tx.audit({
            action: 'isolation.end',
            subject: { kind: 'isolation', id: isolationId, label: isolation.codes.join(', ') },
            after: { happenedAt: stamps.happenedAt.toISOString(), note: given.note ?? null },
          })
      })
    },
  }
}

export type WaterMapService = ReturnType<typeof createWaterMapService>
