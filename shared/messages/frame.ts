import { defineMessages } from './define-messages.ts'

/** Words of the frame around every sheet: bridge, menus, pages that stand for a missing or broken sheet. */
export const frameWords = defineMessages({
  name: 'Pratique',
  home: 'Pratique, to Today',
  sheets: 'Sheets',
  today: 'Today',
  quarantine: 'Quarantine',
  animals: 'Animals',
  water: 'Water',
  orders: 'Orders',
  pharmacy: 'Pharmacy',
  register: 'Register',
  bench: 'Bench',
  find: 'Find',
  findKeys: 'Ctrl K',
  findKeysMac: '⌘ K',
  sheetMenu: (p: { current: string }) => `Sheets. Current sheet: ${p.current}`,
  person: (p: { name: string }) => `${p.name}, menu`,
  settings: 'Settings',
  ownSettings: 'Your own settings',
  reports: 'Reports',
  help: 'Keys and help',
  people: 'People and licences',
  facility: 'Facility settings',
  rules: 'Rules of the cautions',
  audit: 'Audit trail',
  watch: 'Light',
  day: 'Day',
  night: 'Night watch',
  device: 'As the device',
  unsent: (p: { count: number }) => (p.count === 1 ? '1 entry not sent' : `${p.count} entries not sent`),
  signOutQuestion: (p: { count: number }) =>
    p.count === 1 ? 'Sign out with 1 entry not sent?' : `Sign out with ${p.count} entries not sent?`,
  signOutBody:
    'They stay on this device for you alone and are sent when you sign in here again. Nobody else can see or send them.',
  signOutStay: 'Stay signed in',
  signOut: 'Sign out',
  facilityTime: 'Facility time',
  demo: 'Practice scenario. Nothing here is a real animal or a real record.',
  noValidLicence: 'Only with a licence that is valid today for a jurisdiction this facility accepts.',
  titled: (p: { sheet: string }) => `${p.sheet} · Pratique`,

  notHereYet: 'Not in this version',
  notHereYetTitle: (p: { sheet: string }) => `${p.sheet} is not in this version`,
  notHereYetBody:
    'This sheet has not been built yet, so nothing can be read or entered here. Nothing was lost. It will open at this place when it is there.',
  toToday: 'Go to Today',

  nothingHere: 'Nothing at this address',
  nothingHereBody: 'The address may have been typed wrongly, or what stood here has another number now.',

  broke: 'This sheet stopped working',
  brokeBody:
    'Something failed on our side. What was saved is safe. Load the sheet again; if it stops again, tell whoever looks after Pratique what you were doing, and give them the line below.',
  loadAgain: 'Load again',
  unreachable: 'The server can’t be reached',
  unreachableBody: 'Nobody can be signed in or out until it answers.',
  sheetNotHere: 'No signal, and this sheet is not kept on this device',
  sheetNotHereBody:
    'It opens when there is a signal again. The round, observations and urgent calls open without one; what is entered there is kept on this device and sent later.',
  toRounds: 'Go to the round',
  notLoaded: 'This sheet could not be loaded',
  notLoadedBody:
    'The server answers, but a part of the sheet did not come. What was saved is safe. Load it again.',
  newVersion: 'A new version is in place',
  newVersionBody: 'Load the page again to go on with it. What was saved is safe.',
})

/** Names of the five roles with a capital, for lists and menus. */
export const frameRoleNames = defineMessages({
  veterinarian: 'Veterinarian',
  technician: 'Technician',
  keeper: 'Keeper',
  registrar: 'Registrar',
  administrator: 'Administrator',
})
