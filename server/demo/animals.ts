import { knownTaxa } from '../../shared/domain/taxa/known-taxa.ts'
import type { SensitivityCode, SensitivityLevel } from '../../shared/domain/taxa/sensitivity.ts'
import type { TaxonGroup } from '../../shared/domain/taxa/taxon-group.ts'
import type { Composition } from '../composition.ts'
import type { Accession } from '../features/animals/index.ts'
import type { RequestContext } from '../platform/http/request-context.ts'
import { demoAnimals } from './animals-data.ts'
import type { DemoAnimal } from './animals-data.ts'
import { createTimeline, dayMs, historyDays } from './demo-time.ts'
import type { DemoActors, DemoPerson } from './people.ts'
import type { DemoOutside, DemoWaterIds } from './water.ts'

/** What a veterinarian of the practice scenario has said about whole groups of taxa. */
const groupSensitivities: Partial<
  Record<TaxonGroup, readonly [SensitivityCode, SensitivityLevel, string][]>
> = {
  elasmobranch: [
    ['copper', 'avoid', 'No copper in water that they share'],
    ['low-salinity', 'avoid', 'Osmotic intolerance'],
    ['fresh-water-dip', 'avoid', 'Not without an order for one animal'],
  ],
  cephalopod: [['copper', 'avoid', 'Lethal to most invertebrates']],
  crustacean: [['copper', 'avoid', 'Lethal to most invertebrates']],
  echinoderm: [['copper', 'avoid', 'Lethal to most invertebrates']],
  jelly: [['copper', 'avoid', 'Lethal to most invertebrates']],
  mollusc: [['copper', 'avoid', 'Lethal to most invertebrates']],
  sturgeon: [['scaleless-skin', 'caution', 'Scutes, not scales: start low']],
}
const taxonSensitivities: Record<string, readonly [SensitivityCode, SensitivityLevel, string][]> = {
  'Hippocampus erectus': [['copper', 'caution', 'Feeds badly under copper']],
  'Anarhichas lupus': [['handling', 'caution', 'Wounds itself in nets']],
}

/** Enters the taxa of the practice scenario with plausible weights and sensitivities; gives their ids by name. */
export async function seedTaxa(
  { animals, parts }: Composition,
  people: DemoActors,
): Promise<Map<string, string>> {
  const as = (who: DemoPerson): RequestContext => ({ actor: people[who], requestId: 'demo' })
  const ids = new Map<string, string>()
  const wanted = new Set(demoAnimals.map((animal) => animal.scientificName))
  for (const known of knownTaxa.filter((taxon) => wanted.has(taxon.scientificName))) {
    const id = parts.ids.next()
    ids.set(known.scientificName, id)
    const { scientificName, commonName, group, weight } = known
    await animals.service.enterTaxon(as('registrar'), { id, scientificName, commonName, group })
    if (weight)
      await animals.service.enterWeightBand(as('registrar'), id, {
        id: parts.ids.next(),
        stage: null,
        ...weight,
        source: known.source,
        mark: known.mark,
      })
    const said = [...(groupSensitivities[group] ?? []), ...(taxonSensitivities[scientificName] ?? [])]
    for (const [code, level, note] of said)
      await animals.service.setSensitivity(as('vet'), id, { id: parts.ids.next(), code, level, note })
  }
  return ids
}

/** An animal of the practice scenario as it was entered. */
export interface SeededAnimal extends DemoAnimal {
  id: string
  accession: string
}

/** Enters what came together, giving the accession numbers; the register puts an acquisition around it. */
export type EnterShipment = (shipment: readonly { given: Accession; demo: DemoAnimal }[]) => Promise<string[]>

/** A number between -1 and 1 that is the same on every machine. */
function wobble(seed: number): number {
  const x = Math.imul(seed + 1, 2_654_435_761) >>> 0
  const y = Math.imul(x ^ (x >>> 15), 2_246_822_519) >>> 0
  return ((y >>> 8) / 0xff_ff_ff) * 2 - 1
}

/**
 * Enters the animals and groups of the practice scenario with 90 days of weights, deaths, counts and moves, walking
 * the clock. Everything goes through the services, so numbers, stays and the audit trail are as in a real house.
 */
