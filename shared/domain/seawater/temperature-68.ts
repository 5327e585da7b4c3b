/**
 * A temperature on the scale of 1968 (IPTS-68), on which the formulas of sea water were fitted; thermometers and
 * meters read the scale of 1990 (ITS-90). Left out, it costs 0.006 °C at 25 °C, 0.005 in salinity.
 *
 * @param temperatureC °C, ITS-90
 * @returns °C, IPTS-68
 * @source  unesco-44
 */
export function temperature68(temperatureC: number): number {
  return 1.00024 * temperatureC
}

/**
 * The way back: a temperature that a formula of 1968 gave, as a thermometer of today shows it.
 *
 * @param temperature68C °C, IPTS-68
 * @returns °C, ITS-90
 * @source  unesco-44
 */
export function temperature90(temperature68C: number): number {
  return temperature68C / 1.00024
}
