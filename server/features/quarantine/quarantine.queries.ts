import type { BodyOf, QueryOf, ReplyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/quarantine.contract.ts'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import type { CaseRow } from '../../../shared/contracts/quarantine-primitives.ts'
import type { ProtocolVersion } from '../../../shared/contracts/protocols.contract.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import { plainText } from '../../../shared/domain/plain-text.ts'
import { readsClinical } from '../../../shared/domain/permissions/reads-clinical.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Db } from '../../platform/database/db.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Animals } from '../animals/index.ts'
import type { FacilityService } from '../facility/index.ts'
import type { SigningService } from '../signing/index.ts'
import type { WaterQuestions } from '../water/index.ts'
import { findCaseId, readLooks, readStepRecords } from './case-facts.reads.ts'
import type { CaseReadRow } from './case-facts.reads.ts'
import { presentCase } from './case-detail.present.ts'
import type { CaseWork } from './case-steps.ts'
import { clockOf, presentCaseRow, presentNames } from './cases.present.ts'
import type { Estimates } from './cases.present.ts'
import { isInView, sortBoard, tallyOf } from './board-views.ts'
import { protocolInForce } from './protocol-in-force.ts'
import { presentProtocol } from './protocols.present.ts'
import { readProtocolVersions } from './protocols.reads.ts'
import { isLive, readClocks } from './read-clocks.ts'
import type { ClockFacts, WantedCases } from './read-clocks.ts'
import { readCasesInWater } from './water-cases.ts'
import { withholdFromRow } from './withhold-clinical.ts'
import { mustBeSigned, readSignedEvent } from './read-signed-event.ts'

type Board = ReplyOf<typeof contracts.listCases>
export type BoardQuery = QueryOf<typeof contracts.listCases>
export type OpenGiven = BodyOf<typeof contracts.openCase>

export interface QuarantineQueryParts {
  dataSource: Db
  clock: Clock
  facility: FacilityService
  animals: Animals
  water: WaterQuestions
  signing: SigningService
}

