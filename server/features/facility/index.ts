import type { Parts } from '../../platform/parts.ts'
import { readConfirmedValue, readSettingVersions } from './facility.reads.ts'
import { facilityRoutes } from './facility.routes.ts'
import { createFacilityService } from './facility.service.ts'
import { SettingConfirmation, SettingVersion } from './setting.entity.ts'

export type { FacilityService, FactTimes, NumberKind } from './facility.service.ts'
export const facilityEntities = [SettingVersion, SettingConfirmation]

export function createFacility(parts: Parts) {
  const service = createFacilityService({
    ...parts,
    readVersions: (key, tx) => readSettingVersions(tx?.manager ?? parts.dataSource, key),
    readConfirmed: (key, tx) => readConfirmedValue(tx?.manager ?? parts.dataSource, key),
  })
  return { service, routes: facilityRoutes(service) }
}
