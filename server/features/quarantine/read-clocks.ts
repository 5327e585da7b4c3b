import type { WaterMap } from '../../../shared/domain/connections/water-map.ts'
import type { CaseClock, SharedWaterSpell } from '../../../shared/domain/quarantine/case-clock.ts'
import type { ClockEvent } from '../../../shared/domain/quarantine/clock-event.ts'
import { computeClocks } from '../../../shared/domain/quarantine/compute-clocks.ts'
import { listSharedWaterSpells } from '../../../shared/domain/quarantine/list-shared-water-spells.ts'
import { listWaterEntries } from '../../../shared/domain/quarantine/list-water-entries.ts'
import { nameInSentence } from '../../../shared/domain/taxa/name-in-sentence.ts'
import type { Result } from '../../../shared/domain/result.ts'
import type { Zone } from '../../../shared/domain/time/instant.ts'
import type { Db } from '../../platform/database/db.ts'
import { readTogether } from '../../platform/database/read-together.ts'
import type { WaterQuestions } from '../water/index.ts'
import * as reads from './case-facts.reads.ts'
import { clockEventsOf } from './clock-events.ts'

/** Ids, or all that run, or all there ever were. */
export type WantedCases = readonly string[] | 'running' | 'all'

export interface ClockParts {
  water: WaterQuestions
}

const span = (stay: { from_at: Date; until_at: Date | null }) => ({
  from: stay.from_at.toISOString(),
  until: stay.until_at?.toISOString() ?? null,
})

/** Everything about some cases, and the clocks computed from it. Cases on one water come together. */
export interface ClockFacts {
  cases: reads.CaseReadRow[]
  batches: reads.BatchReadRow[]
  stays: reads.BatchStayReadRow[]
  events: reads.CaseEventReadRow[]
  deaths: (reads.DeathReadRow & { case_id: string })[]
  countChanges: reads.CountChangeReadRow[]
  places: Map<string, reads.PlaceReadRow>
  clocks: Map<string, CaseClock>
  asOf: Date
  zone: Zone
}

/** A ledger that the rules cannot read is a bug or a hand in the database, never an answer. */
function sound<T>(result: Result<T>): T {
  if (result.ok) return result.value
  throw new Error(
    `The clocks cannot be read: ${result.refusal.code} ${JSON.stringify(result.refusal.params ?? {})}`,
  )
}

/**
 * The batches of cases: parts taken out of a group belong to it, wherever they are put, and parts of these.
 *
 * @param splits in order of time
 */
function withParts(
  members: readonly Omit<reads.BatchReadRow, 'from_split'>[],
  splits: readonly reads.SplitReadRow[],
): reads.BatchReadRow[] {
  const batches: reads.BatchReadRow[] = members.map((row) => ({ ...row, from_split: false }))
  for (const { split_from_id, happened_at, ...part } of splits)
    for (const { case_id, member_id, joined_at, joined_on } of batches.filter(
      (row) => row.animal_id === split_from_id && happened_at >= row.joined_at,
    ))
      if (!batches.some((row) => row.case_id === case_id && row.animal_id === part.animal_id))
        batches.push({ ...part, case_id, member_id, joined_at, joined_on, from_split: true })
  return batches
}

/** The stays of a batch from its joining until the end of its case. */
function clip(
  cases: readonly reads.CaseReadRow[],
  batches: readonly reads.BatchReadRow[],
  stays: readonly Omit<reads.BatchStayReadRow, 'case_id'>[],
): reads.BatchStayReadRow[] {
  const byAnimal = new Map<string, Omit<reads.BatchStayReadRow, 'case_id'>[]>()
  for (const stay of stays) byAnimal.set(stay.animal_id, [...(byAnimal.get(stay.animal_id) ?? []), stay])
  const endOf = new Map(cases.map((one) => [one.id, one.ended_at]))
  return batches.flatMap((row) => {
    const end = endOf.get(row.case_id) ?? null
    return (byAnimal.get(row.animal_id) ?? []).flatMap((stay) => {
      const from_at = stay.from_at < row.joined_at ? row.joined_at : stay.from_at
      const until_at = end !== null && (stay.until_at === null || stay.until_at > end) ? end : stay.until_at
      return until_at !== null && until_at <= from_at
        ? []
        : [{ ...stay, case_id: row.case_id, from_at, until_at }]
    })
  })
}

