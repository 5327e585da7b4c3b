import { csvStream } from '../../platform/csv/csv-stream.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import type { CounterpartiesService } from '../counterparties/index.ts'
import type { Documents } from '../documents/index.ts'
import type { FacilityService } from '../facility/index.ts'
import {
  PermitRecord,
  PermitTaxon,
  PermitUseExplanation,
  PermitUseRecord,
  PermitVoid,
} from './permit.entity.ts'
import { permitsCsv } from './permits-csv.ts'
import { presentPermit, presentPermitRow } from './permits.present.ts'
import { readPermit, readPermits, readPermitUses } from './permits.reads.ts'
import { permitRoutes } from './permits.routes.ts'
import type { PermitQueries } from './permits.routes.ts'
import { createPermitsService } from './permits.service.ts'

export type { PermitsService, UseGiven } from './permits.service.ts'
export const permitEntities = [PermitRecord, PermitTaxon, PermitVoid, PermitUseRecord, PermitUseExplanation]

/** Rows of a list that go into one file. */
const everyRow = { offset: 0, limit: 100_000 }

export function createPermits(
  parts: Parts & { facility: FacilityService; counterparties: CounterpartiesService; documents: Documents },
) {
  const { dataSource, facility, clock, documents } = parts
  const service = createPermitsService(parts)
  const today = () => facility.dateOf(clock.now())

  async function rowOf(number: string) {
    const row = await readPermit(dataSource, number)
    if (!row) throw new Problem('not-found')
    return row
  }
  const queries: PermitQueries = {
    async permit(context, number) {
      const row = await rowOf(number)
      const uses = await readPermitUses(dataSource, row.id)
      const papers = await documents.documentsOf('permit', [row.id])
      return presentPermit(row, {
        today: await today(),
        uses,
        papers: papers.map(({ document }) => document),
        roles: context.actor.roles,
      })
    },
    async permits(filter) {
      const on = await today()
      const { rows, total } = await readPermits(dataSource, on, filter)
      return { rows: rows.map((row) => presentPermitRow(row, on)), total }
    },
    async csv(filter, guarded) {
      const { rows } = await queries.permits({ ...filter, ...everyRow })
      const body = csvStream(permitsCsv(rows, guarded ? 'guarded' : 'literal'))
      return { contentType: 'text/csv; charset=utf-8', fileName: `permits-${await today()}.csv`, body }
    },
    async parent(number) {
      const row = await rowOf(number)
      const label = `${row.number}, ${row.authority} ${row.permit_number}`
      return {
        kind: 'permit',
        id: row.id,
        label,
        readAction: 'register.read',
        writeAction: 'register.manage',
      }
    },
    document: documents.documentOf,
  }
  return { service, queries, routes: permitRoutes(service, documents.service, queries) }
}

export type Permits = ReturnType<typeof createPermits>
