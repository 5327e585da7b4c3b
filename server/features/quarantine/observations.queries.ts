import type { QueryOf, ReplyOf } from '../../../shared/contracts/contract.ts'
import type * as noticeContracts from '../../../shared/contracts/notices.contract.ts'
import type { Notice } from '../../../shared/contracts/notices.contract.ts'
import type * as contracts from '../../../shared/contracts/observations.contract.ts'
import type { Observation } from '../../../shared/contracts/observations.contract.ts'
import { readOnCall } from '../../../shared/domain/notices/read-on-call.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Db } from '../../platform/database/db.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Animals } from '../animals/index.ts'
import type { Enclosures } from '../enclosures/index.ts'
import type { FacilityService } from '../facility/index.ts'
import type { WaterQuestions } from '../water/index.ts'
import { readNotices } from './notices.reads.ts'
import { presentNotice, presentObservation } from './observations.present.ts'
import { readLastLooks, readObservations } from './observations.reads.ts'
import { readClocks } from './read-clocks.ts'
import type { ClockFacts } from './read-clocks.ts'

type Round = ReplyOf<typeof contracts.getRound>

/** What screens and phones ask of observations, rounds and urgent calls. */
export function createObservationQueries(parts: {
  dataSource: Db
  clock: Clock
  facility: FacilityService
  animals: Animals
  enclosures: Enclosures
  water: WaterQuestions
}) {
  const { dataSource: db, clock, facility } = parts

  function casesIn(facts: ClockFacts, enclosureId: string): Round['rows'][number]['cases'] {
    const here = new Set(
      facts.stays
        .filter((row) => row.enclosure_id === enclosureId && row.until_at === null)
        .map((row) => row.case_id),
    )
    return facts.cases
      .filter((head) => head.ended_at === null && here.has(head.id))
      .map((head) => {
        const of = facts.clocks.get(head.id)
        return {
          number: head.number,
          name: head.name,
          dayNumber: of?.dayNumber ?? null,
          held: of?.status === 'locked',
        }
      })
  }

  return {
    async observation(id: string): Promise<Observation> {
      const [row] = await readObservations(db, { id })
      if (!row) throw new Problem('not-found')
      return presentObservation(row)
    },

    async observations(
      query: QueryOf<typeof contracts.listObservations>,
    ): Promise<ReplyOf<typeof contracts.listObservations>> {
      const page = pageOf(query)
      const { case: number, enclosure, waiting, bodies } = query
      const rows = await readObservations(db, {
        ...page,
        waiting: waiting === 'yes',
        bodiesToName: bodies === 'to-name',
        ...(number === undefined ? {} : { case: number }),
        ...(enclosure === undefined ? {} : { enclosure }),
      })
      const total = rows[0]?.total ?? 0
      return { rows: rows.map(presentObservation), total, nextCursor: nextCursorOf(page, total) }
    },

    /**
     * Enclosures with animals in them, quarantine last: whoever attends both does so after the others.
     * @source quarantine-practice, V
     */
    async round(): Promise<Round> {
      const at = clock.now()
      const zone = await facility.zone()
      const on = facilityDateOf(at.toISOString(), zone)
      const [places, facts, lastLooks] = await Promise.all([
        parts.enclosures.questions.inUseAt(at),
        readClocks(parts, db, 'running', { asOf: at, zone }),
        readLastLooks(db, on),
      ])
      const animals = await parts.animals.questions.animalsIn(
        places.map(({ id }) => id),
        at,
      )
      const looks = new Map(lastLooks.map((row) => [row.enclosure_id, row]))
      const rows = places.flatMap((place): Round['rows'] => {
        const here = animals.filter(({ enclosureId }) => enclosureId === place.id)
        if (here.length === 0) return []
        const look = looks.get(place.id)
        return [
          {
            enclosure: place.code,
            name: place.name,
            area: place.area,
            boundary: place.boundary,
            cases: casesIn(facts, place.id),
            animals: here.map((one) => ({
              accession: one.accession,
              name: one.name === null ? one.commonName : `${one.commonName}, ${one.name}`,
              form: one.form,
              count: one.count.ledger,
            })),
            lastLookAt: look?.last_at.toISOString() ?? null,
            looksToday: look?.today ?? 0,
            waterBodyId: place.waterBodyId,
          },
        ]
      })
      const last = (row: Round['rows'][number]) => Number(row.cases.length > 0)
      rows.sort((a, b) => last(a) - last(b) || a.area.localeCompare(b.area, 'en'))
      return { at: at.toISOString(), on, rows }
    },

    async onCall(): Promise<ReplyOf<typeof noticeContracts.getOnCall>> {
      const people = readOnCall(await facility.valueOf('notices.on-call'))
      return { asOf: clock.now().toISOString(), people }
    },

    async notice(id: string): Promise<Notice> {
      const [row] = await readNotices(db, { id })
      if (!row) throw new Problem('not-found')
      return presentNotice(row)
    },

    async notices(unseen: boolean): Promise<Notice[]> {
      return (await readNotices(db, { unseen })).map(presentNotice)
    },
  }
}

export type ObservationQueries = ReturnType<typeof createObservationQueries>
