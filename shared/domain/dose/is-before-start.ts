const minuteMs = 60_000

/** Whether an end lies before the dose went in. Times are typed in whole minutes: the minute of the dose is not before it. */
export const isBeforeStart = (end: string, start: string): boolean =>
  Date.parse(end) < Math.floor(Date.parse(start) / minuteMs) * minuteMs
