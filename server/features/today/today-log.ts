import type { Observation } from '../../../shared/contracts/observations.contract.ts'
import type { TodayLogLine } from '../../../shared/contracts/today.contract.ts'
import { addHours } from '../../../shared/domain/time/instant-arithmetic.ts'
import type { RecentDoseRow } from '../administrations/index.ts'
import { doseParams } from './dose-params.ts'
import type { Moment } from './work.ts'

const shownHours = 24
const mostLines = 40

/** What people at the tanks wrote in the last 24 hours, the newest first. */
export function todayLog(
  observations: readonly Observation[],
  doses: readonly RecentDoseRow[],
  moment: Moment,
): TodayLogLine[] {
  const since = Date.parse(addHours(moment.at, -shownHours))
  const lines: TodayLogLine[] = [
    ...observations
      .filter(({ voidedReason }) => voidedReason === null)
      .map((one): TodayLogLine => ({
        id: one.id,
        kind: 'observation',
        at: one.happenedAt,
        by: one.recordedBy,
        params: {
          enclosure: one.enclosure,
          ...(one.feeding === null ? {} : { feeding: one.feeding }),
          ...(one.breathing === null ? {} : { breathing: one.breathing }),
          ...(one.skin === null ? {} : { skin: one.skin }),
          dead: one.foundDead ?? 0,
          ...(one.unwell === null ? {} : { unwell: one.unwell }),
          ...(one.handled === null ? {} : { handled: one.handled ? 'yes' : 'no' }),
          ...(one.words === null ? {} : { words: one.words }),
        },
      })),
    ...doses.flatMap(doseLines),
  ]
  return lines
    .filter((line) => Date.parse(line.at) >= since && Date.parse(line.at) <= Date.parse(moment.at))
    .sort((a, b) => Date.parse(b.at) - Date.parse(a.at))
    .slice(0, mostLines)
}

function doseLines(row: RecentDoseRow): TodayLogLine[] {
  const params = doseParams(row)
  const given: TodayLogLine = {
    id: row.id,
    kind: 'dose',
    at: row.happened_at.toISOString(),
    by: row.by_name,
    params: { ...params, record: row.kind },
  }
  if (row.stop_at === null) return [given]
  return [
    given,
    {
      id: `${row.id}:end`,
      kind: 'bath-ended',
      at: row.stop_at.toISOString(),
      by: row.stop_by ?? '',
      params: {
        ...params,
        cause: row.stop_cause ?? 'stopped',
        ...(row.stop_seen === null ? {} : { seen: row.stop_seen }),
      },
    },
  ]
}
