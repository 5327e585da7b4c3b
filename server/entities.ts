import { animalEntities } from './features/animals/index.ts'
import { enclosureEntities } from './features/enclosures/index.ts'
import { facilityEntities } from './features/facility/index.ts'
import { formularyEntities } from './features/formulary/index.ts'
import { peopleEntities } from './features/people/index.ts'
import { signingEntities } from './features/signing/index.ts'
import { waterEntities } from './features/water/index.ts'

/** Every mapped table; each feature names its own. */
export const entities = [
  // one a line
  ...facilityEntities,
  ...peopleEntities,
  ...signingEntities,
  ...enclosureEntities,
  ...waterEntities,
  ...formularyEntities,
  ...animalEntities,
]