/** The wanted cases and, again and again, those that ever shared water with one of them. */
function withPartners(
  wanted: readonly string[],
  spells: readonly { caseIds: readonly string[] }[],
): Set<string> {
  const reached = new Set(wanted)
  for (let before = -1; before !== reached.size;) {
    before = reached.size
    for (const { caseIds } of spells)
      if (caseIds.some((id) => reached.has(id))) for (const id of caseIds) reached.add(id)
  }
  return reached
}

interface Component {
  cases: reads.CaseReadRow[]
  batches: reads.BatchReadRow[]
  stays: reads.BatchStayReadRow[]
  spells: SharedWaterSpell[]
  map: WaterMap
  places: reads.PlaceReadRow[]
}

/** Which cases belong together because they shared water, with their batches and where these were. */
async function readComponent(parts: ClockParts, db: Db, wanted: WantedCases, asOf: Date): Promise<Component> {
  const {
    cases: allCases,
    members,
    splits,
    map,
    places,
  } = await readTogether(db, {
    cases: () => reads.readCases(db),
    members: () => reads.readMembers(db),
    splits: () => reads.readSplits(db),
    map: () => parts.water.waterMap(db),
    places: () => reads.readPlaces(db),
  })
  const allBatches = withParts(members, splits)
  const animalIds = [...new Set(allBatches.map((row) => row.animal_id))]
  const allStays = clip(allCases, allBatches, await reads.readStaysOf(db, animalIds))
  const inWater = allStays.flatMap((stay) =>
    stay.water_body_id === null
      ? []
      : [{ ...span(stay), caseId: stay.case_id, waterBodyId: stay.water_body_id }],
  )
  const spells = sound(listSharedWaterSpells(map, inWater, asOf.toISOString()))
  const running = allCases.filter(({ ended_at }) => ended_at === null)
  const first =
    wanted === 'all' || wanted === 'running'
      ? (wanted === 'all' ? allCases : running).map(({ id }) => id)
      : wanted
  const ids = withPartners(first, spells)
  return {
    cases: allCases.filter(({ id }) => ids.has(id)),
    batches: allBatches.filter((row) => ids.has(row.case_id)),
    stays: allStays.filter((row) => ids.has(row.case_id)),
    spells: spells.filter(({ caseIds }) => caseIds.some((id) => ids.has(id))),
    map,
    places,
  }
}

/**
 * The cases with an animal of theirs in one of these enclosures at an instant, parts of groups included.
 *
 * @param since those too whose animals left only after this, while their case still runs
 */
export async function findCasesIn(
  db: Db,
  enclosureIds: readonly string[],
  at: Date,
  since = at,
): Promise<{ id: string; number: string }[]> {
  const cases = await reads.readCases(db)
  const batches = withParts(await reads.readMembers(db), await reads.readSplits(db))
  const animalIds = [...new Set(batches.map((row) => row.animal_id))]
  const there = clip(cases, batches, await reads.readStaysOf(db, animalIds)).filter(
    (stay) =>
      enclosureIds.includes(stay.enclosure_id) &&
      stay.from_at <= at &&
      (stay.until_at === null || stay.until_at > since),
  )
  const ids = new Set(there.map((stay) => stay.case_id))
  return cases
    .filter(({ id, ended_at }) => ids.has(id) && (ended_at === null || ended_at > at))
    .map(({ id, number }) => ({ id, number }))
}

/** The running cases that an animal is or was in, itself or as a part of a group. */
export async function findRunningCasesOf(
  db: Db,
  animalId: string,
): Promise<{ id: string; number: string }[]> {
  const batches = withParts(await reads.readMembers(db), await reads.readSplits(db))
  const ids = new Set(batches.filter((row) => row.animal_id === animalId).map((row) => row.case_id))
  if (ids.size === 0) return []
  return (await reads.readCases(db, [...ids])).filter(({ ended_at }) => ended_at === null)
}

/** Where the batch of a case was, and until when, while the case ran. */
export async function readStaysOfCase(db: Db, caseId: string): Promise<reads.BatchStayReadRow[]> {
  const batches = withParts(await reads.readMembers(db), await reads.readSplits(db)).filter(
    (row) => row.case_id === caseId,
  )
  const animalIds = batches.map((row) => row.animal_id)
  return clip(await reads.readCases(db, [caseId]), batches, await reads.readStaysOf(db, animalIds))
}

