import type { BodyOf } from '../../shared/contracts/contract.ts'
import type { enterResult, reportEvent } from '../../shared/contracts/case-events.contract.ts'
import type { recordObservation } from '../../shared/contracts/observations.contract.ts'
import { allWell, nothingSaid } from '../../shared/domain/observations/observation.ts'
import type { ObservationSaid } from '../../shared/domain/observations/observation.ts'
import type { Composition } from '../composition.ts'
import type { CaseEventFacts } from '../features/quarantine/index.ts'
import type { RequestContext } from '../platform/http/request-context.ts'
import type { SeededAnimal } from './animals.ts'
import { dayMs } from './demo-time.ts'
import type { createTimeline, DemoTimes } from './demo-time.ts'
import type { DemoActors, DemoPerson } from './people.ts'

/** When something was, so many days ago, at a time of day of the facility. */
export type DemoMoment = readonly [daysAgo: number, time: string]

export interface TellerParts {
  composition: Composition
  people: DemoActors
  times: DemoTimes
  timeline: ReturnType<typeof createTimeline>
  now: Date
  /** The version in force of each protocol, by its code. */
  protocols: ReadonlyMap<string, string>
}

interface CaseTold {
  name: string
  protocol: string
  enclosure: string
  arrivedDaysAgo: number
  members: readonly SeededAnimal[]
}

type Result = Pick<BodyOf<typeof enterResult>, 'testKey' | 'result'>
type Reported = BodyOf<typeof reportEvent>['event']
type Said = Partial<ObservationSaid>

const device = 'Phone of the quarantine wing'

/** Tells what is seen at an enclosure, whether or not there is a case. */
export function createLooks({ composition, people, times, timeline }: TellerParts) {
  const { observations } = composition.quarantine.services
  const { parts } = composition

  function look(
    code: string,
    at: string,
    said: Said,
    more: { id?: string; who?: DemoPerson; deaths?: BodyOf<typeof recordObservation>['deaths'] } = {},
  ): void {
    const id = more.id ?? parts.ids.next()
    timeline.later(at, () =>
      observations.record(
        { actor: people[more.who ?? 'keeper'], requestId: 'demo' },
        {
          ...nothingSaid,
          ...said,
          signs: [...(said.signs ?? [])],
          id,
          schemaVersion: 1,
          origin: 'online',
          device,
          happenedAt: at,
          enclosure: code,
          deaths: more.deaths ?? [],
        },
      ),
    )
  }

  return {
    look,
    /** A look at the same time every so many days, all well unless something else is said for that day. */
    looks(
      code: string,
      [fromDaysAgo, untilDaysAgo]: readonly [number, number],
      time: string,
      given: { everyDays?: number; not?: readonly number[]; other?: Readonly<Record<number, Said>> } = {},
    ): void {
      for (let daysAgo = fromDaysAgo; daysAgo >= untilDaysAgo; daysAgo -= given.everyDays ?? 1)
        if (!given.not?.includes(daysAgo) && times.hasBeen(daysAgo, time))
          look(code, times.at(daysAgo, time), { ...allWell, ...given.other?.[daysAgo] })
    },
  }
}

/** Tells the story of one quarantine case: each verb notes what was entered when, through the services. */
export function createCaseTeller(parts: TellerParts, told: CaseTold) {
  const { composition, people, times, timeline } = parts
  const { services } = composition.quarantine
  const next = () => composition.parts.ids.next()
  const as = (who: DemoPerson): RequestContext => ({ actor: people[who], requestId: 'demo' })
  let number = ''
  const arrivedMs = parts.now.getTime() - told.arrivedDaysAgo * dayMs
  const afterArrival = (minutes: number) => new Date(arrivedMs + minutes * 60_000).toISOString()
  const looks = createLooks(parts)

  const opened = afterArrival(12)
  timeline.later(opened, async () => {
    const id = next()
    await services.cases.openCase(as('tech'), {
      id,
      name: told.name,
      protocolVersionId: parts.protocols.get(told.protocol) ?? '',
      members: told.members.map(({ accession }) => ({ id: next(), accession })),
      happenedAt: opened,
    })
    number = (await composition.quarantine.queries.caseById(id, [])).number
    await services.cases.closeCase(as('tech'), number, { id: next(), happenedAt: opened })
  })
  looks.look(told.enclosure, afterArrival(50), {
    ...allWell,
    feeding: null,
    words: 'Settling after the journey',
  })

  const story = {
    ...looks,
    number: () => number,

    step(moment: DemoMoment, stepKey: string, note?: string, who: DemoPerson = 'tech'): void {
      const happenedAt = times.at(...moment)
      timeline.later(happenedAt, () =>
        services.events.recordStep(as(who), number, {
          id: next(),
          happenedAt,
          stepKey,
          outcome: 'done',
          note,
        }),
      )
    },

    /** A sample taken on one day and its result on another; with the step that it does. */
    sample(taken: DemoMoment, reported: DemoMoment, stepKey: string, result: Result, note?: string): void {
      story.step(taken, stepKey, note)
      const happenedAt = times.at(...reported)
      timeline.later(happenedAt, () =>
        services.events.enterResult(as('tech2'), number, {
          id: next(),
          happenedAt,
          takenAt: times.at(...taken),
          ...result,
        }),
      )
    },

    /** Something that the clock goes by, reported at the tank; its id may be named to refer to it later. */
    report(
      moment: DemoMoment,
      event: Reported,
      note?: string,
      id = next(),
      who: DemoPerson = 'keeper',
    ): void {
      const happenedAt = times.at(...moment)
      timeline.later(happenedAt, () =>
        services.events.report(as(who), number, { id, happenedAt, event, note }),
      )
    },

    decide(
      moment: DemoMoment,
      reason: string,
      decision: Parameters<typeof services.events.decide>[2]['decision'],
    ): void {
      const happenedAt = times.at(...moment)
      timeline.later(happenedAt, () =>
        services.events.decide(as('vet'), number, { id: next(), happenedAt, reason, decision }),
      )
    },

    /** A treatment as another feature would tell the clock of it. */
    event(moment: DemoMoment, facts: CaseEventFacts, reason?: string): void {
      const happenedAt = times.at(...moment)
      timeline.later(happenedAt, () =>
        composition.parts.transactions.inTransaction(as('tech'), (tx) =>
          services.events.recordEvent(tx, {
            id: next(),
            caseNumber: number,
            facts,
            happenedAt,
            ...(reason === undefined ? {} : { reason }),
          }),
        ),
      )
    },

    /** More of the batch, after the last of it was said to be in. */
    joins(daysAgo: number, members: readonly SeededAnimal[]): void {
      timeline.later(new Date(parts.now.getTime() - daysAgo * dayMs + 14 * 60_000), async () => {
        for (const { accession } of members)
          await services.cases.addMember(as('tech'), number, { id: next(), accession })
      })
    },

    /** Anything else, at a moment. */
    then(moment: DemoMoment | Date, run: (at: string) => Promise<unknown>): void {
      const at = moment instanceof Date ? moment.toISOString() : times.at(...moment)
      timeline.later(at, () => run(at))
    },
    as,
    next,
  }
  story.step([told.arrivedDaysAgo - 1, '09:05'], 'count-in', 'Counted twice, photographed')
  return story
}

export type CaseStory = ReturnType<typeof createCaseTeller>
