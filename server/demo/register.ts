import type { NewAcquisition } from '../../shared/contracts/acquisition-bodies.ts'
import { wallClockOf } from '../../shared/domain/time/facility-date.ts'
import type { Composition } from '../composition.ts'
import type { RequestContext } from '../platform/http/request-context.ts'
import type { EnterShipment, SeededAnimal } from './animals.ts'
import { createTimeline, demoTimes } from './demo-time.ts'
import { demoDepartures, demoParties, demoPermits, demoShipments } from './register-data.ts'
import type { DemoPaper, DemoParty, DemoPermitKey } from './register-data.ts'
import type { DemoOutside } from './water.ts'

const hourMs = 3_600_000

/**
 * The registrar's part of the practice scenario: other parties and permits at once; `enter` then takes every shipment
 * into the register as it comes, with its papers and what it uses up; `depart` lets some animals leave.
 */
export async function seedRegister(
  composition: Composition,
  outside: DemoOutside & { taxa: ReadonlyMap<string, string> },
) {
  const { acquisitions, counterparties, documents, facility, permits, parts } = composition
  const { clock, now, people, taxa } = outside
  const zone = await facility.service.zone()
  const times = demoTimes(now, zone)
  const registrar: RequestContext = { actor: people.registrar, requestId: 'demo' }
  const partyIds = new Map<DemoParty, string>()
  const permitIds = new Map<DemoPermitKey, string>()

  for (const [key, party] of Object.entries(demoParties) as [DemoParty, (typeof demoParties)[DemoParty]][]) {
    const id = parts.ids.next()
    partyIds.set(key, id)
    await counterparties.service.enterCounterparty(registrar, { id, ...party })
  }
  for (const key of Object.keys(demoPermits) as DemoPermitKey[]) {
    const { fromDaysAgo, untilDaysAgo, ...permit } = demoPermits[key]
    const id = parts.ids.next()
    permitIds.set(key, id)
    await permits.service.enterPermit(registrar, {
      id,
      permitNumber: permit.permitNumber,
      authority: permit.authority,
      kind: permit.kind,
      validFrom: times.dateOf(fromDaysAgo),
      validUntil: times.dateOf(untilDaysAgo),
      quantityAllowed: 'quantityAllowed' in permit ? permit.quantityAllowed : null,
      taxonIds: ('taxa' in permit ? [...permit.taxa] : []).flatMap((name) => taxa.get(name) ?? []),
      counterpartyId: 'party' in permit ? (partyIds.get(permit.party) ?? null) : null,
      purposeCode: 'purposeCode' in permit ? permit.purposeCode : null,
      conditions: 'conditions' in permit ? permit.conditions : null,
    })
  }

  async function attach(number: string, transactionId: string, papers: readonly DemoPaper[]): Promise<void> {
    const parent = {
      kind: 'transaction',
      id: transactionId,
      label: number,
      readAction: 'register.read',
      writeAction: 'register.manage',
    } as const
    for (const { title, kind, fileName, text } of papers) {
      const content = Buffer.from(text, 'utf8')
      await documents.service.attach(
        registrar,
        parent,
        { id: parts.ids.next(), title, kind },
        { content, name: fileName, type: 'text/plain', bytes: content.length },
      )
    }
  }

  const enter: EnterShipment = async (shipment) => {
    const [first] = shipment
    if (!first) return []
    const { batch, kind } = first.demo
    const how = demoShipments[`${batch} ${kind}`] ?? {}
    const { date, time } = wallClockOf(first.given.happenedAt, zone)
    const arrivedMs = Date.parse(first.given.happenedAt)
    const lines = shipment.map(({ given }, i): NewAcquisition['lines'][number] => ({
      record: 'new',
      id: parts.ids.next(),
      animalId: given.id,
      taxonId: given.taxonId,
      form: given.form,
      name: given.name ?? null,
      sex: given.sex,
      lifeStage: given.stage,
      count: given.count,
      enclosureId: given.enclosureId,
      estimate: given.estimate ?? null,
      identifiers: given.identifiers ?? [],
      deadOnArrival: i === 0 ? (how.deadOnArrival ?? null) : null,
      sourceCode: how.sourceCode ?? null,
    }))
    const permitId = how.permit && permitIds.get(how.permit)
    const id = parts.ids.next()
    const number = await acquisitions.service.recordAcquisition(registrar, {
      id,
      kind: kind as NewAcquisition['kind'],
      stage: 'already',
      on: date,
      time: time.slice(0, 5),
      counterpartyId: how.party ? (partyIds.get(how.party) ?? null) : null,
      reference: how.reference ?? null,
      place: how.locality ? { locality: how.locality, method: how.method ?? null } : null,
      transport: how.travel
        ? {
            carrier: how.travel.carrier,
            waybill: how.travel.waybill ?? null,
            boxCount: how.travel.boxes,
            sealedAt: new Date(arrivedMs - how.travel.hours * hourMs).toISOString(),
            openedAt: first.given.happenedAt,
            note: how.travel.note ?? null,
          }
        : null,
      loanDueOn: how.loanDueInDays === undefined ? null : times.dateOf(-how.loanDueInDays),
      lines,
      permitUses: permitId
        ? lines.map((line) => ({ id: parts.ids.next(), permitId, lineId: line.id, quantity: line.count }))
        : [],
    })
    await attach(number, id, how.papers ?? [])
    const found = await composition.animals.questions.animalsById(
      shipment.map(({ given }) => given.id),
      clock.now(),
    )
    return shipment.map(({ given }) => found.find((one) => one.animalId === given.id)?.accession ?? '')
  }

  async function depart(seeded: readonly SeededAnimal[]): Promise<void> {
    const { later, play } = createTimeline(clock, now)
    for (const one of demoDepartures) {
      const animal = seeded.find(
        ({ batch, scientificName }) => batch === one.batch && scientificName === one.scientificName,
      )
      if (!animal) throw new Error(`The practice scenario has no ${one.scientificName} to leave`)
      later(times.at(one.daysAgo, '11:40'), async () => {
        const id = parts.ids.next()
        const number = await acquisitions.service.recordDisposition(registrar, {
          id,
          kind: one.kind,
          stage: 'already',
          on: times.dateOf(one.daysAgo),
          time: '11:30',
          counterpartyId: partyIds.get(one.party) ?? null,
          reference: one.reference,
          lines: [{ id: parts.ids.next(), animalId: animal.id, count: one.count }],
          permitUses: [],
        })
        await attach(number, id, one.papers ?? [])
      })
    }
    await play()
  }

  return { enter, depart }
}
