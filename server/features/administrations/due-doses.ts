import type { QueryOf, ReplyOf } from '../../../shared/contracts/contract.ts'
import type { listDueDoses } from '../../../shared/contracts/doses.contract.ts'
import { listDoseStates } from '../../../shared/domain/orders/dose-states.ts'
import type { PlannedDose } from '../../../shared/domain/schedule/plan-doses.ts'
import { addHours } from '../../../shared/domain/time/instant-arithmetic.ts'
import { agentNames } from '../../../shared/messages/formulary.ts'
import { orderWords } from '../../../shared/messages/orders.ts'
import type { Db } from '../../platform/database/db.ts'
import type { OpenOrder, OrderQueries } from '../orders/index.ts'
import { readDosesOf, recordOf, stands } from './administrations.reads.ts'
import type { DoseReadRow } from './administrations.reads.ts'

type DueDose = ReplyOf<typeof listDueDoses>['rows'][number]

const aheadHours = 24

/** The doses of an order whose plan is gone with its versions: those on record, each at its own time. */
const plannedByRecords = (records: readonly DoseReadRow[]): PlannedDose[] =>
  records
    .filter((row, i) => records.findIndex(({ dose_key }) => dose_key === row.dose_key) === i)
    .map(({ dose_key: key, happened_at }) => {
      const at = happened_at.toISOString()
      return { key, dueAt: at, opensAt: at, closesAt: at }
    })

/**
 * Doses that are due until an instant, late, or running now, in time order.
 *
 * @param known the open orders, where the caller has read them already
 */
export async function findDueDoses(
  parts: { dataSource: Db; queries: OrderQueries; now(): Date },
  query: QueryOf<typeof listDueDoses>,
  known?: readonly OpenOrder[],
): Promise<DueDose[]> {
  const now = parts.now().toISOString()
  const until = query.until ?? addHours(now, aheadHours)
  const orders = known ?? (await parts.queries.open())
  const ids = orders.map(({ row }) => row.id)
  const all = ids.length > 0 ? (await readDosesOf(parts.dataSource, ids)).filter(stands) : []
  const byOrder = new Map<string, DoseReadRow[]>()
  for (const record of all) byOrder.set(record.order_id, [...(byOrder.get(record.order_id) ?? []), record])
  const found: DueDose[] = []
  for (const { row, plan, secondCalculation } of orders) {
    const records = byOrder.get(row.id) ?? []
    const planned = plan.planned.length > 0 ? plan.planned : plannedByRecords(records)
    const states = listDoseStates(planned, records.map(recordOf), { timed: plan.timed, ended: false }, now)
    for (const [i, dose] of planned.entries()) {
      const state = states[i]
      const isOpen = state === 'coming' || state === 'due' || state === 'late'
      if (!(isOpen || state === 'running') || Date.parse(dose.dueAt) > Date.parse(until)) continue
      found.push({
        number: row.number,
        key: dose.key,
        dueAt: dose.dueAt,
        latestAt: dose.closesAt,
        enclosureCode: row.enclosureCode,
        drug: row.agent ? agentNames[row.agent] : orderWords.drugUnknown,
        // nobody is to know the amount beforehand who may be the second to work it out
        amountText: secondCalculation ? null : row.amountText,
        broken: row.record === 'broken',
        state:
          state === 'running' ? 'running' : row.phase === 'held' ? 'held' : state === 'late' ? 'late' : 'due',
      })
    }
  }
  return found.sort((a, b) => Date.parse(a.dueAt) - Date.parse(b.dueAt))
}
