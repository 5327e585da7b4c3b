import { parentPort } from 'node:worker_threads'
import type { PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'
import { setMessageLocale, type MessageLocale } from '../../../shared/messages/define-messages.ts'
import { drawDocument } from './draw-document.ts'
import { PdfRenderError, type PdfRenderErrorCode } from './pdf-render-error.ts'

export interface PdfJob {
  id: number
  model: PdfDocumentModel
  locale: MessageLocale
}

export type PdfAnswer =
  | { id: number; bytes: Uint8Array }
  | { id: number; refused: { code: PdfRenderErrorCode; params: Readonly<Record<string, string>> } }
  | { id: number; failed: string }

async function answer(job: PdfJob): Promise<PdfAnswer> {
  try {
    setMessageLocale(job.locale)
    return { id: job.id, bytes: await drawDocument(job.model) }
  } catch (error) {
    if (error instanceof PdfRenderError)
      return { id: job.id, refused: { code: error.code, params: error.params } }
    return { id: job.id, failed: error instanceof Error ? (error.stack ?? error.message) : String(error) }
  }
}

parentPort?.on('message', (job: PdfJob) => {
  void answer(job).then((done) =>
    parentPort?.postMessage(done, 'bytes' in done ? [done.bytes.buffer as ArrayBuffer] : []),
  )
})
