import * as contracts from '../../../shared/contracts/facility.contract.ts'
import type { SettingKey } from '../../../shared/domain/settings/settings.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { FacilityService } from './facility.service.ts'

export function facilityRoutes(service: FacilityService): Route[] {
  return [
    route(contracts.listSettings, async () => ({ settings: await service.listSettings() })),
    route(contracts.proposeSetting, async ({ params, body, context }) => {
      const key = params.key as SettingKey
      await service.proposeSetting(context, key, body)
      return service.settingOf(key)
    }),
    route(contracts.confirmSetting, async ({ params, context }) => {
      const key = params.key as SettingKey
      await service.confirmSetting(context, key, params.proposalId)
      return service.settingOf(key)
    }),
  ]
}
