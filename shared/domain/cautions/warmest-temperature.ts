import { hoursBetween } from '../time/instant-arithmetic.ts'
import type { CautionFacts } from './caution-facts.ts'

/**
 * The highest temperature of the last hours, °C, or null when none was read in them. At a boundary of a label the
 * warmest water counts, not the newest reading: it may have been warmer while nobody looked.
 *
 * @param windowHours true hours before the instant judged, inclusive
 * @source project-default: 4 h
 */
export function warmestTemperatureC(facts: CautionFacts, windowHours: number): number | null {
  const { temperatureC, recentTemperaturesC } = facts.water
  const readings = recentTemperaturesC.state === 'known' ? [...recentTemperaturesC.value] : []
  if (temperatureC.state === 'known' && temperatureC.at !== null)
    readings.push({ value: temperatureC.value, at: temperatureC.at })
  const inside = readings.filter(({ at, value }) => {
    const age = hoursBetween(at, facts.at)
    return Number.isFinite(value) && age >= 0 && age <= windowHours
  })
  return inside.length === 0 ? null : Math.max(...inside.map(({ value }) => value))
}
