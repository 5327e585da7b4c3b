import { z } from 'zod'
import { contract } from './contract.ts'
import { Instant, LocalDate } from './primitives.ts'

/** The block that stands under everything that was signed, on screen and on paper. */
export const SignatureBlock = z.object({
  printedName: z.string().describe('Name of the signer as printed'),
  role: z.string().describe('In which role it was signed'),
  licence: z
    .object({
      jurisdiction: z.string().describe('Who granted the licence'),
      number: z.string().describe('Licence number'),
      validUntil: LocalDate.describe('Last day of validity, as known at signing'),
    })
    .nullable()
    .describe('The licence valid on the day of signing; null where the text cannot be read any more'),
  meaning: z.string().describe('What the signature means, for example author of this order'),
  signedAt: Instant,
  signedOn: LocalDate.describe('Facility date of signing'),
  zone: z.string().describe('Facility time zone'),
  hash: z.string().describe('SHA-256 of the exact text that was signed'),
  keyId: z.string().describe('Short name of the installation key'),
  state: z
    .enum(['intact', 'broken', 'unknown-key'])
    .describe('Checked now: intact; broken (text and signature do not fit); key not known here'),
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
