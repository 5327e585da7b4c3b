import { readsAsSpecificGravity } from '../../seawater/specific-gravity.ts'
import { ok, refuse, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import { finiteOrRefuse } from '../../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { volumeRules } from '../flow/flow-limits.ts'

export type EvaporationRefusal =
  LimitRefusal | 'not-finite' | 'specific-gravity-as-salinity' | 'salinity-not-risen'

const salinity = (field: string) => ({ field, unit: 'PSS-78', min: 0, max: 120 }) as const

/**
 * Fresh water that brings back what evaporated: V (S − St) ÷ St, with the volume as it is now. The salt stays behind when
 * water evaporates, so the salinity tells how much is gone. Density is left out.
 *
 * @param input.systemLitres    now, with the level fallen; above 0, at most 100,000,000
 * @param input.readingSalinity 0…120, not below the target
 * @param input.targetSalinity  above 0, at most 120; on the scale of the reading
 * @returns litres of fresh water
 * @refuses not-finite · limits · salinity-not-risen (readingSalinity) · specific-gravity-as-salinity
 * @source  salt-balance · check value sal.13
 */
export function evaporationTopUp(input: {
  systemLitres: number
  readingSalinity: number
  targetSalinity: number
}): Result<number, EvaporationRefusal> {
  const { systemLitres, readingSalinity, targetSalinity } = input
  const refused = checkNumbers([
    [systemLitres, volumeRules('systemLitres')],
    [readingSalinity, salinity('readingSalinity')],
    [targetSalinity, { ...salinity('targetSalinity'), above: 0 }],
  ])
  if (refused) return refused
  if (readsAsSpecificGravity(readingSalinity))
    return refuse('specific-gravity-as-salinity', 'readingSalinity')
  if (readsAsSpecificGravity(targetSalinity)) return refuse('specific-gravity-as-salinity', 'targetSalinity')
  if (readingSalinity < targetSalinity) return refuse('salinity-not-risen', 'readingSalinity')
  if (readingSalinity === targetSalinity) return ok(0)
  return finiteOrRefuse(
    (systemLitres * (readingSalinity - targetSalinity)) / targetSalinity,
    'targetSalinity',
  )
}
