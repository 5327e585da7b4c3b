import { csvStream } from '../../platform/csv/csv-stream.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import type { Animals } from '../animals/index.ts'
import type { CounterpartiesService } from '../counterparties/index.ts'
import type { Documents } from '../documents/index.ts'
import type { FacilityService } from '../facility/index.ts'
import type { PermitsService } from '../permits/index.ts'
import { acquisitionRoutes } from './acquisitions.routes.ts'
import type { TransactionQueries } from './acquisitions.routes.ts'
import type { WithdrawalHoldOf } from './check-residues.ts'
import { createAcquisitionsService } from './acquisitions.service.ts'
import { readUnfinishedTransactions } from './papers-missing.reads.ts'
import { readTransactions } from './transaction-list.reads.ts'
import { TransactionLine, TransactionRecord, TransactionVoid } from './transaction.entity.ts'
import { transactionsCsv } from './transactions-csv.ts'
import { presentTransaction, presentTransactionRow } from './transactions.present.ts'
import { readLines, readTransaction, readTransactionsOf, readUses } from './transactions.reads.ts'

export type { AcquisitionGiven, DispositionGiven } from './check-given.ts'
export type { AcquisitionsService } from './acquisitions.service.ts'
export type { LineReadRow, TransactionReadRow, UseReadRow } from './transactions.reads.ts'
export const acquisitionEntities = [TransactionRecord, TransactionLine, TransactionVoid]

/** Rows of a list that go into one file. */
const everyRow = { offset: 0, limit: 100_000 }

export function createAcquisitions(
  parts: Parts & {
    facility: FacilityService
    counterparties: CounterpartiesService
    permits: PermitsService
    animals: Animals
    documents: Documents
    withdrawalHold: WithdrawalHoldOf
  },
) {
  const { dataSource, documents, facility, clock } = parts
  const service = createAcquisitionsService(parts)

  async function rowOf(number: string) {
    const row = await readTransaction(dataSource, number)
    if (!row) throw new Problem('not-found')
    return row
  }
  const queries: TransactionQueries = {
    async transaction(context, number) {
      const row = await rowOf(number)
      const [lines, uses, papers] = await Promise.all([
        readLines(dataSource, [row.id]),
        readUses(dataSource, [row.id]),
        documents.documentsOf('transaction', [row.id]),
      ])
      const { roles } = context.actor
      return presentTransaction(row, { lines, uses, documents: papers.map((paper) => paper.document), roles })
    },
    async transactions(filter) {
      const { rows, total } = await readTransactions(dataSource, filter)
      return { rows: rows.map(presentTransactionRow), total }
    },
    async csv(filter, guarded) {
      const { rows } = await readTransactions(dataSource, { ...filter, ...everyRow })
      const lines = await readLines(
        dataSource,
        rows.map((row) => row.id),
      )
      const body = csvStream(transactionsCsv(rows, lines, guarded ? 'guarded' : 'literal'))
      const fileName = `transactions-${await facility.dateOf(clock.now())}.csv`
      return { contentType: 'text/csv; charset=utf-8', fileName, body }
    },
    async parent(number) {
      const row = await rowOf(number)
      return {
        kind: 'transaction',
        id: row.id,
        label: row.number,
        readAction: 'register.read',
        writeAction: 'register.manage',
      }
    },
    document: documents.documentOf,
  }
  return {
    service,
    queries,
    /** Transactions without papers or with open permit marks, for the worklist. */
    unfinished: (limit: number) => readUnfinishedTransactions(dataSource, limit),
    /** Every transaction of an animal or group with its own lines and permit uses, voided ones too. */
    async custodyOf(animalId: string) {
      const transactions = await readTransactionsOf(dataSource, animalId)
      const ids = transactions.map((row) => row.id)
      const lines = (await readLines(dataSource, ids)).filter((line) => line.animal_id === animalId)
      const own = new Set(lines.map((line) => line.id))
      const uses = (await readUses(dataSource, ids)).filter((use) => own.has(use.line_id))
      return { transactions, lines, uses }
    },
    routes: acquisitionRoutes(service, documents.service, queries),
  }
}

export type Acquisitions = ReturnType<typeof createAcquisitions>
