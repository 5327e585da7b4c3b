import type { Licence } from '../contracts/people.contract.ts'
import type { Role } from '../domain/permissions/roles.ts'
import { defineMessages } from './define-messages.ts'

/** Words of the administrator's sheets: people, licences, facility settings, audit trail. */
export const peopleWords = defineMessages({
  place: 'Settings',
  title: 'People and licences',
  source: 'Who signs in, in which roles, and who may practise today.',
  search: 'Name or e-mail',
  role: 'Role',
  everyRole: 'Every role',
  account: 'Account',
  everyAccount: 'Open and closed',
  open: 'Open',
  closed: 'Closed',
  enter: 'Enter a person',
  name: 'Name',
  nameHint: 'As printed on records and under signatures.',
  email: 'E-mail',
  emailHint: 'The sign-in name.',
  roles: 'Roles',
  rolesHint: 'Rights of several roles add up.',
  licence: 'Licence',
  lastSignIn: 'Last sign-in',
  never: 'never',
  oneTime: 'one-time password',
  noneFound: 'Nobody signs in yet',
  list: 'people',
  people: 'People',
  keep: 'Keep',
  enterThis: 'Enter this person',
  back: 'Back to people',
  signsIn: 'May sign in',
  signsInHint: 'Closing an account ends its sessions at once. Nothing that the person recorded changes.',
  kept: 'Kept',
  entered: (p: { name: string }) => `${p.name} is entered`,
  oneTimeTitle: 'One-time password',
  oneTimeText: (p: { name: string }) =>
    `Give it to ${p.name} in person. It is shown once, and has to be changed at the first sign-in.`,
  oneTimeNew: 'New one-time password',
  oneTimeAsk: (p: { name: string }) => `Replace the password of ${p.name}?`,
  oneTimeWarn: 'Every session of this person ends at once.',
  oneTimeAct: 'Replace it',
  oneTimeShownBefore: 'It was shown before. Make a new one.',
  goBack: 'Go back',
  licences: 'Licences to practise',
  licencesHint: 'A wrong one is voided with a reason and entered again; it stays readable.',
  noLicences: 'None entered.',
  addLicence: 'Enter a licence',
  jurisdiction: 'Jurisdiction',
  jurisdictionHint: 'As the facility’s list of accepted jurisdictions has it.',
  number: 'Licence number',
  validFrom: 'First day',
  validUntil: 'Last day',
  state: 'Today',
  voidIt: 'Void',
  voidAsk: (p: { number: string }) => `Void licence ${p.number}?`,
  voidText: 'From now on nothing can be signed under it. What was signed stays valid.',
  voidAct: 'Void the licence',
  reason: 'Reason',
  theirs: 'Somebody changed this person meanwhile. What you typed is kept; load the newer version to go on.',
  loadNewer: 'Load the newer version',
  notHere: 'There is no such person.',
})

export const roleTitles = defineMessages({
  veterinarian: 'Veterinarian',
  technician: 'Technician',
  keeper: 'Keeper',
  registrar: 'Registrar',
  administrator: 'Administrator',
} satisfies Record<Role, string>)

export const licenceStates = defineMessages({
  valid: 'valid',
  'not-yet': 'not valid yet',
  expired: 'expired',
  void: 'void',
  'not-accepted-here': 'not accepted here',
} satisfies Record<Licence['state'], string>)

export const licenceSummaries = defineMessages({
  valid: 'valid today',
  'not-valid': 'not valid today',
  none: 'none',
})

export const facilityWords = defineMessages({
  title: 'Facility settings',
  source: 'Each value shows who confirmed it and when. A default works meanwhile and says that nobody has.',
  default: 'Project default, not confirmed',
  confirmed: (p: { by: string; at: string }) => `Confirmed by ${p.by}, ${p.at}`,
  waiting: (p: { value: string; by: string; at: string }) => `${p.value}, proposed by ${p.by}, ${p.at}`,
  propose: 'Propose',
  confirm: 'Confirm',
  newValue: (p: { setting: string }) => `New value of: ${p.setting}`,
  proposed: 'Proposed. It is in force once it is confirmed.',
  inForce: 'Confirmed and in force',
  settings: 'facility settings',
})

export const auditWords = defineMessages({
  title: 'Audit trail',
  source: 'Every change, the newest first. Clinical text is withheld from people who may not read charts.',
  search: 'Name, act or record',
  trail: 'audit trail',
  at: 'When',
  who: 'Who',
  act: 'Act',
  record: 'Record',
  change: 'Change',
  withheld: 'Clinical text withheld',
  show: 'Show the change',
  before: 'Before',
  after: 'After',
  noneFound: 'Nothing has happened yet',
  hash: (p: { seq: number; hash: string }) => `Entry ${String(p.seq)}, ${p.hash}`,
})