/** Ids of the cases that share water with these, themselves among them, and of all their animals: what a write locks. */
export async function readLockSet(parts: ClockParts, db: Db, caseIds: readonly string[], asOf: Date) {
  const { cases, batches } = await readComponent(parts, db, caseIds, asOf)
  return {
    caseIds: cases.map(({ id }) => id).sort(),
    animalIds: [...new Set(batches.map((row) => row.animal_id))].sort(),
  }
}

/** Additions to these cases that the ledger of places shows. */
async function readAdditions(
  db: Db,
  { cases, stays, map, places }: Component,
  events: readonly reads.CaseEventReadRow[],
): Promise<ClockEvent[]> {
  const forEntries = cases.map((one) => ({
    caseId: one.id,
    closedAt: closedAtOf(events, one.id)?.toISOString() ?? null,
    endedAt: one.ended_at?.toISOString() ?? null,
    stays: stays
      .filter((row) => row.case_id === one.id)
      .map((row) => ({ ...span(row), animalId: row.animal_id, enclosureId: row.enclosure_id })),
  }))
  const since = forEntries.flatMap(({ closedAt }) => closedAt ?? []).sort()[0]
  if (since === undefined) return []
  const entries = await reads.readEntries(db, new Date(since))
  return sound(
    listWaterEntries(
      map,
      places.map((place) => ({
        enclosureId: place.id,
        waterBodyId: place.water_body_id,
        airSpace: place.air_space,
      })),
      forEntries,
      entries.map((row) => ({
        entryId: row.id,
        animalId: row.animal_id,
        enclosureId: row.enclosure_id,
        fromEnclosureId: row.from_enclosure_id,
        at: row.happened_at.toISOString(),
        quarantineKind: row.quarantine_kind,
        joinsGroup: row.joins_group,
        animalName: nameInSentence(row.common_name),
        animalCount: row.animal_count,
      })),
    ),
  )
}

/** When the last of a batch was said to be in; null while it is open. */
export function closedAtOf(events: readonly reads.CaseEventReadRow[], caseId: string): Date | null {
  return (
    events.find((row) => row.case_id === caseId && row.kind === 'closed' && isLive(row))?.happened_at ?? null
  )
}

/** Whether an entered event stands. */
export function isLive(row: reads.CaseEventReadRow): boolean {
  return row.voided_reason === null && row.kind !== 'voided'
}

/**
 * Reads some cases and computes their clocks as of an instant, together with those on the same water. Nothing of a clock
 * is stored: it follows from events, stays, deaths and valves as they stand in the ledgers now.
 *
 * @param wanted ids; `running` for all that have not ended
 */
export async function readClocks(
  parts: ClockParts,
  db: Db,
  wanted: WantedCases,
  given: { asOf: Date; zone: Zone },
): Promise<ClockFacts> {
  const { asOf, zone } = given
  const component = await readComponent(parts, db, wanted, asOf)
  const { cases, batches, stays, places } = component
  const animalIds = [...new Set(batches.map((row) => row.animal_id))]
  const caseIds = cases.map(({ id }) => id)
  const { events, deathRows, countChanges } = await readTogether(db, {
    events: () => reads.readCaseEvents(db, caseIds),
    deathRows: () => reads.readDeathsOf(db, animalIds),
    countChanges: () => reads.readCountChanges(db, animalIds),
  })
  const deaths = batches.flatMap((row) =>
    deathRows
      .filter((death) => death.animal_id === row.animal_id && death.happened_at >= row.joined_at)
      .map((death) => ({ ...death, case_id: row.case_id })),
  )
  const additions = await readAdditions(db, component, events)
  const clocks = sound(
    computeClocks({
      cases: cases.map((one) => ({
        caseId: one.id,
        quarantineKind: one.quarantine_kind,
        policy: one.content.policy,
      })),
      events: [...clockEventsOf({ cases, batches, events, deaths, countChanges }), ...additions],
      sharedWater: component.spells,
      asOf: asOf.toISOString(),
      zone,
    }),
  )
  return {
    cases,
    batches,
    stays,
    events,
    deaths,
    countChanges,
    places: new Map(places.map((place) => [place.id, place])),
    clocks: new Map(clocks.map((clock) => [clock.caseId, clock])),
    asOf,
    zone,
  }
}