/** What screens ask of quarantine. */
export function createQuarantineQueries(parts: QuarantineQueryParts) {
  const { dataSource: db, clock, facility, animals } = parts

  async function clocksOf(wanted: WantedCases, asOf: Date): Promise<ClockFacts> {
    return readClocks(parts, db, wanted, { asOf, zone: await facility.zone() })
  }

  async function workOf(heads: readonly CaseReadRow[]): Promise<CaseWork> {
    const ids = heads.map(({ id }) => id)
    const [stepRecords, looks] = await Promise.all([readStepRecords(db, ids), readLooks(db, ids)])
    return { stepRecords, looks }
  }

  /** Ranges of the groups in some batches that were last estimated. */
  async function estimatesOf(facts: ClockFacts, heads: readonly CaseReadRow[]): Promise<Estimates> {
    const ids = new Set(heads.map(({ id }) => id))
    const groups = facts.batches.filter((row) => ids.has(row.case_id) && row.form === 'group')
    if (groups.length === 0) return new Map()
    const known = await animals.questions.animalsById(
      groups.map((row) => row.animal_id),
      facts.asOf,
      db,
    )
    return new Map(
      known
        .filter(({ count }) => count.basis === 'estimated')
        .map(({ animalId, count }) => [animalId, { low: count.low, high: count.high }]),
    )
  }

  return {
    /** @param roles of the reader; absent for work that is made inside the server */
    async board(query: BoardQuery, roles?: readonly Role[]): Promise<Board> {
      const asOf = query.asOf ? new Date(query.asOf) : clock.now()
      const view = query.view ?? 'running'
      const facts = await clocksOf('all', asOf)
      const heads = facts.cases.filter((head) => head.happened_at <= asOf)
      const [work, estimates] = await Promise.all([workOf(heads), estimatesOf(facts, heads)])
      const all = heads.map((head) => presentCaseRow(facts, head, work, estimates))
      const word = query.q === undefined ? '' : plainText(query.q)
      const found = all.filter(
        (row) =>
          isInView(row, view) &&
          (!word || wordsOf(row).includes(word)) &&
          (!query.protocol || row.protocolCode === query.protocol) &&
          (!query.boundary || row.boundaries.includes(query.boundary)),
      )
      const sorted = sortBoard(found, query.sort ?? 'clearance', query.direction ?? 'asc')
      const page = pageOf(query)
      const rows = sorted.slice(page.offset, page.offset + page.limit)
      return {
        rows: roles && !readsClinical(roles) ? rows.map(withholdFromRow) : rows,
        total: sorted.length,
        nextCursor: nextCursorOf(page, sorted.length),
        tally: tallyOf(all),
        asOfOn: facilityDateOf(asOf.toISOString(), facts.zone),
        protocols: [...new Set(all.map((row) => row.protocolCode))].sort(),
        boundaries: [...new Set(all.flatMap((row) => row.boundaries))].sort(),
        names: presentNames(facts, heads),
      }
    },

    async caseOf(number: string, roles: readonly Role[], asOfText?: string): Promise<CaseDetail> {
      const id = await findCaseId(db, number)
      if (id === null) throw new Problem('not-found')
      return this.caseById(id, roles, asOfText)
    },

    async caseById(id: string, roles: readonly Role[], asOfText?: string): Promise<CaseDetail> {
      const asOf = asOfText ? new Date(asOfText) : clock.now()
      const facts = await clocksOf([id], asOf)
      const head = facts.cases.find((one) => one.id === id)
      if (!head) throw new Problem('not-found')
      const own = facts.events.filter((row) => row.case_id === id && mustBeSigned(row))
      const signatures = new Map()
      let cleared = null
      for (const event of own) {
        const { block, clearance } = await readSignedEvent(parts.signing, head, event)
        signatures.set(event.id, block)
        if (event.kind === 'cleared')
          cleared = { against: clearance?.unmet.length ?? 0, reason: clearance?.reason ?? null }
      }
      const batch = facts.batches.filter((row) => row.case_id === id).map((row) => row.animal_id)
      const protocol = protocolInForce(facts, head)
      const [version] = await readProtocolVersions(db, { id: protocol.versionId })
      return presentCase(facts, head, {
        work: await workOf([head]),
        estimates: await estimatesOf(facts, [head]),
        openDiscrepancies: (await animals.questions.openDiscrepanciesOf(batch, db)).length,
        protocolConfirmed: version?.confirmed_at != null,
        signatures,
        cleared,
        roles,
      })
    },

    /** The signed clearance of a case, checked now, with where the case stands; null when it was not cleared. */
    async sealedClearance(number: string) {
      const id = await findCaseId(db, number)
      if (id === null) throw new Problem('not-found')
      const facts = await clocksOf([id], clock.now())
      const head = facts.cases.find((one) => one.id === id)
      const event = facts.events.find((row) => row.case_id === id && row.kind === 'cleared' && isLive(row))
      if (!head || !event) return null
      const { block, clearance } = await readSignedEvent(parts.signing, head, event)
      return { caseId: id, block, clearance, status: clockOf(facts, head).status }
    },

    /** Running cases in the water of an enclosure now. */
    casesInWater: (enclosureId: string) => readCasesInWater(parts, db, enclosureId, clock.now()),

    async protocols(): Promise<ProtocolVersion[]> {
      return (await readProtocolVersions(db)).map(presentProtocol)
    },

    async protocol(id: string): Promise<ProtocolVersion> {
      const [row] = await readProtocolVersions(db, { id })
      if (!row) throw new Problem('not-found')
      return presentProtocol(row)
    },
  }
}

const wordsOf = (row: CaseRow) => plainText([row.number, row.name, ...row.enclosures].join(' '))

export type QuarantineQueries = ReturnType<typeof createQuarantineQueries>
