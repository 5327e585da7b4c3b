import type { AgentUse, CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { known, unknown } from '../../../shared/domain/cautions/fact.ts'
import type { WaterSourceSpell } from '../../../shared/domain/connections/list-water-sources.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { doseWindow } from '../../../shared/domain/schedule/dose-window.ts'
import type { Db } from '../../platform/database/db.ts'
import type { WaterQuestions } from '../water/index.ts'
import {
  daysRemembered,
  readAgentUses,
  readCarriedAgents,
  readDosesOfGoneVersions,
  readFirstDoseThatMatters,
  readGivenInLast24h,
} from './agent-history.reads.ts'
import type { AgentUseRow, CarriedAgentRow } from './agent-history.reads.ts'
import { courseEndedAt } from './course-ended.ts'

const hourMs = 3_600_000
const dayMs = 24 * hourMs
/** A single dose has the window of a daily one. */
const hoursOfOneDose = 24

/** The water asked about: an enclosure, and those that share its water now. */
interface WaterAsked {
  enclosureId: string
  enclosureIds: readonly string[]
  /** What is to be given; null while nothing is chosen. */
  agent: AgentCode | null
  at: Date
}

/**
 * What is in a water, was, or is ordered for it: orders into the enclosures that share it now, and doses whose agent came
 * with the water, wherever that was when they went in.
 */
export async function readAgentHistory(
  waterQuestions: WaterQuestions,
  { enclosureId, enclosureIds, agent, at }: WaterAsked,
  { exceptOrderId = null }: { exceptOrderId?: string | null },
  db: Db,
): Promise<Pick<CautionFacts['history'], 'agentUses' | 'givenInLast24hMgPerL'>> {
  const ordered = await readAgentUses(db, enclosureIds, at, exceptOrderId)
  const first = await readFirstDoseThatMatters(db, at)
  const dayBefore = new Date(at.getTime() - dayMs)
  const since = first && first < dayBefore ? first : dayBefore
  const sources = first ? await waterQuestions.waterSources(enclosureId, since, at, db) : []
  const carried = await readCarriedAgents(db, sources, at, exceptOrderId)
  const given = agent && (await readGivenInLast24h(db, sources, agent, at))
  const untold = await readDosesOfGoneVersions(db, sources, at)
  const isListed = (row: CarriedAgentRow) =>
    ordered.some((one) => one.number === row.number && one.agent === row.agent)
  const uses = [
    ...ordered.map((row) => orderedUse(row, at)),
    ...carried.filter((row) => !isListed(row)).map((row) => carriedUse(row, sources, at)),
  ]
  return {
    agentUses: untold.length > 0 ? unknown() : known(uses, at.toISOString(), 'the orders'),
    givenInLast24hMgPerL:
      given && !given.unclear && !untold.some((givenAt) => givenAt > dayBefore)
        ? known(given.totalMgPerL, at.toISOString(), 'the doses recorded here')
        : unknown(),
  }
}

/** Whether what was done to the water of an enclosure at an instant was done to the water asked about as well. */
function reachesHere(sources: readonly WaterSourceSpell[], enclosureId: string, at: number): boolean {
  const spell = sources.findLast(({ from }) => Date.parse(from) <= at)
  return spell?.enclosureIds.includes(enclosureId) ?? false
}

/**
 * What came with the water, from an order for another one: nothing more of it is to come. An end that was recorded when
 * the two waters were parted already took nothing out of this one, where nobody records one: it is remembered for days.
 */
function carriedUse(row: CarriedAgentRow, sources: readonly WaterSourceSpell[], at: Date): AgentUse {
  const { contact_minutes: minutes, given } = row
  const ends = given.map((dose) => {
    const begun = Date.parse(dose.at)
    const planned = minutes === null ? null : begun + minutes * 60_000
    const end = dose.ended === null ? planned : Date.parse(dose.ended)
    return end === null || reachesHere(sources, dose.enclosureId, end) ? end : begun + daysRemembered * dayMs
  })
  const until = ends.includes(null) ? null : new Date(Math.max(...ends.map((end) => end ?? 0)))
  return {
    agent: row.agent as AgentCode,
    orderNumber: row.number,
    state: until !== null && until <= at ? 'ended' : 'running',
    from: new Date(given.at(-1)?.at ?? at).toISOString(),
    until: until?.toISOString() ?? null,
  }
}

function orderedUse(row: AgentUseRow, at: Date): AgentUse {
  const until = usedUntil(row)
  const ended = until !== null && until <= at
  return {
    agent: row.agent as AgentCode,
    orderNumber: row.number,
    state: ended ? 'ended' : row.last_given_at !== null ? 'running' : 'ordered',
    from: (row.last_given_at ?? row.starts_at).toISOString(),
    until: until?.toISOString() ?? null,
  }
}

/** Until when an order puts its agent into the water; null while nobody can tell. */
function usedUntil(row: AgentUseRow): Date | null {
  const { contact_minutes: minutes, interval_hours: interval, last_given_at: last } = row
  if (last === null) {
    if (row.discontinued_at) return row.discontinued_at
    // the window of the last dose has closed, and nothing was given: nothing is left in the water
    const { lateHours } = doseWindow(interval ?? hoursOfOneDose)
    const hours = (interval ?? 0) * (row.doses - 1) + lateHours + (minutes ?? 0) / 60
    const closesAt = new Date(row.starts_at.getTime() + hours * hourMs)
    return row.ends_at && row.ends_at > closesAt ? row.ends_at : closesAt
  }
  const over = courseEndedAt({ ...row, discontinued: row.discontinued_at !== null })
  if (over) return over
  // left in the water: until somebody records that it is out
  if (minutes === null) return null
  if (row.discontinued_at) return row.discontinued_at
  const lastEnds = new Date(last.getTime() + minutes * 60_000)
  return row.ends_at && row.ends_at > lastEnds ? row.ends_at : lastEnds
}
