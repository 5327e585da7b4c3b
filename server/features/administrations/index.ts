import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import type { FacilityService } from '../facility/index.ts'
import type { Orders } from '../orders/index.ts'
import { readCalculations, readOrderNumberOfDose } from './administrations.reads.ts'
import { administrationRoutes } from './administrations.routes.ts'
import type { AdministrationsQueries } from './administrations.routes.ts'
import { createAdministrationsService } from './administrations.service.ts'
import { BathStopRow, DoseCalculation, DoseRow } from './dose.entity.ts'
import { readDoseSituation } from './dose-situation.ts'
import { findDueDoses } from './due-doses.ts'
import { presentSheet } from './present-sheet.ts'

export const administrationEntities = [DoseCalculation, DoseRow, BathStopRow]

export function createAdministrations(parts: Parts & { facility: FacilityService; orders: Orders }) {
  const { dataSource, orders, clock } = parts
  const outside = { dataSource, orders, queries: orders.queries }
  const service = createAdministrationsService({
    ...parts,
    ...outside,
    calculations: (versionId, key, tx) => readCalculations(tx.manager, versionId, key),
  })
  const queries: AdministrationsQueries = {
    async sheet(number, key, blind, actor) {
      const situation = await readDoseSituation(outside, number, key, clock.now())
      const calculations = await readCalculations(dataSource, situation.versionId, key)
      return presentSheet(situation, calculations, blind, actor)
    },
    async sheetOfDose(doseId, actor) {
      const found = await readOrderNumberOfDose(dataSource, doseId)
      if (!found) throw new Problem('not-found')
      return queries.sheet(found.number, found.key, false, actor)
    },
    due: (query) => findDueDoses({ dataSource, queries: orders.queries, now: () => clock.now() }, query),
  }
  return { service, queries, routes: administrationRoutes(service, queries) }
}
