import type { Parts } from '../../platform/parts.ts'
import type { Animals } from '../animals/index.ts'
import type { Documents } from '../documents/index.ts'
import type { Mail } from '../../platform/mail/mail.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import type { Enclosures } from '../enclosures/index.ts'
import type { FacilityService } from '../facility/index.ts'
import type { People } from '../people/index.ts'
import type { SigningService } from '../signing/index.ts'
import type { Water } from '../water/index.ts'
import { CaseEventRow, CaseMemberRow, CaseRow, CaseStepRecordRow } from './case.entity.ts'
import { createCaseEventsService } from './case-events.service.ts'
import { createCaseWriter } from './case-writer.ts'
import { readOutsideCases } from './outside-cases.reads.ts'
import { readLastLooksOfCases } from './last-looks.reads.ts'
import { createClearanceService } from './clearance.service.ts'
import { clearanceRoutes } from './clearance.routes.ts'
import { createCasesService } from './cases.service.ts'
import { NoticeActRow, NoticeDeliveryRow, NoticeRow } from './notice.entity.ts'
import {
  ObservationBodiesRow,
  ObservationCaseRow,
  ObservationDeathRow,
  ObservationReviewRow,
  ObservationRow,
  ObservationVoidRow,
} from './observation.entity.ts'
import { ProtocolConfirmationRow, ProtocolRow, ProtocolVersionRow } from './protocol.entity.ts'
import { createBodiesService } from './bodies.service.ts'
import { createNoticesService } from './notices.service.ts'
import { createObservationQueries } from './observations.queries.ts'
import { observationRoutes } from './observations.routes.ts'
import { createObservationsService } from './observations.service.ts'
import { answerForClearance, clearancePrintKind, createClearancePrinter } from './print-clearance.ts'
import { createProtocolsService } from './protocols.service.ts'
import { createQuarantineQueries } from './quarantine.queries.ts'
import { quarantineRoutes } from './quarantine.routes.ts'
import { createTreatmentsService } from './treatments.service.ts'
import { createUnnamedBodies } from './unnamed-bodies.ts'

export { verifySignedEvents } from './verify-signed-events.ts'
export { readSamplesTaken } from './samples.reads.ts'
export type { OutsideCaseRow } from './outside-cases.reads.ts'
export type { TreatmentsService } from './treatments.service.ts'
export type { CaseEventFacts } from './case-event-facts.ts'

export const quarantineEntities = [
  ProtocolRow,
  ProtocolVersionRow,
  ProtocolConfirmationRow,
  CaseRow,
  CaseMemberRow,
  CaseEventRow,
  CaseStepRecordRow,
  ObservationRow,
  ObservationCaseRow,
  ObservationDeathRow,
  ObservationVoidRow,
  ObservationReviewRow,
  ObservationBodiesRow,
  NoticeRow,
  NoticeDeliveryRow,
  NoticeActRow,
]

export function createQuarantine(
  given: Parts & {
    facility: FacilityService
    people: People
    signing: SigningService
    animals: Animals
    water: Water
    enclosures: Enclosures
    documents: Documents
    pdf: PdfPool
    mail: Mail
    publicUrl: string
  },
) {
  const { refuseWhileLocked } = given.people.ownPassword
  const parts = { ...given, refuseWhileLocked, people: given.people.questions, water: given.water.questions }
  const writer = createCaseWriter(parts)
  const unnamed = createUnnamedBodies({ ...parts, writer })
  given.animals.follow(unnamed)
  const cases = createCasesService({ ...parts, writer, unnamed })
  const events = createCaseEventsService({ ...parts, writer })
  const treatments = createTreatmentsService({ ...parts, events })
  const protocols = createProtocolsService(parts)
  const notices = createNoticesService(parts)
  const observations = createObservationsService({ ...parts, writer, notices, unnamed })
  const bodies = createBodiesService({ ...parts, writer, unnamed })
  const queries = createQuarantineQueries(parts)
  const observationQueries = createObservationQueries(parts)
  const clearance = createClearanceService({ ...parts, writer })
  const { service: documents, prints } = given.documents
  const print = createClearancePrinter({ ...parts, documents, queries })
  prints.answerFor(clearancePrintKind, answerForClearance(queries))
  return {
    services: { cases, events, treatments, protocols, observations, bodies, notices, clearance },
    queries,
    /** Prints the certificate of a cleared case. */
    printClearance: print,
    /** Observations, rounds and urgent calls, for screens and the worklist. */
    observationQueries,
    /** When each case was last looked at in each of its enclosures. */
    lastLooks: (since: Date) => readLastLooksOfCases(parts.dataSource, since),
    outsideCases: () => readOutsideCases(parts.dataSource),
    routes: [
      ...quarantineRoutes({ cases, events, protocols, queries, clock: parts.clock }),
      ...clearanceRoutes({ clearance, queries, print, clock: parts.clock }),
      ...observationRoutes({ observations, bodies, notices, queries: observationQueries }),
    ],
    /** Work that runs beside the requests. */
    jobs: { 'send-notice': (payload: { id: string }) => notices.send(payload) },
  }
}

export type Quarantine = ReturnType<typeof createQuarantine>
