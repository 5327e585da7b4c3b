import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/water-volumes.contract.ts'
import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import { findConnectedWater } from '../../../shared/domain/connections/connected-water.ts'
import type { ConnectedWater } from '../../../shared/domain/connections/connected-water.ts'
import type { VolumeMethod } from '../../../shared/domain/connections/volume-determination.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { formatVolume } from '../../../shared/domain/quantities/format-volume.ts'
import { computeVolume } from '../../../shared/domain/water/compute-volume.ts'
import { differsMuch } from '../../../shared/domain/water/differs-much.ts'
import type { VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import { sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import { waterDetails } from '../../../shared/messages/water.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { WaterServiceParts } from './measurements.service.ts'
import { readWaterMapAt } from './read-water-map.ts'
import type { WaterMapRows } from './read-water-map.ts'
import { recordedStamps } from './recorded-stamps.ts'
import { findDetermination, insertDetermination, insertVolumeConfirmation } from './volumes.repository.ts'
import { confirmedBefore } from './volume-now.ts'
import { readIsolations, readVolumes } from './volumes.reads.ts'
import type { VolumeReadRow } from './volumes.reads.ts'
import { insertVoid } from './water.repository.ts'

type Given = BodyOf<typeof contracts.determineVolume>

/** A figure from a record or a label counts as an estimate: nobody measured the water that is there now. */
const methodOf: Record<VolumeSheet['method'], VolumeMethod> = {
  geometry: 'geometry',
  metered: 'metered',
  'salt-dilution': 'dilution',
  stated: 'estimated',
}

const subject = (row: { id: string }, codes: readonly string[]) => ({
  kind: 'volume',
  id: row.id,
  label: codes.join(', '),
})

/** The volume of a sheet as the engine gives it; its refusal points into the sheet. */
function computed(sheet: Given['sheet']) {
  // The wire has units as text; the engine refuses the ones it does not know.
  const result = computeVolume(sheet as VolumeSheet)
  if (!result.ok) {
    const pointer = `/sheet/${(result.refusal.field ?? '').replaceAll('.', '/')}`
    throw refusedInput(pointer, sayNumberRefusal(result.refusal), result.refusal.code)
  }
  if (result.value.errorPercent <= 0) throw refusedInput('/sheet', waterDetails.errorNeeded, 'error-needed')
  return result.value
}

const codesOf = (rows: WaterMapRows, ids: readonly string[]) =>
  rows.bodies
    .filter((body) => ids.includes(body.id))
    .map((body) => body.code)
    .join(', ')

/**
 * The valve state that a determination is made under; refused when the bodies named are not what was joined then.
 * Less than the joined water is only accepted under a recorded isolation of exactly these bodies.
 */
async function checkCover(
  tx: Tx,
  given: { waterBodyIds: string[]; isolationId: string | null },
  water: ConnectedWater,
  rows: WaterMapRows,
  ownBodyId: string,
): Promise<{ connectionId: string; open: boolean }[]> {
  const { waterBodyIds, isolationId } = given
  if (!waterBodyIds.includes(ownBodyId))
    throw refusedInput('/waterBodyIds', waterDetails.ownBodyMissing, 'own-body-missing')
  const notJoined = waterBodyIds.filter((id) => !water.waterBodyIds.includes(id))
  if (notJoined.length > 0)
    throw new Problem('volume-covers-other-water', {
      detail: waterDetails.notJoined({ codes: codesOf(rows, notJoined) || notJoined.join(', ') }),
    })
  const left = water.waterBodyIds.filter((id) => !waterBodyIds.includes(id))
  if (left.length > 0 && isolationId === null)
    throw new Problem('isolation-needed', { detail: waterDetails.alsoJoined({ codes: codesOf(rows, left) }) })
  if (isolationId !== null) {
    const [isolation] = await readIsolations(tx.manager, { id: isolationId })
    const at = new Date(water.at)
    const stands =
      isolation !== undefined &&
      isolation.happened_at <= at &&
      (isolation.ended_at === null || isolation.ended_at > at) &&
      isolation.water_body_ids.length === waterBodyIds.length &&
      isolation.water_body_ids.every((id) => waterBodyIds.includes(id))
    if (!stands) throw new Problem('isolation-not-standing', { detail: waterDetails.isolationOther })
  }
  const covered = new Set(waterBodyIds)
  const touching = rows.connections
    .filter((row) => covered.has(row.from_body_id) || covered.has(row.to_body_id))
    .map((row) => row.id)
  const states = water.connections.filter((one) => touching.includes(one.connectionId))
  const unknown = states.filter((one) => one.state === 'unknown').map((one) => one.connectionId)
  if (unknown.length > 0)
    throw new Problem('valve-state-unknown', {
      detail: waterDetails.valveUnknown({
        codes: rows.connections
          .filter((row) => unknown.includes(row.id))
          .map((row) => row.code)
          .join(', '),
      }),
    })
  return states.map(({ connectionId, state }) => ({ connectionId, open: state === 'open' }))
}

/** Volume determinations: made by one person, confirmed by another, withdrawn with a reason, never changed. */
export function createVolumesService(parts: WaterServiceParts) {
  const { facility, enclosures } = parts
  const inTransaction = parts.transactions.inTransaction.bind(parts.transactions)

  /** The determination with its bodies locked, so that confirming and withdrawing wait for each other. */
  async function lockedVolume(tx: Tx, id: string): Promise<VolumeReadRow> {
    const read = () => readVolumes(tx.manager, { id, withVoided: true })
    const [row] = await read()
    if (!row) throw new Problem('not-found')
    await enclosures.service.lockWaterBodies(tx, row.water_body_ids)
    const [now] = await read()
    if (!now || now.void_reason !== null) throw new Problem('already-void')
    return now
  }

  return {
    /** Seals a determination. A keeper's is a proposal like any other: it counts once somebody else confirms it. */
    async determineVolume(context: RequestContext, code: string, given: Given): Promise<void> {
      const volume = computed(given.sheet)
      await inTransaction(context, async (tx) => {
        const { allowed } = decide('water.configure', tx.actor.roles, { 'proposal-only': true })
        if (!allowed) throw new Problem('may-not')
        const enclosure = await enclosures.questions.byCode(code, tx.manager)
        if (!enclosure) throw new Problem('not-found')
        const ownBodyId = enclosure.waterBodyId
        if (ownBodyId === null) throw new Problem('kind-has-no-water')
        const stamps = await recordedStamps(tx, facility, given.happenedAt)
        const row = {
          id: given.id,
          method: methodOf[given.sheet.method],
          grossVolumeLitres: volume.displacement === 'not-applicable' ? null : volume.grossLitres,
          netVolumeLitres: volume.netLitres,
          errorPercent: volume.errorPercent,
          displacementSubtracted: volume.displacement !== 'not-measured',
          inputs: canonicalJson(given.sheet as unknown as Json),
          working: canonicalJson(volume.working as unknown as Json),
          isolationId: given.isolationId ?? null,
          note: given.note ?? null,
          nextCheckOn: given.nextCheckOn ?? null,
          ...stamps,
        }
        const waterBodyIds = [...new Set(given.waterBodyIds)].sort()
        // The same request again is answered from what is sealed, also when valves were corrected since
        if (await findDetermination(tx, given.id)) {
          await insertDetermination(tx, row, { waterBodyIds, valves: [] })
          return
        }
        await enclosures.service.lockWaterBodies(tx, [...new Set([...waterBodyIds, ownBodyId])])
        const rows = await readWaterMapAt(tx.manager, stamps.happenedAt)
        const water = findConnectedWater(rows.map, ownBodyId, stamps.happenedAt.toISOString())
        if (!water.ok) throw new Problem('volume-covers-other-water', { detail: waterDetails.notInUseThen })
        const covers = { waterBodyIds, isolationId: row.isolationId }
        const valves = await checkCover(tx, covers, water.value, rows, ownBodyId)
        await insertDetermination(tx, row, { waterBodyIds, valves })
        tx.audit({
          action: 'volume.determine',
          subject: subject(row, [codesOf(rows, waterBodyIds)]),
          after: {
            method: row.method,
            netVolumeLitres: row.netVolumeLitres,
            errorPercent: row.errorPercent,
            happenedAt: stamps.happenedAt.toISOString(),
            sheet: given.sheet as unknown as Json,
          },
        })
      })
    },

    /** A second person confirms. Nobody confirms their own figure, whatever roles they hold. */
    async confirmVolume(
      context: RequestContext,
      id: string,
      given: BodyOf<typeof contracts.confirmVolume>,
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const volume = await lockedVolume(tx, id)
        const { personId, roles } = tx.actor
        const another = personId !== null && personId !== volume.recorded_by
        if (!decide('volume.confirm', roles, { 'another-person': another }).allowed || personId === null)
          throw new Problem('another-person-needed', { detail: waterDetails.confirmAnother })
        if (volume.confirmed_at) throw new Problem('already-confirmed')
        const rows = await readVolumes(tx.manager, { waterBodyIds: volume.water_body_ids, withVoided: false })
        const before = confirmedBefore(volume, rows)
        if (given.differenceSeen !== true && differsMuch(volume.net_volume_litres, before))
          throw new Problem('volume-differs', {
            detail: waterDetails.volumeDiffers({
              now: formatVolume(volume.net_volume_litres).text,
              before: formatVolume(before).text,
            }),
          })
        await insertVolumeConfirmation(tx, {
          id: parts.ids.next(),
          determinationId: id,
          determinedBy: volume.recorded_by,
          note: given.note ?? null,
          confirmedAt: tx.at,
          confirmedBy: personId,
        })
        tx.audit({
          action: 'volume.confirm',
          subject: subject(volume, volume.codes),
          after: {
            netVolumeLitres: volume.net_volume_litres,
            determinedBy: volume.recorded_by,
            confirmedBeforeLitres: before,
          },
        })
      })
    },

    /** Withdraws a wrong determination, confirmed or not. Who may only propose withdraws their own unconfirmed one. */
    async voidVolume(context: RequestContext, id: string, given: { reason: string }): Promise<void> {
      await inTransaction(context, async (tx) => {
        const volume = await lockedVolume(tx, id)
        const own = volume.recorded_by === tx.actor.personId && !volume.confirmed_at
        if (!decide('water.configure', tx.actor.roles, { 'proposal-only': own }).allowed)
          throw new Problem('may-not', { detail: waterDetails.onlyOwnProposal })
        await insertVoid(tx, { id: parts.ids.next(), reason: given.reason, of: { determinationId: id } })
        tx.audit({
          action: 'volume.void',
          subject: subject(volume, volume.codes),
          before: { netVolumeLitres: volume.net_volume_litres, confirmed: volume.confirmed_at !== null },
          after: { reason: given.reason },
        })
      })
    },
  }
}

export type VolumesService = ReturnType<typeof createVolumesService>
