import { z } from 'zod'
import { licenceClasses } from '../domain/licences/licence-classes.ts'
import { licenceStateNames } from '../domain/licences/licence-state.ts'
import { fileLimitMB } from '../domain/documents/file-limit.ts'
import { contract } from './contract.ts'
import { AttachedDocument, UploadFields } from './documents.contract.ts'
import { LicenceWarning } from './licence-warning.ts'
import {
  Email,
  Instant,
  listQuery,
  LocalDate,
  noneTwice,
  page,
  PersonName,
  Reason,
  RecordId,
  RoleName,
  Version,
} from './primitives.ts'

const Jurisdiction = z.string().trim().min(1).max(100).describe('Authority that grants the licence')
const LicenceNumber = z.string().trim().min(1).max(60).describe('Licence number as printed')
const LicenceClassName = z
  .enum(licenceClasses, 'Say which of the two it is')
  .describe('A licence to practise, or a registration to prescribe controlled substances')

const licenceFields = {
  class: LicenceClassName,
  jurisdiction: Jurisdiction,
  number: LicenceNumber,
  validFrom: LocalDate.describe('First day of validity'),
  validUntil: LocalDate.describe('Last day of validity'),
}

export const Licence = z.object({
  id: RecordId,
  ...licenceFields,
  lastDay: LocalDate.describe('Last day on which it is valid, earlier than printed where it was ended'),
  state: z.enum(licenceStateNames).describe('State today at this facility'),
  warning: LicenceWarning.nullable().describe('That it ends soon or has ended with none in its place'),
  ended: z
    .object({
      on: LocalDate.describe('Last day on which it was valid'),
      reason: z.string().describe('Why'),
      by: z.string().describe('Who entered that'),
      at: Instant.describe('When that was entered'),
    })
    .nullable()
    .describe('That it was ended before its time'),
  supersedesId: RecordId.nullable().describe('The entry that this one corrects'),
  reason: z.string().nullable().describe('Why it was corrected, of one that corrects another'),
  documents: z.array(AttachedDocument).describe('Its papers, in the order in which they were attached'),
  voidedReason: z.string().nullable().describe('Why it was voided, where it was'),
  recordedAt: Instant.describe('When it was entered'),
  recordedBy: z.string().describe('Who entered it'),
})
export type Licence = z.infer<typeof Licence>

export const PersonRow = z.object({
  id: RecordId,
  email: Email,
  printedName: PersonName,
  roles: z.array(RoleName).describe('Roles held now'),
  active: z.boolean().describe('May sign in'),
  mustChangePassword: z.boolean().describe('Still has a one-time password'),
  licenceState: z.enum(['valid', 'not-valid', 'none']).describe('Whether a licence is valid today here'),
  licenceNotice: LicenceWarning.extend({
    class: LicenceClassName,
    number: LicenceNumber,
    jurisdiction: Jurisdiction,
    lastDay: LocalDate.describe('Last day on which it is valid'),
  })
    .nullable()
    .describe('The licence or registration whose end presses most; null where none ends soon'),
  lastSignInAt: Instant.nullable().describe('Last sign-in'),
  signingLockedUntil: Instant.nullable().describe(
    'Until when signing is locked after wrong passwords in a row; null when it is not',
  ),
  version: z.int().describe('Version for saving'),
})
export type PersonRow = z.infer<typeof PersonRow>

export const Person = PersonRow.extend({
  licences: z.array(Licence).describe('Every licence ever entered, the newest first'),
  createdAt: Instant.describe('When the person was entered'),
})
export type Person = z.infer<typeof Person>

const personParams = z.strictObject({ id: RecordId })

export const listPeople = contract({
  id: 'listPeople',
  method: 'get',
  path: '/people',
  action: 'people.manage',
  summary: 'People, with roles and the state of their licences',
  query: listQuery(['name', 'email', 'lastSignIn']).extend({
    role: RoleName.optional(),
    active: z.enum(['yes', 'no']).optional().describe('Only people who may, or may not, sign in'),
  }),
  reply: { 200: page(PersonRow) },
  problems: [],
})

export const getPerson = contract({
  id: 'getPerson',
  method: 'get',
  path: '/people/:id',
  action: 'people.manage',
  summary: 'One person, with every licence ever entered',
  params: personParams,
  reply: { 200: Person },
  problems: ['not-found'],
})

