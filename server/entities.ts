import { administrationEntities } from './features/administrations/index.ts'
import { orderEntities } from './features/orders/index.ts'
import { acquisitionEntities } from './features/acquisitions/index.ts'
import { animalEntities } from './features/animals/index.ts'
import { enclosureEntities } from './features/enclosures/index.ts'
import { cautionEntities } from './features/cautions/index.ts'
import { counterpartyEntities } from './features/counterparties/index.ts'
import { documentEntities } from './features/documents/index.ts'
import { exportEntities } from './features/exports/index.ts'
import { facilityEntities } from './features/facility/index.ts'
import { formularyEntities } from './features/formulary/index.ts'
import { handoverEntities } from './features/handover/index.ts'
import { peopleEntities } from './features/people/index.ts'
import { permitEntities } from './features/permits/index.ts'
import { quarantineEntities } from './features/quarantine/index.ts'
import { signingEntities } from './features/signing/index.ts'
import { waterEntities } from './features/water/index.ts'
import { SigningLockRow } from './platform/sign-in/signing-lock.entity.ts'

/** Every mapped table; each feature names its own. */
export const entities = [
  ...orderEntities,
  ...administrationEntities,
  // one a line
  ...facilityEntities,
  ...peopleEntities,
  ...signingEntities,
  SigningLockRow,
  ...enclosureEntities,
  ...waterEntities,
  ...formularyEntities,
  ...cautionEntities,
  ...animalEntities,
  ...documentEntities,
  ...counterpartyEntities,
  ...permitEntities,
  ...acquisitionEntities,
  ...exportEntities,
  ...quarantineEntities,
  ...handoverEntities,
]
