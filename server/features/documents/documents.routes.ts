import type { Request, Response } from 'express'
import * as contracts from '../../../shared/contracts/documents.contract.ts'
import { UploadFields } from '../../../shared/contracts/documents.contract.ts'
import type { AttachedDocument, CheckedFingerprint } from '../../../shared/contracts/documents.contract.ts'
import { createFileReceiver } from '../../platform/files/receive-file.ts'
import type { ReceivedFile } from '../../platform/files/receive-file.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { route } from '../../platform/http/route.ts'
import type { FileReply, Route } from '../../platform/http/route.ts'
import { fieldProblems } from '../../platform/http/field-problems.ts'
import type { DocumentsService } from './documents.service.ts'

export interface DocumentQueries {
  document(id: string): Promise<AttachedDocument>
  file(context: RequestContext, id: string): Promise<FileReply>
  check(typed: string): Promise<CheckedFingerprint>
}

const receive = createFileReceiver()

/** Reads an upload: the file and its fields, with everything that is wrong with the fields at once. */
export async function receiveUpload(
  req: Request,
  res: Response,
): Promise<{ given: UploadFields; file: ReceivedFile }> {
  const { file, fields } = await receive(req, res)
  const parsed = UploadFields.safeParse(fields)
  if (!parsed.success) throw new Problem('bad-input', { errors: fieldProblems(parsed.error, fields) })
  return { given: parsed.data, file }
}

export function documentRoutes(service: DocumentsService, queries: DocumentQueries): Route[] {
  return [
    route(contracts.getDocumentFile, ({ params, context }) => queries.file(context, params.id)),
    route(contracts.voidDocument, async ({ params, body, context }) => {
      await service.voidDocument(context, params.id, body.reason)
      return queries.document(params.id)
    }),
    route(contracts.checkFingerprint, ({ params }) => queries.check(params.fingerprint)),
  ]
}
