import { hoursBetween } from '../time/instant-arithmetic.ts'
import type { CautionFacts } from './caution-facts.ts'

/** Without a reading of the last hours the temperature is not known, however wide the window is set. */
const freshHours = 4

/** The readings that count: those of the window, and the newest always; none when nothing was read within four hours. */
function countedTemperaturesC(facts: CautionFacts, windowHours: number): number[] {
  const { temperatureC, recentTemperaturesC } = facts.water
  const readings = recentTemperaturesC.state === 'known' ? [...recentTemperaturesC.value] : []
  if (temperatureC.state === 'known' && temperatureC.at !== null)
    readings.push({ value: temperatureC.value, at: temperatureC.at })
  const aged = readings
    .map(({ value, at }) => ({ value, hours: hoursBetween(at, facts.at) }))
    .filter(({ value, hours }) => Number.isFinite(value) && hours >= 0)
  const newestHours = Math.min(...aged.map(({ hours }) => hours))
  if (newestHours > freshHours) return []
  return aged.filter(({ hours }) => hours <= windowHours || hours === newestHours).map(({ value }) => value)
}

/**
 * The highest temperature of the last hours, °C, or null when none was read within four. At a boundary of a label the
 * warmest water counts, not the newest reading: it may have been warmer while nobody looked.
 *
 * @param windowHours true hours before the instant judged, inclusive; the newest reading counts always
 * @source project-default: 4 h
 */
export function warmestTemperatureC(facts: CautionFacts, windowHours: number): number | null {
  const counted = countedTemperaturesC(facts, windowHours)
  return counted.length === 0 ? null : Math.max(...counted)
}

/** The lowest temperature of the last hours, °C, for a label that sets a lowest; null when none was read within four. */
export function coldestTemperatureC(facts: CautionFacts, windowHours: number): number | null {
  const counted = countedTemperaturesC(facts, windowHours)
  return counted.length === 0 ? null : Math.min(...counted)
}
