import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import type { Animals } from '../animals/index.ts'
import type { Documents } from '../documents/index.ts'
import type { FacilityService } from '../facility/index.ts'
import type { OpenOrder, Orders } from '../orders/index.ts'
import { readRecentDoses, readWantedSeconds } from './dose-work.reads.ts'
import { readCalculations, readOrderNumberOfDose } from './administrations.reads.ts'
import { administrationRoutes } from './administrations.routes.ts'
import type { AdministrationsQueries } from './administrations.routes.ts'
import { createAdministrationsService } from './administrations.service.ts'
import { BathStopRow, DoseCalculation, DoseRow } from './dose.entity.ts'
import { readDoseSituation } from './dose-situation.ts'
import { findDueDoses } from './due-doses.ts'
import { presentSheet } from './present-sheet.ts'
import { createSheetPrinter, sheetPrintKind } from './print-sheet.ts'

export type { RecentDoseRow } from './dose-work.reads.ts'
export const administrationEntities = [DoseCalculation, DoseRow, BathStopRow]

export function createAdministrations(
  parts: Parts & {
    facility: FacilityService
    orders: Orders
    animals: Animals
    documents: Documents
    pdf: PdfPool
  },
) {
  const { dataSource, orders, animals, clock } = parts
  const outside = { dataSource, orders, animals, queries: orders.queries }
  const service = createAdministrationsService({
    ...parts,
    ...outside,
    calculations: (versionId, key, tx) => readCalculations(tx.manager, versionId, key),
  })
  const now = () => clock.now()
  /** A dose as it stands, worked out for the lot in the hand once there is a first calculation. */
  async function read(number: string, key: string) {
    const situation = await readDoseSituation(outside, number, key, now())
    const calculations = await readCalculations(dataSource, situation.versionId, key)
    const lotId = calculations.find((one) => one.part === 'first')?.lot_id ?? null
    if (lotId === null || lotId === situation.content.fields.lotId) return { situation, calculations }
    return { situation: await readDoseSituation(outside, number, key, now(), { lotId }), calculations }
  }
  const print = createSheetPrinter({ ...parts, documents: parts.documents.service, read })
  parts.documents.prints.answerFor(sheetPrintKind, orders.answerForPrint)
  const due = { dataSource, queries: orders.queries, now }
  const queries: AdministrationsQueries = {
    async sheet(number, key, blind, actor) {
      return presentSheet({ ...(await read(number, key)), blind, actor, now: now().toISOString() })
    },
    async sheetOfDose(doseId, actor) {
      const found = await readOrderNumberOfDose(dataSource, doseId)
      if (!found) throw new Problem('not-found')
      return queries.sheet(found.number, found.key, false, actor)
    },
    due: (query) => findDueDoses(due, query),
  }
  /** What the worklist asks. */
  const work = {
    dueDoses: (until: string, orders: readonly OpenOrder[]) => findDueDoses(due, { until }, orders),
    recentDoses: (since: Date) => readRecentDoses(dataSource, since),
    wantedSeconds: (since: Date) => readWantedSeconds(dataSource, since),
  }
  return { service, queries, work, routes: administrationRoutes(service, queries, print) }
}

export type Administrations = ReturnType<typeof createAdministrations>
