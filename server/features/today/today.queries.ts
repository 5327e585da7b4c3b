import type { ReplyOf } from '../../../shared/contracts/contract.ts'
import type { getToday, TodayWork } from '../../../shared/contracts/today.contract.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { sortToday } from '../../../shared/domain/today/sort-today.ts'
import { isForRoles, todayKindNames, todayKinds } from '../../../shared/domain/today/today-kinds.ts'
import type { TodayKind, TodayLane } from '../../../shared/domain/today/today-kinds.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import type { TodayParts } from './index.ts'
import { gatherDiscrepancies } from './gather-discrepancies.ts'
import { gatherDoses } from './gather-doses.ts'
import type { GatheredDoses } from './gather-doses.ts'
import { gatherBodies, gatherFlagged, gatherNotices } from './gather-observations.ts'
import { gatherOrders } from './gather-orders.ts'
import { gatherOwnLicence, gatherPeople, locksShownHours } from './gather-people.ts'
import { gatherOutsideCases, gatherQuarantine } from './gather-quarantine.ts'
import { gatherRegister } from './gather-register.ts'
import { gatherWater } from './gather-water.ts'
import { todayLog } from './today-log.ts'
import type { Moment } from './work.ts'

const mostCases = 200
const mostFlagged = 100
const loggedObservations = 40
const looksSinceDays = 60
const msPerDay = 86_400_000

/** Notes of the watches before are shown for so long. */
const handoverHours = 48
const handoverSince = (now: Date) => new Date(now.getTime() - handoverHours * 3_600_000)

/** Asks only for what stands in some lane of the reader, everything at once. */
export function createTodayQueries(parts: TodayParts) {
  const { clock, facility, quarantine, orders, administrations } = parts

  async function gatherTanks(moment: Moment): Promise<GatheredDoses> {
    const work = await orders.work()
    const doses = await gatherDoses(administrations, work, moment)
    return { ...doses, items: [...doses.items, ...gatherOrders(work.waiting, moment)] }
  }

  async function gatherCases(moment: Moment): Promise<TodayWork[]> {
    const [board, looks, outside] = await Promise.all([
      quarantine.queries.board({ view: 'running', limit: mostCases }),
      quarantine.lastLooks(new Date(moment.now.getTime() - looksSinceDays * msPerDay)),
      quarantine.outsideCases(),
    ])
    const inCases = gatherQuarantine(
      board,
      looks.map((row) => ({
        number: row.number,
        enclosure: row.enclosure_code,
        at: row.last_at.toISOString(),
        by: row.by_name ?? '',
      })),
      moment,
    )
    return [...inCases, ...gatherOutsideCases(outside)]
  }

  return {
    async today(actor: Actor): Promise<ReplyOf<typeof getToday>> {
      const now = clock.now()
      const zone = await facility.zone()
      const at = now.toISOString()
      const moment: Moment = { now, at, on: facilityDateOf(at, zone), zone, actor }
      const sees = (kind: TodayKind) => isForRoles(kind, actor.roles)
      const seesLane = (lane: TodayLane) =>
        todayKindNames.some((kind) => todayKinds[kind].lane === lane && sees(kind))
      const none = Promise.resolve([])
      const readsOrders = decide('order.read', actor.roles).allowed
      const seesTanks = seesLane('decide') || seesLane('doses') || seesLane('watch')

      const [
        tanks,
        cases,
        notices,
        flagged,
        recent,
        water,
        register,
        discrepancies,
        bodies,
        people,
        handover,
        own,
      ] = await Promise.all([
        readsOrders && seesTanks ? gatherTanks(moment) : { items: [], recent: [] },
        seesTanks ? gatherCases(moment) : none,
        sees('urgent-call') ? quarantine.observationQueries.notices(true) : none,
        sees('observation-flagged')
          ? quarantine.observationQueries.observations({ waiting: 'yes', limit: mostFlagged })
          : { rows: [] },
        seesTanks ? quarantine.observationQueries.observations({ limit: loggedObservations }) : { rows: [] },
        sees('volume-to-confirm') ? gatherWater(parts.water.questions, moment) : none,
        seesLane('register') ? gatherRegister(parts, moment) : none,
        sees('discrepancy-veterinarian') || sees('discrepancy-registrar')
          ? parts.animals.queries.discrepancies({ state: 'open', limit: mostFlagged }, actor)
          : { rows: [] },
        sees('bodies-veterinarian') || sees('bodies-registrar')
          ? quarantine.observationQueries.observations({ bodies: 'to-name', limit: mostFlagged })
          : { rows: [] },
        seesLane('people')
          ? Promise.all([
              parts.people.questions.accounts(now),
              facility.listSettings(),
              parts.people.questions.signingLocks(new Date(now.getTime() - locksShownHours * 3_600_000)),
            ])
          : null,
        sees('observation') ? parts.handover.notesSince(handoverSince(now), actor.personId) : none,
        sees('own-licence') ? gatherOwnLicence(parts.people, moment) : none,
      ])

      const items = [
        ...tanks.items,
        ...cases,
        ...gatherNotices(notices, moment),
        ...gatherFlagged(flagged.rows, moment),
        ...water,
        ...register,
        ...gatherDiscrepancies(discrepancies.rows, moment),
        ...gatherBodies(bodies.rows, moment),
        ...(people ? gatherPeople(...people, moment) : []),
        ...own,
      ]
      return {
        at,
        on: moment.on,
        items: sortToday(
          items.filter(({ kind }) => sees(kind)),
          zone,
        ),
        handover,
        log: todayLog(recent.rows, tanks.recent, moment),
      }
    },
  }
}

export type TodayQueries = ReturnType<typeof createTodayQueries>
