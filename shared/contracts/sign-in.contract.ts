import { z } from 'zod'
import { contract } from './contract.ts'
import { licenceClasses } from '../domain/licences/licence-classes.ts'
import { licenceStateNames } from '../domain/licences/licence-state.ts'
import { LicenceWarning } from './licence-warning.ts'
import { Email, Instant, LocalDate, PersonName, RecordId, RoleName } from './primitives.ts'
import { signInAddresses } from './sign-in.addresses.ts'

/** A licence to practise, as far as every screen needs it. */
export const LicenceBrief = z.object({
  id: RecordId,
  class: z.enum(licenceClasses).describe('A licence to practise, or a controlled-substance registration'),
  jurisdiction: z.string().describe('Who granted it'),
  number: z.string().describe('Licence number as printed'),
  validFrom: LocalDate,
  validUntil: LocalDate.describe('Last day of validity'),
  lastDay: LocalDate.describe('Last day on which it is valid, earlier than printed where it was ended'),
  state: z.enum(licenceStateNames).describe('State today at this facility'),
  warning: LicenceWarning.nullable().describe('That it ends soon or has ended with none in its place'),
  validToday: z.boolean().describe('Valid today in a jurisdiction this facility accepts'),
})

/** The person who is signed in, and what the shell of the client needs to know. */
export const Me = z.object({
  id: RecordId,
  email: Email,
  printedName: PersonName,
  roles: z.array(RoleName).describe('Roles held now'),
  mustChangePassword: z.boolean().describe('A one-time password has to be changed before anything else'),
  licences: z.array(LicenceBrief).describe('Licences of this person that are neither void nor corrected'),
  mayPractise: z.boolean().describe('Holds a licence valid today that this facility accepts'),
  signingLockedUntil: Instant.nullable().describe(
    'Until when signing is locked after wrong passwords in a row; null when it is not',
  ),
  preferences: z.record(z.string(), z.string()).describe('Choices of this person, such as units'),
  facility: z
    .object({
      name: z.string().describe('Name of the facility'),
      zone: z.string().describe('IANA time zone of the facility'),
      gallon: z
        .enum(['us', 'imperial'])
        .nullable()
        .describe('Which gallon a bare "gal" means here; null: refused'),
      demo: z.boolean().describe('This installation shows the practice scenario'),
    })
    .describe('The facility, as far as every screen needs it'),
})
export type Me = z.infer<typeof Me>

export const Credentials = z.strictObject({
  email: Email,
  password: z.string().min(1).max(200).describe('Password'),
})

export const signIn = contract({
  ...signInAddresses.signIn,
  action: 'public',
  summary: 'Sign in with e-mail and password',
  body: Credentials,
  reply: { 200: Me },
  problems: ['sign-in-failed', 'sign-in-locked', 'too-many-requests'],
})

export const signOut = contract({
  ...signInAddresses.signOut,
  action: 'signed-in',
  summary: 'End this session',
  reply: { 204: z.null() },
  problems: [],
})

export const getMe = contract({
  ...signInAddresses.getMe,
  action: 'signed-in',
  summary: 'Who is signed in, with roles and licences',
  reply: { 200: Me },
  problems: [],
})

export const NewPassword = z
  .string()
  .min(10, 'Use at least 10 characters')
  .max(200)
  .describe('The new password, at least 10 characters')

export const changePassword = contract({
  id: 'changePassword',
  method: 'post',
  path: '/me/password',
  action: 'signed-in',
  summary: 'Change one’s own password; required after a one-time password',
  body: z.strictObject({
    currentPassword: z.string().min(1).max(200).describe('The password until now'),
    newPassword: NewPassword,
  }),
  reply: { 200: Me },
  problems: ['password-wrong', 'password-too-weak', 'sign-in-locked'],
})

/** Preferences a person may set; anything else is refused. */
export const preferenceNames = [
  'theme',
  'volumeUnit',
  'massUnit',
  'temperatureUnit',
  'lengthUnit',
  'singleKeys',
  'todayLane',
] as const

export const setPreference = contract({
  ...signInAddresses.setPreference,
  action: 'profile.manage',
  summary: 'Set one preference of one’s own',
  params: z.strictObject({ name: z.enum(preferenceNames).describe('Which preference') }),
  body: z.strictObject({ value: z.string().max(100).describe('Its value') }),
  reply: { 200: Me },
  problems: [],
})
