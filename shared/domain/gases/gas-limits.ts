/**
 * Where the equations of dissolved oxygen hold.
 *
 * @source benson-krause-1984 (0–40 °C, salinity 0–40, 0.5–1.1 atm) · standard-atmosphere (troposphere, up to 11,000 m);
 *         project-default: down to 500 m below the sea, where the lowest dry land lies
 */
export const gasLimits = {
  leastTemperatureC: 0,
  mostTemperatureC: 40,
  leastSalinityPss78: 0,
  mostSalinityPss78: 40,
  /** 0.5 atm. */
  leastPressureKPa: 50.6625,
  /** 1.1 atm. */
  mostPressureKPa: 111.4575,
  leastAltitudeM: -500,
  mostAltitudeM: 11_000,
} as const

/** One atmosphere: the pressure that a percentage "of saturation at sea level" refers to, kPa. */
export const standardAtmosphereKPa = 101.325
