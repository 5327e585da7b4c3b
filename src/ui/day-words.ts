const month = new Intl.DateTimeFormat('en-US', { month: 'short', timeZone: 'UTC' })
const weekday = new Intl.DateTimeFormat('en-US', { weekday: 'short', timeZone: 'UTC' })

const utc = (date: string) => new Date(`${date}T00:00:00Z`)

/** "14 May" of a facility date. */
export function shortDay(date: string): string {
  return `${utc(date).getUTCDate()}\u00a0${month.format(utc(date))}`
}

/** "14 May 2026" of a facility date. */
export function fullDay(date: string): string {
  return `${shortDay(date)}\u00a0${utc(date).getUTCFullYear()}`
}

/** "Thu 14 May" of a facility date. */
export function longDay(date: string): string {
  return `${weekday.format(utc(date))}\u00a0${shortDay(date)}`
}
