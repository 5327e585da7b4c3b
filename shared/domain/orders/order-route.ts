/**
 * The ways in which a treatment reaches an animal: through its water, by needle, into its mouth, with its feed, or on
 * its skin. A dip is an immersion in a treatment vessel, and so are sedation and anaesthesia in water.
 */
export const orderRoutes = ['immersion', 'injection', 'by-mouth', 'in-feed', 'on-skin'] as const
export type OrderRoute = (typeof orderRoutes)[number]

/** Every route but the water: the amount goes by the weight of the animal, and each animal has its own. */
export const routesByWeight = ['injection', 'by-mouth', 'on-skin'] as const satisfies readonly OrderRoute[]
export type RouteByWeight = (typeof routesByWeight)[number]

/** Where a needle goes in. */
export const injectionPlaces = ['muscle', 'body-cavity', 'under-skin', 'vein'] as const
export type InjectionPlace = (typeof injectionPlaces)[number]
