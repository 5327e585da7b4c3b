import { type Instant, MS_PER_HOUR, isInstant } from '../time/instant.ts'
import { instantToMs, msToInstant } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'

/** A free-copper reading of the water under treatment. */
export interface CopperReading {
  readAt: Instant
  freeCopperMgPerL: number
}

export interface CopperCourseQuestion {
  readings: readonly CopperReading[]
  /** The level to hold, mg free Cu per litre. */
  targetMgPerL: number
  /** End of the ramp: readings before it do not start the count. */
  rampEndedAt: Instant
  /** Length to hold without interruption, true hours: 21 days = 504. */
  courseHours: number
  /** A low spell longer than this starts the count again; default 12. */
  toleratedLowHours?: number
  /** Without a reading for so long, the level counts as low from then on; default 24. */
  readingGapHours?: number
  asOf: Instant
}

export interface CopperLowSpell {
  from: Instant
  /** The reading that ended it; null while it lasts. */
  until: Instant | null
  hours: number
  because: 'low-reading' | 'no-reading'
  restartsCount: boolean
}

export interface CopperCourse {
  /**
   * `not-started`: no reading at target since the ramp · `running` · `interrupted`: low for longer than is tolerated,
   * the count starts again at the next reading at target · `complete`.
   */
  state: 'not-started' | 'running' | 'interrupted' | 'complete'
  countStartedAt: Instant | null
  /** When the hours are full if nothing else happens; null when not running. */
  endsAt: Instant | null
  restartedAt: Instant[]
  lowSpells: CopperLowSpell[]
}

export type CopperCourseRefusal =
  'not-an-instant' | 'target-not-positive' | 'hours-not-positive' | 'reading-not-a-number'

/**
 * The count of hours that copper was held (rule K17).
 *
 * It starts at the first reading at or above the target after the ramp. A low spell runs from the first low reading to
 * the next reading at or above the target; an addition of copper does not end it, only a reading does. Without a
 * reading for 24 h the level counts as low from the 24th hour. A spell of more than 12 h starts the count again at the
 * reading that ended it; exactly 12 h does not. Lengths are true hours, so a clock change moves the wall-clock end.
 *
 * @refuses not-an-instant | target-not-positive | hours-not-positive | reading-not-a-number
 * @source project-default (K17); the course length is the protocol's
 */
export function computeCopperCourse(
  question: CopperCourseQuestion,
): Result<CopperCourse, CopperCourseRefusal> {
  const {
    targetMgPerL,
    courseHours,
    toleratedLowHours = 12,
    readingGapHours = 24,
    asOf,
    rampEndedAt,
  } = question
  for (const [field, at] of Object.entries({ asOf, rampEndedAt }))
    if (!isInstant(at)) return refuse('not-an-instant', field)
  if (!(targetMgPerL > 0) || !Number.isFinite(targetMgPerL))
    return refuse('target-not-positive', 'targetMgPerL')
  for (const [field, hours] of Object.entries({ courseHours, toleratedLowHours, readingGapHours }))
    if (!(hours > 0) || !Number.isFinite(hours)) return refuse('hours-not-positive', field)
  for (const { readAt, freeCopperMgPerL } of question.readings) {
    if (!isInstant(readAt)) return refuse('not-an-instant', 'readings')
    if (!Number.isFinite(freeCopperMgPerL) || freeCopperMgPerL < 0)
      return refuse('reading-not-a-number', 'readings', { readAt })
  }

  const asOfMs = instantToMs(asOf)
  const gapMs = readingGapHours * MS_PER_HOUR
  const toleratedMs = toleratedLowHours * MS_PER_HOUR
  const courseMs = courseHours * MS_PER_HOUR
  const readings = question.readings
    .map(({ readAt, freeCopperMgPerL }) => ({
      ms: instantToMs(readAt),
      isLow: freeCopperMgPerL < targetMgPerL,
    }))
    .filter(({ ms }) => ms >= instantToMs(rampEndedAt) && ms <= asOfMs)
    // Of two readings at one instant the low one counts first, so that the better one can end its spell.
    .sort((a, b) => a.ms - b.ms || Number(b.isLow) - Number(a.isLow))

  const first = readings.findIndex(({ isLow }) => !isLow)
  const opening = readings[first]
  if (!opening)
    return ok({ state: 'not-started', countStartedAt: null, endsAt: null, restartedAt: [], lowSpells: [] })

  let startMs = opening.ms
  let lastMs = opening.ms
  let low: { fromMs: number; because: CopperLowSpell['because'] } | null = null
  const lowSpells: CopperLowSpell[] = []
  const restartedAt: Instant[] = []
  const end = (untilMs: number, ended: boolean) => {
    if (!low) return
    const lengthMs = untilMs - low.fromMs
    lowSpells.push({
      from: msToInstant(low.fromMs),
      until: ended ? msToInstant(untilMs) : null,
      hours: lengthMs / MS_PER_HOUR,
      because: low.because,
      restartsCount: lengthMs > toleratedMs,
    })
  }

  for (const { ms, isLow } of readings.slice(first + 1)) {
    const endMs = startMs + courseMs
    const gapFromMs = lastMs + gapMs
    if (low === null && ms > gapFromMs && gapFromMs < endMs)
      low = { fromMs: gapFromMs, because: 'no-reading' }
    // The hours were full before anything else went low: what comes later no longer matters.
    if (low === null && ms >= endMs) break
    if (isLow) low ??= { fromMs: ms, because: 'low-reading' }
    else if (low) {
      end(ms, true)
      if (lowSpells.at(-1)?.restartsCount) {
        startMs = ms
        restartedAt.push(msToInstant(ms))
      }
      low = null
    }
    lastMs = ms
  }
  const endMs = startMs + courseMs
  if (low === null && lastMs + gapMs < Math.min(asOfMs, endMs))
    low = { fromMs: lastMs + gapMs, because: 'no-reading' }
  const base = { countStartedAt: msToInstant(startMs), restartedAt, lowSpells }
  if (low) {
    end(asOfMs, false)
    if (asOfMs - low.fromMs > toleratedMs) return ok({ ...base, state: 'interrupted', endsAt: null })
    // A tolerated spell at the very end still has to be ended by a reading before the course counts as held.
    return ok({ ...base, state: 'running', endsAt: msToInstant(endMs) })
  }
  return ok({ ...base, state: asOfMs >= endMs ? 'complete' : 'running', endsAt: msToInstant(endMs) })
}
