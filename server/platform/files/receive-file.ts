import type { Request, RequestHandler, Response } from 'express'
import multer, { MulterError } from 'multer'
import { fileLimitMB } from '../../../shared/domain/documents/file-limit.ts'
import { fileWords } from '../../../shared/messages/files.ts'
import { Problem } from '../http/problem.ts'
import { findUnwritableText } from '../http/unwritable-text.ts'
import { originalName } from './original-name.ts'
import { keptTypes, sniffType, type KeptType } from './sniff-type.ts'

const bytesPerMB = 1024 * 1024

export interface ReceivedFile {
  content: Uint8Array
  /** As the person named it, without folders. */
  name: string
  /** By its content, whatever the form claimed. */
  type: KeptType
  bytes: number
}

export interface ReceivedForm {
  file: ReceivedFile
  /** The form's other fields, as text, still to be parsed by the contract. */
  fields: Readonly<Record<string, unknown>>
}

export interface ReceiveOptions {
  /** The form's field that carries the file. */
  field?: string
  limitMB?: number
  allowed?: readonly KeptType[]
}

/**
 * Reads one file of a multipart form into memory.
 *
 * @throws Problem file-missing, file-too-large, file-type-not-allowed; bad-input for a form that cannot be read
 */
export function createFileReceiver(
  options: ReceiveOptions = {},
): (req: Request, res: Response) => Promise<ReceivedForm> {
  const { field = 'file', limitMB = fileLimitMB, allowed = keptTypes } = options
  const read: RequestHandler = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: limitMB * bytesPerMB, files: 1, fields: 50, fieldSize: 256 * 1024, headerPairs: 100 },
  }).single(field)
  return (req, res) =>
    new Promise((resolve, reject) => {
      read(req, res, (error: unknown) => {
        if (error) return reject(asProblem(error, field, limitMB))
        try {
          const fields = { ...(req.body as object | undefined) }
          const errors = findUnwritableText(fields, '')
          if (errors.length > 0) throw new Problem('bad-input', { errors, detail: errors[0]?.detail ?? '' })
          resolve({ file: accepted(req.file, field, allowed), fields })
        } catch (refusal) {
          reject(refusal)
        }
      })
    })
}

function accepted(
  sent: Express.Multer.File | undefined,
  field: string,
  allowed: readonly KeptType[],
): ReceivedFile {
  const refused = (code: 'file-missing' | 'file-type-not-allowed', detail: string) =>
    new Problem(code, { detail, errors: [{ pointer: `/${field}`, detail }] })
  if (!sent) throw refused('file-missing', fileWords.missing)
  if (sent.size === 0) throw refused('file-missing', fileWords.empty)
  const name = originalName(sent.originalname)
  const type = sniffType(sent.buffer, name)
  if (!type || !allowed.includes(type))
    throw refused('file-type-not-allowed', fileWords.typeNotAllowed({ name }))
  return { content: sent.buffer, name, type, bytes: sent.size }
}

/** Faults of the form itself are the sender's; anything else stays what it is. */
function asProblem(error: unknown, field: string, limitMB: number): unknown {
  const pointer = `/${field}`
  if (!(error instanceof MulterError)) {
    // The form's parser throws plain errors for a missing boundary or an end that never came.
    const broken =
      error instanceof Error && /multipart|boundary|unexpected end|malformed/i.test(error.message)
    return broken ? new Problem('bad-input', { detail: fileWords.brokenForm }) : error
  }
  if (error.code === 'LIMIT_FILE_SIZE') {
    const detail = fileWords.tooLarge({ limit: `${limitMB}\u00a0MB` })
    return new Problem('file-too-large', { detail, errors: [{ pointer, detail }] })
  }
  return new Problem('bad-input', {
    detail: fileWords.oneAtATime,
    errors: [{ pointer, detail: fileWords.oneAtATime }],
  })
}
