import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { QueryClient } from '@tanstack/react-query'
import {
  attachTransactionDocument,
  recordAcquisition,
  recordDisposition,
  voidTransaction,
} from '../../../shared/contracts/acquisitions.contract.ts'
import type { Transaction } from '../../../shared/contracts/acquisitions.contract.ts'
import type { NewAcquisition, NewDisposition } from '../../../shared/contracts/acquisition-bodies.ts'
import { api } from '../../lib/api-client.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { sendPaper } from '../documents/index.ts'
import type { PaperGiven } from '../documents/index.ts'

/** Animals came or went: lists, permits, histories and animals are read again. */
function readAgain(client: QueryClient) {
  return Promise.all(
    [['transactions'], ['permits'], ['counterparties'], ['history'], ['animals']].map((queryKey) =>
      client.invalidateQueries({ queryKey }),
    ),
  )
}

/** A transaction that is recorded, and the papers that could not be attached to it yet, each with why. */
export interface Recorded {
  transaction: Transaction
  left: { paper: PaperGiven; says: string }[]
}

/** Attaches papers one after the other; what is refused is given back, and may be sent again under the same id. */
async function attachAll(transaction: Transaction, papers: readonly PaperGiven[]): Promise<Recorded> {
  const left: Recorded['left'] = []
  for (const paper of papers) {
    try {
      await sendPaper({ contract: attachTransactionDocument, params: { number: transaction.number } }, paper)
    } catch (error) {
      if (!isProblem(error)) throw error
      left.push({ paper, says: error.says })
    }
  }
  return { transaction, left }
}

export function useRecordAcquisition() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: async (given: { body: NewAcquisition; papers: readonly PaperGiven[] }) =>
      attachAll(await api(recordAcquisition, { body: given.body, patienceMs: 30_000 }), given.papers),
    onSuccess: () => readAgain(client),
  })
}

export function useRecordDisposition() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: async (given: { body: NewDisposition; papers: readonly PaperGiven[] }) =>
      attachAll(await api(recordDisposition, { body: given.body, patienceMs: 30_000 }), given.papers),
    onSuccess: () => readAgain(client),
  })
}

/** Sends again the papers that are not attached yet. */
export function useAttachLeft() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: ({ transaction, left }: Recorded) =>
      attachAll(
        transaction,
        left.map(({ paper }) => paper),
      ),
    onSuccess: () => readAgain(client),
  })
}

export function useVoidTransaction(number: string) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: ({ reason, key }: { reason: string; key: string }) =>
      api(voidTransaction, { params: { number }, body: { reason }, key }),
    onSuccess: () => readAgain(client),
  })
}
