import { instantToMs } from '../time/instant-arithmetic.ts'
import type { SharedWaterSpell } from './case-clock.ts'
import type { PreparedCase } from './prepare-cases.ts'

/** Half-open stretch of time in milliseconds. */
export interface Interval {
  fromMs: number
  untilMs: number
}

/** Who shared water with whom, and when; a case that has ended shares with nobody. */
export interface Sharing {
  /** Instants at which cases came to share water, in time order. */
  joins: { atMs: number; spellId: string; caseIds: readonly string[] }[]
  /** The other cases on a case's water at an instant, sorted. */
  partnersAt(caseId: string, ms: number): string[]
  /** When two cases shared water, up to the instant asked about. */
  intervalsBetween(caseId: string, otherId: string): Interval[]
}

/**
 * Turns spells into answers (rule K12). Sharing is transitive: two spells that overlap in a case join all their cases,
 * for as long as both last.
 *
 * @param asOfMs nothing after it has happened
 */
export function buildSharing(
  spells: readonly SharedWaterSpell[],
  cases: readonly PreparedCase[],
  asOfMs: number,
): Sharing {
  const endMs = new Map(
    cases.map((one) => [one.given.caseId, one.ended ? instantToMs(one.ended.at) : Infinity] as const),
  )
  const timed = spells
    .map((spell) => ({
      spellId: spell.spellId,
      caseIds: spell.caseIds.filter((id) => endMs.has(id)),
      fromMs: instantToMs(spell.from),
      untilMs: Math.min(spell.until === null ? Infinity : instantToMs(spell.until), asOfMs + 1),
    }))
    .filter((spell) => spell.fromMs < spell.untilMs && spell.caseIds.length > 1)
    .sort((a, b) => a.fromMs - b.fromMs || (a.spellId < b.spellId ? -1 : 1))

  const partnersAt = (caseId: string, ms: number): string[] => {
    const isHere = (id: string) => ms < (endMs.get(id) ?? -Infinity)
    if (!isHere(caseId)) return []
    const now = timed.filter((spell) => spell.fromMs <= ms && ms < spell.untilMs)
    const reached = new Set([caseId])
    const waiting = [caseId]
    for (let id = waiting.pop(); id !== undefined; id = waiting.pop()) {
      for (const spell of now) {
        if (!spell.caseIds.includes(id)) continue
        for (const other of spell.caseIds) {
          if (reached.has(other) || !isHere(other)) continue
          reached.add(other)
          waiting.push(other)
        }
      }
    }
    reached.delete(caseId)
    return [...reached].sort()
  }

  const cuts = [...new Set([...timed.flatMap((spell) => [spell.fromMs, spell.untilMs]), ...endMs.values()])]
    .filter(Number.isFinite)
    .sort((a, b) => a - b)
  const intervalsBetween = (caseId: string, otherId: string): Interval[] => {
    const found: Interval[] = []
    for (const [i, fromMs] of cuts.entries()) {
      const untilMs = cuts[i + 1]
      if (untilMs === undefined || !partnersAt(caseId, fromMs).includes(otherId)) continue
      const last = found.at(-1)
      if (last && last.untilMs === fromMs) last.untilMs = untilMs
      else found.push({ fromMs, untilMs })
    }
    return found
  }
  return {
    joins: timed.map(({ fromMs, spellId, caseIds }) => ({ atMs: fromMs, spellId, caseIds })),
    partnersAt,
    intervalsBetween,
  }
}

/** The parts of the stretch that lie inside any of the others. */
export function intersect(one: Interval, others: readonly Interval[]): Interval[] {
  return others
    .map(({ fromMs, untilMs }) => ({
      fromMs: Math.max(one.fromMs, fromMs),
      untilMs: Math.min(one.untilMs, untilMs),
    }))
    .filter(({ fromMs, untilMs }) => fromMs < untilMs)
}

/** Milliseconds covered by the stretches, each moment counted once. */
export function unionMs(stretches: readonly Interval[]): number {
  let total = 0
  let reached = -Infinity
  for (const { fromMs, untilMs } of [...stretches].sort((a, b) => a.fromMs - b.fromMs)) {
    total += Math.max(0, untilMs - Math.max(fromMs, reached))
    reached = Math.max(reached, untilMs)
  }
  return total
}
