import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { addDays } from '../../../shared/domain/time/facility-date.ts'
import { addHours } from '../../../shared/domain/time/instant-arithmetic.ts'
import { startOfFacilityDay } from '../../../shared/domain/time/local-time.ts'
import { endOfBath } from '../administrations/index.ts'
import type { Administrations, RecentDoseRow } from '../administrations/index.ts'
import type { OrdersAtWork } from '../orders/index.ts'
import { doseParams } from './dose-params.ts'
import { atHour, waiting, work } from './work.ts'
import type { Moment } from './work.ts'

/** Exceptions are shown to a veterinarian for so long; the record of the dose keeps them for ever. */
const exceptionsShownHours = 72
const secondsShownHours = 48

export interface GatheredDoses {
  items: TodayWork[]
  /** What was recorded of late, for the log. */
  recent: RecentDoseRow[]
}

/** Doses that are due, late or coming until the end of tomorrow; baths that go on; second calculations; exceptions. */
export async function gatherDoses(
  administrations: Administrations,
  { open, leftOutFor }: OrdersAtWork,
  moment: Moment,
): Promise<GatheredDoses> {
  const until = startOfFacilityDay(addDays(moment.on, 2), moment.zone)
  const since = (hours: number) => new Date(addHours(moment.at, -hours))
  const [due, happened, seconds] = await Promise.all([
    administrations.work.dueDoses(until, open),
    administrations.work.recentDoses(since(exceptionsShownHours)),
    administrations.work.wantedSeconds(since(secondsShownHours)),
  ])
  // what went in is what goes in next: it is left out for whoever may calculate another dose of it blind
  const blindOrders = leftOutFor(moment.actor)
  const recent = happened.map((row) =>
    blindOrders.has(row.number) ? { ...row, amount_entered_value: null, amount_entered_unit: null } : row,
  )
  const mayStop = decide('bath.stop', moment.actor.roles).allowed
  const blind = seconds.filter((row) => row.first_by !== moment.actor.personId)
  // Whoever may calculate a second time is shown no amount beforehand
  const isBlind = (row: { number: string; key: string }) =>
    blind.some((one) => one.number === row.number && one.dose_key === row.key)
  // Nothing is given under an order past its last window; it stands on the list as a whole
  const hasExpired = (number: string) =>
    open.some(({ row }) => row.number === number && row.phase === 'expired')
  return {
    recent,
    items: [
      ...plannedItems(
        due.filter((row) => !isBlind(row) && !hasExpired(row.number)),
        moment,
      ),
      ...recent.flatMap((row) => recordedItems(row, moment, mayStop)),
      ...blind.map((row) =>
        waiting({
          id: `second-calculation:${row.number}:${row.dose_key}`,
          kind: 'second-calculation',
          at: row.first_at.toISOString(),
          params: {
            number: row.number,
            key: row.dose_key,
            enclosure: row.enclosure_code,
            agent: row.agent,
            by: row.first_by_name,
          },
        }),
      ),
    ],
  }
}

type Due = Awaited<ReturnType<Administrations['work']['dueDoses']>>

/** Doses of one order that are late stand as one item, the first of them: the sheet shows them all. */
function plannedItems(due: Due, moment: Moment): TodayWork[] {
  const lateByOrder = new Map<string, number>()
  return due.flatMap((row): TodayWork[] => {
    if (row.state === 'running') return []
    const params = {
      number: row.number,
      key: row.key,
      enclosure: row.enclosureCode,
      drug: row.drug,
      ...(row.amountText === null ? {} : { amount: row.amountText }),
      ...(row.broken ? { broken: 1 } : {}),
    }
    const told = {
      id: `dose:${row.number}:${row.key}`,
      kind: 'dose' as const,
      dueAt: row.dueAt,
      latestAt: row.latestAt,
    }
    if (row.state === 'held') return [waiting({ ...told, params: { ...params, held: 1 } })]
    const item = atHour({ ...told, params }, moment)
    if (item.state !== 'late') return [item]
    const before = lateByOrder.get(row.number) ?? 0
    lateByOrder.set(row.number, before + 1)
    return before === 0 ? [item] : []
  })
}

function recordedItems(row: RecentDoseRow, moment: Moment, mayStop: boolean): TodayWork[] {
  const startedAt = row.happened_at.toISOString()
  const wasGiven = wentIn(row)
  const items: TodayWork[] = []
  const endsAt = endOfBath(row)
  if (endsAt !== undefined && wasGiven && row.stop_at === null) {
    items.push(
      work({
        id: `bath-running:${row.id}`,
        kind: 'bath-running',
        // of one whose time cannot be read it may be up
        state: endsAt === null || Date.parse(moment.at) > Date.parse(endsAt) ? 'late' : 'running',
        dueAt: endsAt,
        latestAt: endsAt,
        at: startedAt,
        params: { ...doseParams(row), doseId: row.id, ...(endsAt === null ? { endUntold: 1 } : {}) },
        acts: mayStop ? ['stop-bath'] : [],
      }),
    )
  } else if (row.happened_at >= new Date(startOfFacilityDay(moment.on, moment.zone))) {
    items.push(
      work({
        id: `dose-done:${row.id}`,
        kind: 'dose',
        state: 'done',
        at: startedAt,
        params: { ...doseParams(row), record: row.kind },
      }),
    )
  }
  if (row.has_exceptions && row.recorded_at >= new Date(addHours(moment.at, -exceptionsShownHours)))
    items.push(
      waiting({
        id: `dose-exceptions:${row.id}`,
        kind: 'dose-exceptions',
        at: row.recorded_at.toISOString(),
        params: doseParams(row),
      }),
    )
  // stopped before its time: somebody saw a reason, whatever became of the animals
  if (
    row.stop_cause === 'stopped' &&
    row.stop_at &&
    row.stop_at >= new Date(addHours(moment.at, -exceptionsShownHours))
  )
    items.push(
      waiting({
        id: `bath-stopped:${row.id}`,
        kind: 'dose-exceptions',
        at: row.stop_at.toISOString(),
        params: {
          ...doseParams(row),
          by: row.stop_by ?? '',
          stopped: 1,
          ...(row.stop_seen ? { seen: row.stop_seen } : {}),
        },
      }),
    )
  return items
}
