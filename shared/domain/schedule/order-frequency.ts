/**
 * How often a line of an order is given.
 *
 * `every-hours` counts true hours, except that whole days keep the time of day: a bath at 14:00 stays at 14:00 when the
 * clocks change. `on-days` are offsets from the first dose, at its time of day. `reading-driven` has no plan: each
 * addition follows from a reading, inside signed limits.
 */
export type OrderFrequency =
  | { kind: 'once' }
  | { kind: 'every-hours'; intervalHours: number; doseCount: number }
  | { kind: 'on-days'; days: readonly number[] }
  | { kind: 'reading-driven' }
