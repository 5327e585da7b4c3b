/** Every address of the application, in one place. Numbers and codes from outside are encoded here. */
const part = encodeURIComponent

export const paths = {
  today: () => '/',
  signIn: (then?: string) => (then && then !== '/' ? `/sign-in?then=${part(then)}` : '/sign-in'),
  newPassword: () => '/new-password',
  notInThisVersion: (sheet: string) => `/not-in-this-version/${part(sheet)}`,
  parts: () => '/parts',

  animals: () => '/animals',
  animal: (accession: string) => `/animals/${part(accession)}`,

  water: () => '/water',
  waterMap: () => '/water/map',
  newEnclosure: () => '/water/new',
  enclosure: (code: string) => `/enclosures/${part(code)}`,
  editEnclosure: (code: string) => `/enclosures/${part(code)}/edit`,
  enclosureMeasure: (code: string) => `/enclosures/${part(code)}/measure`,
  enclosureReadings: (code: string) => `/enclosures/${part(code)}/readings`,
  enclosureVolume: (code: string) => `/enclosures/${part(code)}/volume`,
  enclosureVolumes: (code: string) => `/enclosures/${part(code)}/volumes`,
  system: (code: string) => `/systems/${part(code)}`,

  quarantine: () => '/quarantine',
  quarantineCase: (number: string) => `/quarantine/${part(number)}`,
  newCase: () => '/quarantine/new',
  clearCase: (number: string) => `/quarantine/${part(number)}/clearance`,
  rounds: () => '/rounds',
  observe: (enclosure: string) => `/enclosures/${part(enclosure)}/observe`,
  urgentCall: (id: string) => `/urgent/${part(id)}`,
  unsent: () => '/unsent',

  orders: () => '/orders',
  newOrder: () => '/orders/new',
  doseByWeight: () => '/orders/by-weight',
  copyOrder: (number: string) => `/orders/new?from=${part(number)}`,
  order: (number: string) => `/orders/${part(number)}`,
  editOrder: (number: string) => `/orders/${part(number)}/edit`,
  orderSheet: (number: string, dose?: string) =>
    `/orders/${part(number)}/sheet${dose === undefined ? '' : `?dose=${part(dose)}`}`,

  pharmacy: () => '/pharmacy',
  formulary: () => '/pharmacy/formulary',
  doseLine: (id: string) => `/pharmacy/formulary/${part(id)}`,
  stock: () => '/pharmacy/stock',
  controlled: () => '/pharmacy/controlled',

  register: () => '/register',
  newAcquisition: () => '/register/acquisitions/new',
  newDisposition: () => '/register/dispositions/new',
  transaction: (number: string) => `/register/transactions/${part(number)}`,
  history: (accession: string) => `/register/histories/${part(accession)}`,
  parties: () => '/register/parties',
  permits: () => '/register/permits',
  newPermit: () => '/register/permits/new',
  permit: (number: string) => `/register/permits/${part(number)}`,
  exports: () => '/register/exports',
  imports: () => '/register/imports',

  bench: () => '/bench',
  calculator: (name: string) => `/bench/${part(name)}`,

  samples: () => '/samples',
  tracing: () => '/tracing',
  reports: () => '/reports',
  checks: () => '/check',
  check: (fingerprint: string) => `/check/${part(fingerprint)}`,
  tankLabel: (code: string) => `/e/${part(code)}`,

  settings: () => '/settings',
  ownSettings: () => '/settings/own',
  facility: () => '/settings/facility',
  people: () => '/settings/people',
  newPerson: () => '/settings/people/new',
  person: (id: string) => `/settings/people/${part(id)}`,
  rules: () => '/settings/rules',
  audit: () => '/settings/audit',
} as const
