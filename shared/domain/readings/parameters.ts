import type { Dimension } from '../units/unit-table.ts'

/** What one measured parameter of the water is, and what an instrument can possibly show. */
export interface ParameterDefinition {
  /** Dimensions it may be entered in. Salinity has two that no factor joins: practical salinity and g/kg. */
  dimensions: readonly Dimension[]
  /** What no water of a living collection shows, canonical unit of the first dimension; beyond it is a slip. */
  least: number
  most: number
  /** Places of the canonical unit that its instruments usually show; for ranges and axes, never for readings. */
  places: number
  /** Kits that end at a lowest mark give "below 0.05". */
  mayBeBelow: boolean
}

/** Scales of pH. NBS is what hobby and laboratory electrodes are calibrated to; "total" is used in sea water. */
export const phScales = ['nbs', 'total'] as const
export type PhScale = (typeof phScales)[number]

/**
 * The parameters that are measured in water. Nitrogen is always as N, copper says whether it is free or total.
 *
 * @source project-default: the limits only stop slips of the keyboard; what is wanted of a water is its range
 */
export const parameterTable = {
  temperature: { dimensions: ['temperature'], least: -3, most: 60, places: 1, mayBeBelow: false },
  salinity: {
    dimensions: ['practicalSalinity', 'absoluteSalinity'],
    least: 0,
    most: 120,
    places: 1,
    mayBeBelow: true,
  },
  'dissolved-oxygen': {
    dimensions: ['massConcentration'],
    least: 0,
    most: 45,
    places: 1,
    mayBeBelow: true,
  },
  'oxygen-saturation': { dimensions: ['percentage'], least: 0, most: 400, places: 0, mayBeBelow: false },
  ph: { dimensions: ['ph'], least: 0, most: 14, places: 2, mayBeBelow: false },
  'total-ammonia-n': {
    dimensions: ['massConcentration'],
    least: 0,
    most: 200,
    places: 2,
    mayBeBelow: true,
  },
  'nitrite-n': { dimensions: ['massConcentration'], least: 0, most: 200, places: 2, mayBeBelow: true },
  'nitrate-n': { dimensions: ['massConcentration'], least: 0, most: 2000, places: 1, mayBeBelow: true },
  alkalinity: { dimensions: ['alkalinity'], least: 0, most: 50, places: 2, mayBeBelow: true },
  'copper-free': { dimensions: ['massConcentration'], least: 0, most: 10, places: 2, mayBeBelow: true },
  'copper-total': { dimensions: ['massConcentration'], least: 0, most: 20, places: 2, mayBeBelow: true },
  'specific-gravity': {
    dimensions: ['specificGravity'],
    least: 0.98,
    most: 1.2,
    places: 4,
    mayBeBelow: false,
  },
  conductivity: { dimensions: ['conductivity'], least: 0, most: 200, places: 2, mayBeBelow: true },
  hardness: { dimensions: ['alkalinity'], least: 0, most: 300, places: 2, mayBeBelow: true },
  'phosphate-p': { dimensions: ['massConcentration'], least: 0, most: 200, places: 2, mayBeBelow: true },
  'total-chlorine': { dimensions: ['massConcentration'], least: 0, most: 50, places: 2, mayBeBelow: true },
  'oxidation-reduction': {
    dimensions: ['potential'],
    least: -1000,
    most: 1500,
    places: 0,
    mayBeBelow: false,
  },
} as const satisfies Record<string, ParameterDefinition>

export type ReadingParameter = keyof typeof parameterTable
export const readingParameters = Object.keys(parameterTable) as [ReadingParameter, ...ReadingParameter[]]

/** The definition of a parameter, as the general type. */
export function parameterOf(parameter: ReadingParameter): ParameterDefinition {
  return parameterTable[parameter]
}
