import { Problem } from '../../platform/http/problem.ts'
import type { Db } from '../../platform/database/db.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Parts } from '../../platform/parts.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import type { Animals } from '../animals/index.ts'
import type { Documents } from '../documents/index.ts'
import type { FacilityService } from '../facility/index.ts'
import { readKnown } from '../orders/index.ts'
import type { OpenOrder, Orders } from '../orders/index.ts'
import type { SigningService } from '../signing/index.ts'
import { readRecentDoses, readWantedSeconds } from './dose-work.reads.ts'
import { readCalculations, readOrderNumberOfDose } from './administrations.reads.ts'
import { administrationRoutes } from './administrations.routes.ts'
import type { AdministrationsQueries } from './administrations.routes.ts'
import { createAdministrationsService } from './administrations.service.ts'
import { DoseOverrideRow } from './dose-override.entity.ts'
import { BathStopRow, DoseCalculation, DoseRow, DoseVoidRow } from './dose.entity.ts'
import { readDoseSituation } from './dose-situation.ts'
import type { DoseSituation } from './dose-situation.ts'
import { findDueDoses } from './due-doses.ts'
import { isShownEarly, presentSheet, showsAmount } from './present-sheet.ts'
import { firstOf, workedOutBlind } from './second-person.ts'
import type { Calculations } from './second-person.ts'
import { createSheetPrinter, sheetPrintKind } from './print-sheet.ts'

export type { RecentDoseRow } from './dose-work.reads.ts'
export { endOfBath } from './running-baths.ts'
export { verifyOverrides } from './signed-overrides.ts'
export const administrationEntities = [DoseCalculation, DoseRow, BathStopRow, DoseVoidRow, DoseOverrideRow]

async function calculationsOf(
  db: Db,
  { row, versionId, planned }: Pick<DoseSituation, 'row' | 'versionId' | 'planned'>,
): Promise<Calculations> {
  const { key } = planned
  if (versionId === null) return { all: [], seenBy: [] }
  const all = await readCalculations(db, versionId, key)
  const { knowers } = await readKnown(db, [row.id])
  // whoever made a first calculation under this version is told by the calculations themselves
  const seenBy = (knowers.get(row.id) ?? []).filter(
    (one) => (one.key === null || one.key === key) && one.firstOf !== versionId,
  )
  return { all, seenBy: seenBy.map(({ personId }) => personId) }
}

export function createAdministrations(
  parts: Parts & {
    facility: FacilityService
    orders: Orders
    animals: Animals
    documents: Documents
    pdf: PdfPool
    publicUrl: string
    signing: SigningService
  },
) {
  const { dataSource, orders, animals, clock, signing } = parts
  const outside = { dataSource, orders, animals, signing, queries: orders.queries }
  const service = createAdministrationsService({
    ...parts,
    ...outside,
    calculations: (of, tx) => calculationsOf(tx.manager, of),
  })
  const now = () => clock.now()
  /**
   * A dose as it stands, worked out and judged for the lot in the hand: the one that somebody chose, else that of the
   * first calculation. A lot of another product is none to judge by; giving from it is refused.
   */
  async function read(number: string, key: string, chosen: string | null) {
    const situation = await readDoseSituation(outside, number, key, now())
    const calculations = await calculationsOf(dataSource, situation)
    const isOfProduct = situation.product?.lots.some(({ id }) => id === chosen) ?? false
    const lotId = (isOfProduct ? chosen : null) ?? firstOf(calculations)?.lot_id ?? null
    if (lotId === null || lotId === situation.content.fields.lotId) return { situation, calculations }
    return { situation: await readDoseSituation(outside, number, key, now(), { lotId }), calculations }
  }
  /**
   * The sheet for somebody. Whoever is shown the amount before the two calculations agree is remembered, for the other
   * doses to come as well, also those of another order for this drug and water: they have the same one. Whoever worked it out blind themselves has earned it.
   */
  async function sheetFor(
    context: RequestContext,
    number: string,
    key: string,
    blind: boolean,
    lotId?: string,
  ) {
    const found = await read(number, key, lotId ?? null)
    const { actor } = context
    const { versionId, row } = found.situation
    // a dose with a record is to come again where that is struck out
    const isRecorded = found.situation.records.some((record) => record.dose_key === key)
    const elsewhere = (await orders.queries.amountsToNote(number, actor))
      .map((one) =>
        one.orderId === row.id && !isRecorded
          ? { ...one, keys: one.keys.filter((other) => other !== key) }
          : one,
      )
      .filter(({ keys }) => keys.length > 0)
    const mayBeSecondElsewhere = elsewhere.length > 0
    const sheet = presentSheet({ ...found, blind, mayBeSecondElsewhere, actor, now: now().toISOString() })
    const own = versionId === null ? [] : [{ orderId: row.id, number, versionId, keys: [key] }]
    const learnt = [
      ...(isShownEarly(sheet, found.calculations) ? own : []),
      ...(showsAmount(sheet) && !workedOutBlind(found.calculations, actor) ? elsewhere : []),
    ]
    if (learnt.length > 0) await service.noteSeen(context, learnt)
    return { ...found, sheet }
  }
  const print = createSheetPrinter({ ...parts, documents: parts.documents.service, sheetFor })
  parts.documents.prints.answerFor(sheetPrintKind, orders.answerForPrint)
  const due = { dataSource, queries: orders.queries, now }
  const queries: AdministrationsQueries = {
    sheet: async (number, key, blind, context, lotId) =>
      (await sheetFor(context, number, key, blind, lotId)).sheet,
    /** Left without amounts: whoever ends a bath or strikes a record out may be the second person of the next. */
    async sheetOfDose(doseId, context) {
      const found = await readOrderNumberOfDose(dataSource, doseId)
      if (!found) throw new Problem('not-found')
      return queries.sheet(found.number, found.key, true, context)
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
