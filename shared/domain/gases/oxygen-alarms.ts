/**
 * Oxygen below which no bath is begun: the figure of the rule before a bath, which a label for ponds names.
 *
 * @source cfr-529-1030; that it holds for every water is project-default
 */
export const oxygenFloorMgPerL = 5

/** Percent of saturation above which gas bubble disease is looked for. @source gas-supersaturation, from memory */
export const mostSaturationPercent = 110
