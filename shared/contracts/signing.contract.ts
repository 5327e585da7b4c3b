import { z } from 'zod'
import { contract } from './contract.ts'
import { entriesBeside } from '../domain/orders/entries-beside.ts'
import { Instant, LocalDate, RecordId } from './primitives.ts'

/** What a check found wrong with a signed record. */
export const RecordFault = z.object({
  what: z
    .enum(['text', 'whose', 'entries'])
    .describe(
      'The text is not the one signed or is gone; a signature is missing or the text is that of another record; the text is intact and what is stored beside it is not what it says',
    ),
  entries: z.array(z.enum(entriesBeside)).describe('What is stored beside the text and differs from it'),
})
export type RecordFault = z.infer<typeof RecordFault>

const SignedLicence = z.object({
  jurisdiction: z.string().describe('Who granted the licence'),
  number: z.string().describe('Licence number'),
  validUntil: LocalDate.describe('Last day of validity, as known at signing'),
})

/** The licence a signer chooses where several are valid. */
export const ChosenLicence = RecordId.optional().describe(
  'The licence the signer signs under; needed where several are valid today',
)

/** The block that stands under everything that was signed, on screen and on paper. */
export const SignatureBlock = z.object({
  printedName: z.string().describe('Name of the signer as printed'),
  role: z.string().describe('In which role it was signed'),
  licence: SignedLicence.nullable().describe(
    'The licence valid on the day of signing; null where the text cannot be read any more',
  ),
  registration: SignedLicence.nullable().describe(
    'The controlled-substance registration it was signed under; null where none was asked for',
  ),
  meaning: z.string().describe('What the signature means, for example author of this order'),
  signedAt: Instant,
  signedOn: LocalDate.describe('Facility date of signing'),
  zone: z.string().describe('Facility time zone'),
  hash: z.string().describe('SHA-256 of the exact text that was signed'),
  keyId: z.string().describe('Short name of the installation key'),
  state: z
    .enum(['intact', 'broken', 'unknown-key'])
    .describe('Checked now: intact; broken (see what is wrong); key not known here'),
  fault: RecordFault.nullable().describe('What is wrong with a broken one; null of any other'),
})
export type SignatureBlock = z.infer<typeof SignatureBlock>

export const getSigningKey = contract({
  id: 'getSigningKey',
  method: 'get',
  path: '/signing-key',
  action: 'facility.read',
  summary: 'The public half of the key that this installation signs with',
  reply: {
    200: z.object({
      keyId: z.string().describe('Short name of the key'),
      publicKeyPem: z.string().describe('Ed25519 public key, PEM'),
    }),
  },
  problems: [],
})
