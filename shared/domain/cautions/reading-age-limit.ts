import type { ReadingParameter } from '../readings/parameters.ts'
import { readingAgeLimits as limits } from './rules/r31-stale-readings.ts'

/**
 * How old a reading may be and still count, in minutes: as the start of a bath asks for it, and for what no bath asks
 * for the longest of those.
 *
 * @source project-default (P)
 */
export function readingAgeLimitMinutes(parameter: ReadingParameter): number {
  switch (parameter) {
    case 'dissolved-oxygen':
    case 'oxygen-saturation':
      return limits.oxygenMinutes.default
    case 'temperature':
    case 'ph':
      return limits.temperatureAndPhHours.default * 60
    case 'alkalinity':
    case 'hardness':
      return limits.alkalinityAndHardnessHours.default * 60
    default:
      return limits.copperHours.default * 60
  }
}
