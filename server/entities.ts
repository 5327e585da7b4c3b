import { facilityEntities } from './features/facility/index.ts'
import { peopleEntities } from './features/people/index.ts'

/** Every mapped table; each feature names its own. */
export const entities = [...facilityEntities, ...peopleEntities]