export async function seedAnimals(
  composition: Composition,
  outside: DemoOutside &
    Pick<DemoWaterIds, 'enclosureIds'> & { taxa: Map<string, string>; enter?: EnterShipment },
): Promise<SeededAnimal[]> {
  const { clock, now, people, taxa } = outside
  const { animals, parts } = composition
  const as = (who: DemoPerson): RequestContext => ({ actor: people[who], requestId: 'demo' })
  const at = (daysAgo: number, minutes = 0) => new Date(now.getTime() - daysAgo * dayMs + minutes * 60_000)
  const enclosureId = (code: string) => {
    const id = outside.enclosureIds.get(code)
    if (id === undefined) throw new Error(`The practice scenario has no enclosure ${code}`)
    return id
  }
  const enter: EnterShipment =
    outside.enter ??
    ((shipment) =>
      parts.transactions.inTransaction(as('registrar'), async (tx) => {
        const accessions: string[] = []
        for (const { given } of shipment)
          accessions.push((await animals.service.accessionAnimal(tx, given)).accession)
        return accessions
      }))

  const seeded: SeededAnimal[] = []
  const { later, play } = createTimeline(clock, now)
  const shipments = new Map<string, { given: Accession; demo: DemoAnimal }[]>()

  demoAnimals.forEach((animal, i) => {
    const id = parts.ids.next()
    const happenedAt = at(animal.arrivedDaysAgo).toISOString()
    const identifiers = [
      ...(animal.transponder
        ? [{ id: parts.ids.next(), kind: 'transponder' as const, value: `999 ${animal.transponder}` }]
        : []),
      ...(animal.ring
        ? [{ id: parts.ids.next(), kind: 'ring' as const, value: animal.ring, place: 'legs' }]
        : []),
    ]
    const given: Accession = {
      id,
      form: animal.form,
      taxonId: taxa.get(animal.scientificName) ?? '',
      name: animal.name ?? null,
      sex: animal.sex ?? (animal.form === 'group' ? 'mixed' : 'unknown'),
      stage: animal.stage ?? 'adult',
      count: animal.count,
      kind: animal.kind,
      enclosureId: enclosureId(animal.enclosure),
      happenedAt,
      identifiers,
      ...(animal.estimate ? { estimate: animal.estimate } : {}),
    }
    const key = `${animal.batch} ${animal.kind} ${String(animal.arrivedDaysAgo)}`
    const shipment = shipments.get(key) ?? []
    shipment.push({ given, demo: animal })
    if (shipment.length === 1) {
      shipments.set(key, shipment)
      later(happenedAt, async () => {
        const accessions = await enter(shipment)
        shipment.forEach((one, n) =>
          seeded.push({ ...one.demo, id: one.given.id, accession: accessions[n] ?? '' }),
        )
      })
    }
    const { weight } = animal
    if (!weight) return
    const firstDay = Math.min(historyDays, animal.arrivedDaysAgo) - 1
    for (let daysAgo = firstDay; daysAgo >= 1; daysAgo -= weight.everyDays) {
      const share = (historyDays - daysAgo) / historyDays
      const kg =
        weight.kg * (1 + (weight.changePercent / 100) * share) * (1 + 0.008 * wobble(i * 1000 + daysAgo))
      const animalsWeighed = animal.form === 'group' ? Math.min(5, animal.count) : 1
      const mass = kg * animalsWeighed * (weight.unit === 'g' ? 1000 : 1)
      later(at(daysAgo, 30 + i), () =>
        animals.service.recordWeight(as(i % 2 ? 'keeper' : 'tech'), accessionOf(id), {
          id: parts.ids.next(),
          weight: { value: mass.toFixed(weight.places), unit: weight.unit },
          animalsWeighed,
          basis: 'measured',
          // young sturgeon weigh less than the only band, which is for grown ones
          ...(animal.stage === 'juvenile' ? { confirmedReason: 'juvenile, weighed with its group' } : {}),
          happenedAt: at(daysAgo, 30 + i).toISOString(),
        }),
      )
    }
  })

  const accessionOf = (id: string) => seeded.find((one) => one.id === id)?.accession ?? ''
  const of = (batch: string, scientificName: string) =>
    seeded.find((one) => one.batch === batch && one.scientificName === scientificName)?.accession ?? ''
  const deaths = (daysAgo: number, batch: string, scientificName: string, count: number, note: string) =>
    later(at(daysAgo, 200), () =>
      animals.service.recordDeaths(as('keeper'), of(batch, scientificName), {
        id: parts.ids.next(),
        kind: 'found-dead',
        count,
        carcassState: 'fresh',
        carcassPlace: 'cooled',
        note,
        happenedAt: at(daysAgo, 200).toISOString(),
      }),
    )

  deaths(71, 'kelp-hall', 'Tautogolabrus adspersus', 2, 'under the outflow')
  deaths(52, 'river', 'Salvelinus fontinalis', 1, 'at the overflow grid')
  deaths(33, 'jellies', 'Aurelia aurita', 14, 'caught at the screen')
  deaths(23, 'reef', 'Amphiprion ocellaris', 1, 'in the bag, on arrival')
  deaths(5, 'reef', 'Paracanthurus hepatus', 1, 'behind the return pipe, no lesions seen')
  // more bodies than the ledger has: kept, and waiting for the registrar
  deaths(2, 'tide-table', 'Limulus polyphemus', 6, 'all in the corner pool; counted twice')
  later(at(18, 240), () =>
    animals.service.stateCount(as('keeper'), of('jellies', 'Chrysaora quinquecirrha'), {
      id: parts.ids.next(),
      basis: 'estimated',
      low: 48,
      high: 64,
      note: 'from two photographs',
      happenedAt: at(18, 240).toISOString(),
    }),
  )
  later(at(44, 260), () =>
    animals.service.splitGroup(as('tech'), of('river', 'Oncorhynchus mykiss'), {
      id: parts.ids.next(),
      form: 'group',
      count: 6,
      toEnclosureId: enclosureId('RG-2'),
      reason: 'the largest ones, to the deeper pool',
      happenedAt: at(44, 260).toISOString(),
    }),
  )

  await play()
  return seeded
}
