import { useMutation, useQueryClient } from '@tanstack/react-query'
import { voidDocument } from '../../../shared/contracts/documents.contract.ts'
import type { attachPermitDocument } from '../../../shared/contracts/permits.contract.ts'
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

type AttachContract = typeof attachPermitDocument | typeof attachTransactionDocument

/** Sends one paper to the record it belongs to. */
export function sendPaper(of: AttachContract, number: string, paper: PaperGiven) {
  const form = new FormData()
  form.set('id', paper.id)
  form.set('title', paper.title)
  form.set('kind', paper.kind)
  // last, so that the fields are read before the bytes
  if (paper.file) form.set('file', paper.file)
  return api(of, { params: { number }, body: form, patienceMs: 120_000 })
}

/** Attaches a paper to a record and reads the record again. */
export function useAttachPaper(of: AttachContract, number: string, readAgain: readonly string[]) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (paper: PaperGiven) => sendPaper(of, number, paper),
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
