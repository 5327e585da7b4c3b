import { waterLimits } from '../water/water-limits.ts'

/**
 * Where disinfection is reckoned with at all; beyond, a figure is taken for a slip.
 *
 * @source project-default · baffling factors: epa-contact-time, from memory
 */
export const disinfectionLimits = {
  mostResidualMgPerL: 10_000,
  mostMinutes: 1_000_000,
  mostFlowLPerMin: waterLimits.mostLitres,
  leastBaffling: 0.1,
  mostBaffling: 1,
  mostOzoneGPerH: 1_000_000,
  mostOzoneMgPerL: 1000,
} as const
