import { insertOnce } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import {
  VolumeConfirmation,
  VolumeDeterminationBody,
  VolumeDeterminationRecord,
  VolumeDeterminationValve,
} from './volume.entity.ts'

/** Seals a determination with the bodies it covers and the valve state it holds for. */
export async function insertDetermination(
  tx: Tx,
  row: VolumeDeterminationRecord,
  covers: { waterBodyIds: readonly string[]; valves: readonly { connectionId: string; open: boolean }[] },
): Promise<{ created: boolean }> {
  const done = await insertOnce(tx, VolumeDeterminationRecord, row, [
    'method',
    'inputs',
    'happenedAt',
    'isolationId',
    'nextCheckOn',
    'note',
  ])
  if (!done.created) return done
  const determinationId = row.id
  await tx.manager.insert(
    VolumeDeterminationBody,
    covers.waterBodyIds.map((waterBodyId) => ({ determinationId, waterBodyId })),
  )
  if (covers.valves.length > 0)
    await tx.manager.insert(
      VolumeDeterminationValve,
      covers.valves.map((valve) => ({ determinationId, ...valve })),
    )
  return done
}

export function findDetermination(tx: Tx, id: string): Promise<VolumeDeterminationRecord | null> {
  return tx.manager.findOneBy(VolumeDeterminationRecord, { id })
}

export async function insertVolumeConfirmation(tx: Tx, row: VolumeConfirmation): Promise<void> {
  await tx.manager.insert(VolumeConfirmation, row)
}
