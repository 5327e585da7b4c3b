import type { BathOrderFields } from '../../shared/contracts/order-primitives.ts'
import type { ReadingParameter } from '../../shared/domain/readings/parameters.ts'
import type { UnitCode } from '../../shared/domain/units/unit-table.ts'
import type { DoseUse } from '../../shared/domain/formulary/dose-line.ts'
import { nothingStated } from '../../shared/domain/orders/bath-order-draft.ts'
import type { Composition } from '../composition.ts'
import { saidCautions } from '../features/orders/index.ts'
import type { RequestContext } from '../platform/http/request-context.ts'
import type { DemoActors, DemoPerson } from './people.ts'
import { demoPassword } from './people.ts'
import type { DemoOutside, DemoWaterIds } from './water.ts'

const hourMs = 3_600_000
/** After this the agent that was left in the water is taken out. */
const leftInWaterMinutes = 3 * 24 * 60
/** How long before a bath the water is read and the machines are turned off. */
const minutesBefore = 10

/** What happens to an order of the practice scenario after it was written. */
type Fate = 'draft' | 'proposal' | 'signed' | 'held' | 'discontinued' | 'first-given' | 'all-given'

interface DemoOrder {
  enclosure: string
  agent: string
  /** The use of the dose line that it is ordered by. */
  line: DoseUse
  lot?: string
  /** When it was written and the first dose is planned, in hours from now. */
  writtenHours: number
  startHours: number
  fate: Fate
  fields: Partial<BathOrderFields>
}

/** The river water of the quarantine wing, whose salinity nobody reads. */
const freshWater = { ...nothingStated, waterKind: 'fresh' as const }

const peroxide: Partial<BathOrderFields> = {
  problem: 'Yellow mats on the gills, columnaris suspected',
  target: { value: '50', unit: 'mg/L' },
  basis: 'active',
  timing: 'timed',
  contactMinutes: 60,
  division: { value: '1', unit: 'mL' },
  stopIf: 'gasping at the surface, any fish on its side, oxygen below 5 mg/L',
  stated: freshWater,
}
const praziquantel: Partial<BathOrderFields> = {
  problem: 'Monogeneans on skin scrape, low count',
  use: 'extralabel',
  target: { value: '2', unit: 'mg/L' },
  basis: 'active',
  timing: 'indefinite',
  division: { value: '0.01', unit: 'g' },
  stopIf: 'any animal lies on its side or stops breathing regularly',
}
const salt: Partial<BathOrderFields> = {
  problem: 'Excess mucus after transport',
  target: { value: '5', unit: 'g/L' },
  basis: 'active',
  timing: 'timed',
  contactMinutes: 60,
  division: { value: '10', unit: 'g' },
  stopIf: 'loss of balance',
  stated: freshWater,
}

