/** How far a phone's clock may be ahead: later times are refused when they are entered. The one rule for fast clocks. */
export const clockSkewMs = 5 * 60_000

/**
 * SQL that says whether a row of a ledger had happened by an instant. A row that was written down by then counts even
 * when its own time lies a little ahead: it was entered on a device whose clock is fast, and it has happened.
 *
 * @param row   alias of the table, with `happened_at` and `recorded_at`
 * @param param placeholder of the instant, such as `$1`
 */
export function happenedBy(row: string, param: string): string {
  return `(${row}.happened_at <= ${param}::timestamptz
    OR (${row}.happened_at <= ${param}::timestamptz + interval '${String(clockSkewMs)} ms' AND ${row}.recorded_at <= ${param}::timestamptz))`
}

/** The time of such a row as seen from the instant: never ahead of it. */
export function timeSeenAt(row: { happened_at: Date; recorded_at: Date }, at: Date): Date {
  const isSkewed =
    row.happened_at > at && row.recorded_at <= at && row.happened_at.getTime() <= at.getTime() + clockSkewMs
  return isSkewed ? at : row.happened_at
}
