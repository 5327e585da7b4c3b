/** Conductivity of sea water of salinity 35 at 15 °C (IPTS-68) at the surface, mS/cm. */
export const standardConductivityMSPerCm = 42.914

/** R at the surface: a conductivity relative to that of the standard. @source unesco-44 */
export function ratioToStandard(conductivityMSPerCm: number): number {
  return conductivityMSPerCm / standardConductivityMSPerCm
}

const a = [0.008, -0.1692, 25.3851, 14.0941, -7.0261, 2.7081] as const
const b = [0.0005, -0.0056, -0.0066, -0.0375, 0.0636, -0.0144] as const

/**
 * r_t: how the conductivity of sea water of salinity 35 changes with temperature, relative to 15 °C.
 *
 * @param temperature68C °C, IPTS-68, −2…40
 * @returns a ratio, 1 at 15 °C
 * @source  unesco-44 eq. 3
 */
export function temperatureRatio(temperature68C: number): number {
  const t = temperature68C
  return 0.6766097 + t * (2.00564e-2 + t * (1.104259e-4 + t * (-6.9698e-7 + t * 1.0031e-9)))
}

/**
 * R_p: how pressure raises the conductivity.
 *
 * @param conductivityRatio R, above 0
 * @param temperature68C    °C, IPTS-68
 * @param pressureDbar      above that of the air, dbar
 * @returns a ratio, 1 at the surface
 * @source  unesco-44 eq. 4
 */
export function pressureRatio(
  conductivityRatio: number,
  temperature68C: number,
  pressureDbar: number,
): number {
  const t = temperature68C
  const p = pressureDbar
  const above = p * (2.07e-5 + p * (-6.37e-10 + p * 3.989e-15))
  return 1 + above / (1 + t * (3.426e-2 + t * 4.464e-4) + (4.215e-1 - 3.107e-3 * t) * conductivityRatio)
}

/**
 * R_t: the conductivity relative to that of sea water of salinity 35 at the same temperature and at the surface.
 *
 * @returns R / (R_p × r_t)
 * @source  unesco-44 eq. 5
 */
export function ratioAtTemperature(
  conductivityRatio: number,
  temperature68C: number,
  pressureDbar: number,
): number {
  const byPressure = pressureRatio(conductivityRatio, temperature68C, pressureDbar)
  return conductivityRatio / (byPressure * temperatureRatio(temperature68C))
}

/** f: the weight of the b terms away from 15 °C, (t − 15) / (1 + 0.0162 (t − 15)), °C. */
export function temperatureFactor(temperature68C: number): number {
  return (temperature68C - 15) / (1 + 0.0162 * (temperature68C - 15))
}

/**
 * What is taken off a salinity below 2: the extension to low salinities.
 *
 * It does not vanish at 2, so that the salinity steps there: by 0.0004 at −2 °C, 0.00001 at 15 °C, 0.0003 at 40 °C. The
 * library of TEOS-10 stretches the term so that there is no step, and differs by as much just below 2.
 *
 * @param ratio          R_t
 * @param temperature68C °C, IPTS-68
 * @returns in units of practical salinity
 * @source  hill-1986
 */
export function lowSalinityTerm(ratio: number, temperature68C: number): number {
  const x = 400 * ratio
  const y = 100 * ratio
  const root = Math.sqrt(y)
  return a[0] / (1 + 1.5 * x + x * x) + (b[0] * temperatureFactor(temperature68C)) / (1 + root + y + y * root)
}

/** Σ c_i R_t^(i/2). */
function powersOfRoot(coefficients: readonly number[], ratio: number): number {
  const root = Math.sqrt(ratio)
  return coefficients.reduceRight((sum, each) => sum * root + each, 0)
}

/** A practical salinity with what it was made from. */
export interface PracticalSalinitySteps {
  /** r_t. */
  temperatureRatio: number
  /** R_t. */
  ratio: number
  /** √R_t, in whose powers both polynomials are. */
  root: number
  /** Σ a_i R_t^(i/2): the salinity if the water were at 15 °C. */
  atFifteen: number
  /** f. */
  temperatureFactor: number
  /** Σ a_i R_t^(i/2) + f Σ b_i R_t^(i/2). */
  aboveTwo: number
  /** What is taken off that where it is below 2; 0 otherwise. */
  lowSalinityTerm: number
  salinityPss78: number
}

/**
 * Practical salinity of 1978 step by step, where the temperature is on its own scale. It checks nothing: the engines
 * around it do.
 *
 * @param conductivityRatio R = C(S,t,p) / C(35,15,0), above 0
 * @param temperature68C    °C, IPTS-68, −2…40; the scale was fitted up to 35
 * @param pressureDbar      above that of the air, dbar, 0…10,000
 * @source  unesco-44 eqs 1 to 6, below 2 with hill-1986
 */
export function practicalSalinitySteps68(
  conductivityRatio: number,
  temperature68C: number,
  pressureDbar: number,
): PracticalSalinitySteps {
  const ratio = ratioAtTemperature(conductivityRatio, temperature68C, pressureDbar)
  const factor = temperatureFactor(temperature68C)
  const atFifteen = powersOfRoot(a, ratio)
  const aboveTwo = atFifteen + factor * powersOfRoot(b, ratio)
  const taken = aboveTwo < 2 ? lowSalinityTerm(ratio, temperature68C) : 0
  return {
    temperatureRatio: temperatureRatio(temperature68C),
    ratio,
    root: Math.sqrt(ratio),
    atFifteen,
    temperatureFactor: factor,
    aboveTwo,
    lowSalinityTerm: taken,
    salinityPss78: aboveTwo - taken,
  }
}

/**
 * Practical salinity of 1978 where the temperature is on its own scale. Published rows, which give temperatures on that
 * scale, are held against it as they are printed.
 *
 * @param conductivityRatio R = C(S,t,p) / C(35,15,0), above 0
 * @param temperature68C    °C, IPTS-68, −2…40; the scale was fitted up to 35
 * @param pressureDbar      above that of the air, dbar, 0…10,000
 * @returns practical salinity, no unit; a few parts in ten thousand below zero where the water is almost pure
 * @source  unesco-44 eqs 1 to 6, below 2 with hill-1986 · check values pss78.01 to pss78.10
 */
export function practicalSalinity68(
  conductivityRatio: number,
  temperature68C: number,
  pressureDbar: number,
): number {
  return practicalSalinitySteps68(conductivityRatio, temperature68C, pressureDbar).salinityPss78
}

/**
 * The conductivity ratio that has a practical salinity, found by halving; it checks nothing either.
 *
 * @param salinityPss78  0…42
 * @param temperature68C °C, IPTS-68, −2…40
 * @param pressureDbar   above that of the air, dbar, 0…10,000
 * @returns R; within the step of the scale at 2, the ratio of the step
 * @source  unesco-44 · check values pss78inv.01 to pss78inv.09
 */
export function conductivityRatio68(
  salinityPss78: number,
  temperature68C: number,
  pressureDbar: number,
): number {
  // below the lower end the scale turns and rises again; salinity 42 at 40 °C and 10,000 dbar lies below 2
  let [low, high] = [1e-6, 3]
  for (let halving = 0; halving < 200; halving += 1) {
    const middle = (low + high) / 2
    if (middle === low || middle === high) break
    if (practicalSalinity68(middle, temperature68C, pressureDbar) < salinityPss78) low = middle
    else high = middle
  }
  return high
}
