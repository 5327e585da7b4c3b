/** A calendar date at the facility, `YYYY-MM-DD`. */
export type LocalDate = string

/**
 * The calendar date at the facility on which an instant falls.
 *
 * @param instant ISO 8601 with an offset or Z
 * @param zone    IANA time zone, for example America/Halifax
 * @returns `YYYY-MM-DD`; a daylight-saving change never gains or loses a day
 */
export function facilityDateOf(instant: string, zone: string): LocalDate {
  const format = new Intl.DateTimeFormat('en-CA', {
    timeZone: zone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  })
  return format.format(new Date(instant))
}
