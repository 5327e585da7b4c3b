import { z } from 'zod'
import { documentKinds } from '../domain/register/document-kinds.ts'
import { contract } from './contract.ts'
import { Instant, Reason, RecordId } from './primitives.ts'
import { Voided, words } from './register-primitives.ts'

export const DocumentKindName = z.enum(documentKinds).describe('What kind of paper it is')

/** A paper on file: its bytes are kept under their own hash and never change. */
export const AttachedDocument = z.object({
  id: RecordId,
  title: z.string().describe('What the paper is called'),
  kind: DocumentKindName,
  fileName: z.string().describe('Name of the file as it was sent'),
  mediaType: z.string().describe('Type found in the bytes themselves, not the one that was claimed'),
  bytes: z.int().describe('Size in bytes'),
  sha256: z.string().describe('SHA-256 of the bytes, hexadecimal'),
  attachedAt: Instant.describe('When it was attached'),
  attachedBy: z.string().describe('Who attached it'),
  voided: Voided,
})
export type AttachedDocument = z.infer<typeof AttachedDocument>

/** Parts of the form that are sent beside the file, as text. */
export const UploadFields = z.strictObject({
  id: RecordId,
  title: words(200).describe('What the paper is called'),
  kind: DocumentKindName,
})
export type UploadFields = z.infer<typeof UploadFields>

export const getDocumentFile = contract({
  id: 'getDocumentFile',
  method: 'get',
  path: '/documents/:id/file',
  action: 'signed-in',
  summary:
    'The bytes of a paper, exactly as they were sent; who may read the record it belongs to may read it',
  params: z.strictObject({ id: RecordId }),
  reply: { 200: z.null() },
  problems: ['not-found', 'may-not', 'file-missing'],
  produces: 'stream',
})

export const voidDocument = contract({
  id: 'voidDocument',
  method: 'post',
  path: '/documents/:id/void',
  action: 'document.attach',
  summary: 'Void a paper that was attached wrongly; it stays readable',
  params: z.strictObject({ id: RecordId }),
  body: z.strictObject({ reason: Reason }),
  reply: { 200: AttachedDocument },
  problems: ['not-found', 'may-not', 'already-voided'],
  idempotent: 'by-key',
})

export const CheckedPrint = z.object({
  kind: z.string().describe('Kind of document'),
  subject: z.string().describe('What it is about, as people know it'),
  version: z.string().describe('Version of the record that was printed'),
  printedBy: z.string().describe('Who printed it'),
  printedAt: Instant.describe('When it was printed'),
})

export const checkFingerprint = contract({
  id: 'checkFingerprint',
  method: 'get',
  path: '/checks/:fingerprint',
  action: 'signed-in',
  summary: 'Look up the fingerprint on a print: what it is, and whether the record still stands as printed',
  params: z.strictObject({
    fingerprint: z.string().min(1).max(120).describe('At least the first 16 digits, as printed'),
  }),
  reply: {
    200: z.object({
      fingerprint: z.string().describe('The whole fingerprint, SHA-256, hexadecimal'),
      state: z
        .enum(['current', 'changed', 'superseded', 'held', 'discontinued', 'void', 'broken', 'unknown'])
        .describe('Whether the record still stands as printed'),
      now: z.string().nullable().describe('Version of the record now, where it differs'),
      prints: z.array(CheckedPrint).describe('Every print with this fingerprint, the newest first'),
    }),
  },
  problems: ['not-found', 'bad-input', 'fingerprint-not-unique'],
})
export type CheckedFingerprint = z.infer<(typeof checkFingerprint.reply)[200] & z.ZodType>