/** Orders in every state, in the enclosures of the quarantine wing. */
const demoOrders: readonly DemoOrder[] = [
  {
    enclosure: 'QT-4',
    agent: 'sodium-chloride',
    line: 'salt-bath',
    writtenHours: -18 * 24,
    startHours: -17 * 24,
    fate: 'all-given',
    fields: salt,
  },
  {
    enclosure: 'QT-3',
    agent: 'praziquantel',
    line: 'flukes-prolonged',
    writtenHours: -14 * 24,
    startHours: -14 * 24 + 2,
    fate: 'all-given',
    fields: praziquantel,
  },
  {
    enclosure: 'QT-2',
    agent: 'praziquantel',
    line: 'flukes-prolonged',
    writtenHours: -12 * 24,
    startHours: -11 * 24,
    fate: 'signed',
    fields: { ...praziquantel, problem: 'Flukes suspected on one of ten, not confirmed' },
  },
  {
    enclosure: 'QT-1',
    agent: 'praziquantel',
    line: 'flukes-prolonged',
    writtenHours: -8 * 24,
    startHours: -7 * 24,
    fate: 'discontinued',
    fields: { ...praziquantel, problem: 'Gill flukes; course stopped when the mounts came back clean' },
  },
  {
    enclosure: 'QT-4',
    agent: 'hydrogen-peroxide',
    line: 'external-bacteria',
    writtenHours: -50,
    startHours: -48,
    fate: 'first-given',
    fields: { ...peroxide, doses: 3, intervalHours: 48 },
  },
  {
    enclosure: 'QT-1',
    agent: 'praziquantel',
    line: 'flukes-prolonged',
    writtenHours: -20,
    startHours: 1,
    fate: 'held',
    fields: { ...praziquantel, problem: 'Gill flukes seen again on mount' },
  },
  {
    enclosure: 'QT-3',
    agent: 'praziquantel',
    line: 'flukes-prolonged',
    writtenHours: -3,
    startHours: 2,
    fate: 'signed',
    fields: { ...praziquantel, problem: 'Second bath against monogeneans' },
  },
  {
    enclosure: 'QT-2',
    agent: 'praziquantel',
    line: 'flukes-prolonged',
    writtenHours: -2,
    startHours: 4,
    fate: 'draft',
    fields: { ...praziquantel, problem: 'Precaution before they move to the gallery; scrapes clean' },
  },
  {
    enclosure: 'QT-4',
    agent: 'sodium-chloride',
    line: 'salt-bath',
    writtenHours: -1,
    startHours: 24,
    fate: 'proposal',
    fields: { ...salt, problem: 'Scuffed snouts after netting; salt proposed' },
  },
]

