import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import type { WaterQuestions } from '../water/index.ts'
import { onDays, waiting } from './work.ts'
import type { Moment } from './work.ts'

/** Volumes that wait for another person, and those whose day of checking has come. */
export async function gatherWater(water: WaterQuestions, moment: Moment): Promise<TodayWork[]> {
  const rows = await water.volumeWork(moment.on)
  return rows.flatMap((row): TodayWork[] => {
    const enclosure = row.enclosure_code
    if (enclosure === null) return []
    const params = { enclosure, waters: row.codes.join(' + '), by: row.determined_by_name ?? '' }
    if (!row.confirmed)
      return row.determined_by === moment.actor.personId
        ? []
        : [
            waiting({
              id: `volume-to-confirm:${row.id}`,
              kind: 'volume-to-confirm',
              at: row.happened_at.toISOString(),
              params,
            }),
          ]
    const on = row.next_check_on
    return on === null
      ? []
      : [
          onDays(
            { id: `volume-check:${row.id}`, kind: 'volume-check', dueOn: on, latestOn: on, params },
            moment,
          ),
        ]
  })
}
