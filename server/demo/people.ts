import type { LicenceClass } from '../../shared/domain/licences/licence-classes.ts'
import { addDays, facilityDateOf } from '../../shared/domain/time/facility-date.ts'
import type { Role } from '../../shared/domain/permissions/roles.ts'
import type { SettingKey } from '../../shared/domain/settings/settings.ts'
import type { Composition } from '../composition.ts'
import { installation } from '../platform/http/request-context.ts'
import type { Actor } from '../platform/http/request-context.ts'

export const demoPassword = 'chart-paper-7'
const mailDomain = 'harrow-point.example'

/** The people of the practice scenario; all invented. */
export const demoPeople = {
  vet: { name: 'Dr Ilse Marrow', roles: ['veterinarian'] },
  vet2: { name: 'Dr Piers Oland', roles: ['veterinarian'] },
  tech: { name: 'Soren Brandt', roles: ['technician'] },
  tech2: { name: 'Rhoda Ansah', roles: ['technician'] },
  keeper: { name: 'Tamsin Okafor-Lind', roles: ['keeper'] },
  registrar: { name: 'Joss Pell', roles: ['registrar'] },
  admin: { name: 'Nell Farrow', roles: ['administrator'] },
} as const satisfies Record<string, { name: string; roles: readonly Role[] }>

export type DemoPerson = keyof typeof demoPeople
export type DemoActors = Record<DemoPerson, Actor & { personId: string }>

const facilitySettings = {
  'facility.name': 'Harrow Point Sea Hall',
  'facility.address': '4 Breakwater Road, Harrow Point, Norrell Sound',
  'facility.zone': 'America/Halifax',
  'facility.jurisdictions': 'Norrell Sound',
  'facility.gallon': 'us',
  'numbers.accession': 'HP-{0000}',
  'notices.on-call': `Dr Ilse Marrow | +1 555 0160 | vet@${mailDomain}, Dr Piers Oland | +1 555 0161 | vet2@${mailDomain}`,
} satisfies Partial<Record<SettingKey, string>>

const yearsFrom = (at: Date, years: number) =>
  `${String(at.getUTCFullYear() + years)}-${String(at.getUTCMonth() + 1).padStart(2, '0')}-01`

/** Enters the people with their licences, and confirms the facility's settings, through the services. */
export async function seedPeople({ people, facility, parts }: Composition): Promise<DemoActors> {
  const context = { actor: installation, requestId: 'demo' }
  const actors: Partial<DemoActors> = {}
  for (const [key, person] of Object.entries(demoPeople) as [DemoPerson, (typeof demoPeople)[DemoPerson]][]) {
    const id = parts.ids.next()
    const email = `${key}@${mailDomain}`
    const roles = [...person.roles]
    await people.service.enterPerson(context, {
      id,
      email,
      printedName: person.name,
      roles,
      password: demoPassword,
    })
    actors[key] = { personId: id, printedName: person.name, roles }
  }
  const entered = actors as DemoActors
  const now = parts.clock.now()
  const today = facilityDateOf(now.toISOString(), facilitySettings['facility.zone'])
  const licence = (
    who: DemoPerson,
    number: string,
    validFrom: string,
    validUntil: string,
    of: LicenceClass = 'veterinary',
  ) =>
    people.service.enterLicence({ actor: entered.admin, requestId: 'demo' }, entered[who].personId, {
      id: parts.ids.next(),
      class: of,
      jurisdiction: 'Norrell Sound',
      number,
      validFrom,
      validUntil,
    })
  await licence('vet', 'VL-20417', yearsFrom(now, -2), yearsFrom(now, 2))
  // ends soon: shown on Today, and renewed by the administrator when practising
  await licence('vet', 'CS-3391', yearsFrom(now, -2), addDays(today, 25), 'controlled-substance')
  await licence('vet2', 'VL-18830', yearsFrom(now, -4), yearsFrom(now, -1))

  for (const [key, value] of Object.entries(facilitySettings) as [SettingKey, string][]) {
    const id = parts.ids.next()
    const admin = { actor: entered.admin, requestId: 'demo' }
    await facility.service.proposeSetting(admin, key, { id, value })
    await facility.service.confirmSetting(admin, key, id)
  }
  return entered
}
