/** How far from its planned time a dose may be given, in true hours, both ends included. */
export interface DoseWindow {
  earlyHours: number
  lateHours: number
}

/**
 * The window around a planned dose: 6 h either way for a dose every 24 h, a fifth of the interval for any other.
 *
 * @param intervalHours true hours between doses, above 0
 * @source project-default (R28)
 */
export function doseWindow(intervalHours: number): DoseWindow {
  const hours = intervalHours === 24 ? 6 : intervalHours * 0.2
  return { earlyHours: hours, lateHours: hours }
}