/** Writes, signs, holds and doses the orders of the practice scenario through the services. */
export async function seedOrders(
  composition: Composition,
  outside: DemoOutside & Pick<DemoWaterIds, 'enclosureIds' | 'waterBodyIds' | 'machineIds'>,
): Promise<void> {
  const { orders, administrations, formulary, animals, parts, water } = composition
  const { clock, now, people } = outside
  const as = (who: DemoPerson): RequestContext => ({
    actor: people[who as keyof DemoActors],
    requestId: 'demo',
  })
  const hours = (h: number) => new Date(now.getTime() + h * hourMs)
  const { products, lines } = await formulary.queries.formulary()

  for (const order of demoOrders) {
    const enclosureId = outside.enclosureIds.get(order.enclosure)
    const product = products.find((one) => one.agent === order.agent)
    const lot = product?.lots.find((one) => one.state === 'usable')
    if (enclosureId === undefined || !product || !lot)
      throw new Error(`The practice scenario cannot order ${order.agent} for ${order.enclosure}`)
    const writtenAt = hours(order.writtenHours)
    clock.set(writtenAt)
    const inside = await animals.questions.animalsIn([enclosureId], writtenAt)
    const fields: BathOrderFields = {
      enclosureId,
      animalIds: inside.map((animal) => animal.animalId),
      productId: product.id,
      lotId: lot.id,
      doseLineId: lines.find((line) => line.agent === order.agent && line.use === order.line)?.id ?? null,
      problem: '',
      use: 'extralabel',
      target: null,
      basis: null,
      timing: null,
      contactMinutes: null,
      doses: 1,
      intervalHours: null,
      startsAt: hours(order.startHours).toISOString(),
      setting: 'tank',
      division: null,
      stopIf: '',
      instructions: 'Dissolve in water of the tank and add over 20 min at the return.',
      allowedVolumeDriftPercent: 5,
      stated: nothingStated,
      ...order.fields,
    }
    const writer = as(order.fate === 'proposal' ? 'tech' : 'vet')
    const { number } = await orders.service.draftOrder(writer, parts.ids.next(), fields)
    if (order.fate === 'draft' || order.fate === 'proposal') continue
    await sign(number, fields)
    if (order.fate === 'held') {
      clock.set(hours(-1))
      await orders.service.holdOrder(as('keeper'), number, {
        id: parts.ids.next(),
        happenedAt: hours(-1).toISOString(),
        reason: 'One fish breathes fast, please look first',
      })
    }
    if (order.fate === 'discontinued')
      await orders.service.discontinueOrder(as('vet'), number, 'Mounts clean, no flukes seen')
    if (order.fate === 'first-given' || order.fate === 'all-given') await dose(number, order, lot.id)
  }
  clock.set(now)

  /** Signs what was written, with every warning read. No order of the practice scenario may carry a stop. */
  async function sign(number: string, fields: BathOrderFields): Promise<void> {
    const found = await orders.judge(fields, clock.now(), {})
    const cautions = found ? saidCautions(found) : []
    const named = (level: string) =>
      cautions
        .filter((caution) => caution.level === level)
        .map(({ ruleId, code, text }) => ({ ruleId, code, text }))
    const stops = named('stop').map(({ ruleId, text }) => `${ruleId} ${text}`)
    if (stops.length > 0) throw new Error(`${number} of the practice scenario is stopped: ${stops.join(' ')}`)
    await orders.service.signOrder(as('vet'), number, {
      password: demoPassword,
      expectedVersion: 1,
      relationship: true,
      read: named('warning'),
      overrides: [],
    })
  }

  /** Records the first dose with its own time, and the end of a timed bath. */
  async function dose(number: string, order: DemoOrder, lotId: string): Promise<void> {
    const startedAt = hours(order.startHours)
    await makeReady(order, startedAt)
    clock.set(new Date(startedAt.getTime() + 10 * 60_000))
    const sheet = await administrations.queries.sheet(number, '1', false, as('tech'))
    const doseId = parts.ids.next()
    await administrations.service.recordDose(as('tech'), number, '1', {
      id: doseId,
      kind: 'recorded',
      happenedAt: startedAt.toISOString(),
      amount: sheet.amountNow ?? { value: '1', unit: 'g' },
      lotId,
      note: 'Given as ordered, quiet throughout',
    })
    const minutes = order.fields.contactMinutes ?? leftInWaterMinutes
    const endedAt = new Date(startedAt.getTime() + minutes * 60_000)
    clock.set(endedAt)
    await administrations.service.stopBath(as('tech2'), doseId, {
      id: parts.ids.next(),
      cause: 'time-up',
      happenedAt: endedAt.toISOString(),
      ...(order.fields.contactMinutes ? {} : { rescue: 'Carbon back on and half of the water changed' }),
    })
    await switchMachines(order, endedAt, true)
  }

  /** What the conditions of a bath ask for: the water read now, and off what takes the drug out of it or breaks it down. */
  async function makeReady(order: DemoOrder, startedAt: Date): Promise<void> {
    const at = new Date(startedAt.getTime() - minutesBefore * 60_000)
    clock.set(at)
    await switchMachines(order, at, false)
    const [temperatureC, oxygenMgPerL] = order.enclosure === 'QT-4' ? ['14.3', '9.1'] : ['25.4', '6.8']
    await water.services.measurements.recordReadings(as('tech'), {
      waterBodyId: outside.waterBodyIds.get(order.enclosure) ?? '',
      happenedAt: at.toISOString(),
      readings: [
        reading('temperature', temperatureC, 'degC'),
        reading('dissolved-oxygen', oxygenMgPerL, 'mg/L'),
      ],
    })
  }

  function reading(parameter: ReadingParameter, value: string, unit: UnitCode) {
    return { id: parts.ids.next(), parameter, value: { value, unit }, scale: null, instrument: 'Meter 4' }
  }

  async function switchMachines({ enclosure }: DemoOrder, at: Date, on: boolean): Promise<void> {
    for (const kind of ['AC', 'UV', 'FF']) {
      const id = outside.machineIds.get(enclosure.replace('QT', kind))
      if (id === undefined) continue
      await water.services.map.recordLifeSupportState(as('tech'), id, {
        id: parts.ids.next(),
        on,
        happenedAt: at.toISOString(),
        note: on ? 'On again after the bath' : 'Off for a bath',
      })
    }
  }
}
