import type { Parts } from '../../platform/parts.ts'
import type { Acquisitions } from '../acquisitions/index.ts'
import type { Administrations } from '../administrations/index.ts'
import type { Animals } from '../animals/index.ts'
import type { Enclosures } from '../enclosures/index.ts'
import type { FacilityService } from '../facility/index.ts'
import type { Handover } from '../handover/index.ts'
import type { Orders } from '../orders/index.ts'
import type { People } from '../people/index.ts'
import type { Permits } from '../permits/index.ts'
import type { Quarantine } from '../quarantine/index.ts'
import type { Water } from '../water/index.ts'
import { createFindQueries } from './find.queries.ts'
import { createTodayQueries } from './today.queries.ts'
import { todayRoutes } from './today.routes.ts'

/** Today and Find keep nothing of their own: they ask every other feature. */
export interface TodayParts extends Parts {
  facility: FacilityService
  people: People
  enclosures: Enclosures
  water: Water
  animals: Animals
  quarantine: Quarantine
  permits: Permits
  acquisitions: Acquisitions
  orders: Orders
  administrations: Administrations
  handover: Handover
}

export function createToday(parts: TodayParts) {
  const queries = createTodayQueries(parts)
  return { queries, routes: todayRoutes(queries, createFindQueries(parts)) }
}

export type Today = ReturnType<typeof createToday>
