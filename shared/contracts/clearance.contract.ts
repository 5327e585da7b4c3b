import { z } from 'zod'
import { contract } from './contract.ts'
import { LocalDate, Reason } from './primitives.ts'
import { caseParams, CaseDetail } from './quarantine.contract.ts'
import { ChosenLicence } from './signing.contract.ts'

export const clearCase = contract({
  id: 'clearCase',
  method: 'post',
  path: '/cases/:number/clearance',
  action: 'case.clear',
  summary: 'Clear the batch from quarantine, signed; against unmet conditions only with a reason',
  params: caseParams,
  body: z.strictObject({
    licenceId: ChosenLicence,
    password: z.string().min(1).max(200).describe('Password of the signer, again'),
    /** What the signer saw; when it has changed meanwhile nothing is signed. */
    expectedUnmet: z.array(z.string().max(60)).max(60).describe('Codes of the unmet conditions on screen'),
    expectedEarliestOn: LocalDate.nullable()
      .optional()
      .describe('Earliest clearance on screen; when given and another now, nothing is signed'),
    reason: Reason.optional().describe('Why it is cleared against unmet conditions'),
  }),
  reply: { 200: CaseDetail },
  problems: [
    'not-found',
    'case-ended',
    'not-clearable',
    'reason-needed',
    'stale-version',
    'discrepancy-open',
    'licence-not-valid',
    'licence-not-chosen',
    'password-wrong',
    'sign-in-locked',
  ],
  idempotent: 'by-key',
})

export const getCertificate = contract({
  id: 'getCertificate',
  method: 'get',
  path: '/cases/:number/certificate.pdf',
  action: 'register.read',
  summary: 'The clearance certificate as it was signed',
  params: caseParams,
  reply: { 200: z.string().describe('PDF') },
  produces: 'pdf',
  problems: ['not-found', 'broken-record'],
})
