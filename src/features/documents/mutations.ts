import { useMutation, useQueryClient } from '@tanstack/react-query'
import { voidDocument } from '../../../shared/contracts/documents.contract.ts'
import type { attachPermitDocument } from '../../../shared/contracts/permits.contract.ts'
import type { attachLicenceDocument } from '../../../shared/contracts/people.contract.ts'
import type { attachTransactionDocument } from '../../../shared/contracts/acquisitions.contract.ts'
import { api } from '../../lib/api-client.ts'

/** A paper to be attached, as a form holds it. */
export interface PaperGiven {
  /** Made once, so that a paper sent twice is attached once. */
  id: string
  title: string
  kind: string
  file: File | null
}

/** The record that a paper belongs to: where it is sent, and which record that is. */
export type PaperParent =
  | {
      contract: typeof attachPermitDocument | typeof attachTransactionDocument
      params: { number: string }
    }
  | { contract: typeof attachLicenceDocument; params: { id: string; licenceId: string } }

/** Sends one paper to the record it belongs to. */
export function sendPaper(parent: PaperParent, paper: PaperGiven) {
  const form = new FormData()
  form.set('id', paper.id)
  form.set('title', paper.title)
  form.set('kind', paper.kind)
  // last, so that the fields are read before the bytes
  if (paper.file) form.set('file', paper.file)
  const sent = { body: form, patienceMs: 120_000 }
  return 'number' in parent.params
    ? api(parent.contract as typeof attachPermitDocument, { params: parent.params, ...sent })
    : api(parent.contract as typeof attachLicenceDocument, { params: parent.params, ...sent })
}

/** Attaches a paper to a record and reads the record again. */
export function useAttachPaper(parent: PaperParent, readAgain: readonly string[]) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (paper: PaperGiven) => sendPaper(parent, paper),
    onSuccess: () => client.invalidateQueries({ queryKey: [...readAgain] }),
  })
}

/** Voids a paper and reads the record it belongs to again. */
export function useVoidPaper(readAgain: readonly string[]) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (given: { id: string; reason: string; key: string }) =>
      api(voidDocument, { params: { id: given.id }, body: { reason: given.reason }, key: given.key }),
    onSuccess: () => client.invalidateQueries({ queryKey: [...readAgain] }),
  })
}
