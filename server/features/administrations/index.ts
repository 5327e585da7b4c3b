import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import type { FacilityService } from '../facility/index.ts'
import type { Orders } from '../orders/index.ts'
import { readCalculations, readOrderNumberOfDose } from './administrations.reads.ts'
import { readRecentDoses, readWantedSeconds } from './dose-work.reads.ts'
import { administrationRoutes } from './administrations.routes.ts'
import type { AdministrationsQueries } from './administrations.routes.ts'
import { createAdministrationsService } from './administrations.service.ts'
import { BathStopRow, DoseCalculation, DoseRow } from './dose.entity.ts'
import { readDoseSituation } from './dose-situation.ts'
import { findDueDoses } from './due-doses.ts'
import { presentSheet } from './present-sheet.ts'

export type { RecentDoseRow } from './dose-work.reads.ts'
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
  /** What the worklist asks besides the doses that are due. */
  const work = {
    recentDoses: (since: Date) => readRecentDoses(dataSource, since),
    wantedSeconds: (since: Date) => readWantedSeconds(dataSource, since),
  }
  return { service, queries, work, routes: administrationRoutes(service, queries) }
}

export type Administrations = ReturnType<typeof createAdministrations>