export const enterPerson = contract({
  id: 'enterPerson',
  method: 'post',
  path: '/people',
  action: 'people.manage',
  summary: 'Enter a new person; the reply holds the one-time password, which is shown once',
  body: z.strictObject({
    id: RecordId,
    email: Email,
    printedName: PersonName,
    roles: noneTwice(z.array(RoleName).min(1, 'Choose at least one role')).describe('Roles to hold'),
  }),
  reply: {
    201: Person.extend({
      oneTimePassword: z.string().nullable().describe('Shown once; null on a repeated request'),
    }),
  },
  problems: ['email-already-used', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const correctPerson = contract({
  id: 'correctPerson',
  method: 'put',
  path: '/people/:id',
  action: 'people.manage',
  summary: 'Correct name or e-mail, set roles, close or reopen the account',
  params: personParams,
  body: z.strictObject({
    expectedVersion: Version,
    email: Email,
    printedName: PersonName,
    roles: noneTwice(z.array(RoleName)).describe('All roles to hold from now on'),
    active: z.boolean().describe('May sign in'),
  }),
  reply: { 200: Person },
  problems: ['not-found', 'stale-version', 'email-already-used', 'last-administrator'],
})

export const issueOneTimePassword = contract({
  id: 'issueOneTimePassword',
  method: 'post',
  path: '/people/:id/one-time-password',
  action: 'people.manage',
  summary: 'Replace the password by a one-time password and end the sessions of this person',
  params: personParams,
  reply: {
    200: z.object({
      oneTimePassword: z.string().nullable().describe('Shown once; null on a repeated request'),
    }),
  },
  problems: ['not-found'],
  idempotent: 'by-key',
})

export const enterLicence = contract({
  id: 'enterLicence',
  method: 'post',
  path: '/people/:id/licences',
  action: 'people.manage',
  summary: 'Enter a licence to practise or a controlled-substance registration',
  params: personParams,
  body: z.strictObject({ id: RecordId, ...licenceFields }),
  reply: { 201: Person },
  problems: ['not-found', 'id-already-used', 'period-reversed'],
  idempotent: 'by-record-id',
})

const licenceParams = personParams.extend({ licenceId: RecordId })

export const correctLicence = contract({
  id: 'correctLicence',
  method: 'post',
  path: '/people/:id/licences/:licenceId/correction',
  action: 'people.manage',
  summary: 'Correct a licence: another entry stands in its place, and the earlier one stays readable',
  params: licenceParams,
  body: z.strictObject({ id: RecordId, ...licenceFields, reason: Reason }),
  reply: { 201: Person },
  problems: ['not-found', 'id-already-used', 'period-reversed', 'licence-changed'],
  idempotent: 'by-record-id',
})

export const endLicence = contract({
  id: 'endLicence',
  method: 'post',
  path: '/people/:id/licences/:licenceId/end',
  action: 'people.manage',
  summary: 'End a licence before its time, with its last day and the reason',
  params: licenceParams,
  body: z.strictObject({
    endedOn: LocalDate.describe('Last day on which it is valid, inside its period'),
    reason: Reason,
  }),
  reply: { 200: Person },
  problems: ['not-found', 'bad-input', 'licence-changed'],
  idempotent: 'by-key',
})

export const attachLicenceDocument = contract({
  id: 'attachLicenceDocument',
  method: 'post',
  path: '/people/:id/licences/:licenceId/documents',
  action: 'people.manage',
  summary: `Attach a paper to a licence: one file of at most ${String(fileLimitMB)} MB with its fields beside it`,
  params: licenceParams,
  body: UploadFields,
  reply: { 201: AttachedDocument },
  problems: [
    'not-found',
    'may-not',
    'file-missing',
    'file-too-large',
    'file-type-not-allowed',
    'id-already-used',
  ],
  idempotent: 'by-record-id',
  consumes: 'multipart',
})

export const getOwnLicences = contract({
  id: 'getOwnLicences',
  method: 'get',
  path: '/me/licences',
  action: 'profile.manage',
  summary: 'One’s own licences with their papers, every one ever entered',
  reply: {
    200: z.object({ licences: z.array(Licence).describe('Every licence ever entered, the newest first') }),
  },
  problems: [],
})

export const voidLicence = contract({
  id: 'voidLicence',
  method: 'post',
  path: '/people/:id/licences/:licenceId/void',
  action: 'people.manage',
  summary: 'Void a licence that was entered wrongly or has been withdrawn; it stays readable',
  params: licenceParams,
  body: z.strictObject({ reason: Reason }),
  reply: { 200: Person },
  problems: ['not-found', 'licence-changed'],
  idempotent: 'by-key',
})
