import { z } from 'zod'
import { contract } from './contract.ts'
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

export const Licence = z.object({
  id: RecordId,
  jurisdiction: Jurisdiction,
  number: LicenceNumber,
  validFrom: LocalDate.describe('First day of validity'),
  validUntil: LocalDate.describe('Last day of validity'),
  state: z
    .enum(['valid', 'not-yet', 'expired', 'void', 'not-accepted-here'])
    .describe('State today at this facility'),
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
  lastSignInAt: Instant.nullable().describe('Last sign-in'),
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
  summary: 'Enter a licence to practise',
  params: personParams,
  body: z.strictObject({
    id: RecordId,
    jurisdiction: Jurisdiction,
    number: LicenceNumber,
    validFrom: LocalDate.describe('First day of validity'),
    validUntil: LocalDate.describe('Last day of validity'),
  }),
  reply: { 201: Person },
  problems: ['not-found', 'id-already-used', 'period-reversed'],
  idempotent: 'by-record-id',
})

export const voidLicence = contract({
  id: 'voidLicence',
  method: 'post',
  path: '/people/:id/licences/:licenceId/void',
  action: 'people.manage',
  summary: 'Void a licence that was entered wrongly or has been withdrawn; it stays readable',
  params: personParams.extend({ licenceId: RecordId }),
  body: z.strictObject({ reason: Reason }),
  reply: { 200: Person },
  problems: ['not-found'],
  idempotent: 'by-key',
})
