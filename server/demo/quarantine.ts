import { allWell } from '../../shared/domain/observations/observation.ts'
import type { Composition } from '../composition.ts'
import type { RequestContext } from '../platform/http/request-context.ts'
import type { SeededAnimal } from './animals.ts'
import { createCaseTeller, createLooks } from './case-teller.ts'
import type { CaseStory, TellerParts } from './case-teller.ts'
import { createTimeline, demoTimes, historyDays } from './demo-time.ts'
import { demoPassword } from './people.ts'
import { demoProtocols, demoProtocolSource } from './quarantine-protocols.ts'
import type { DemoOutside, DemoWaterIds } from './water.ts'

const minuteMs = 60_000
const hourMs = 60 * minuteMs

interface StoryParts extends TellerParts {
  batch: (...names: string[]) => SeededAnimal[]
  enclosureId: (code: string) => string
  waterBodyId: (code: string) => string
}

/**
 * The quarantine wing of the practice scenario: protocols of the house, seven cases in different states with what was
 * seen of them every day, and the rounds of the galleries. Everything goes through the services on a walking clock.
 */
export async function seedQuarantine(
  composition: Composition,
  outside: DemoOutside &
    Pick<DemoWaterIds, 'enclosureIds' | 'waterBodyIds'> & { seeded: readonly SeededAnimal[] },
): Promise<void> {
  const { clock, now, people, seeded, enclosureIds } = outside
  const times = demoTimes(now, await composition.facility.service.zone())
  const timeline = createTimeline(clock, now)
  clock.set(new Date(now.getTime() - historyDays * 24 * hourMs))
  const protocols = await seedProtocols(composition, outside)
  const parts: StoryParts = {
    composition,
    people,
    times,
    timeline,
    now,
    protocols,
    batch: (...names) => seeded.filter((one) => names.includes(one.batch)),
    enclosureId: (code) => enclosureIds.get(code) ?? '',
    waterBodyId: (code) => outside.waterBodyIds.get(code) ?? '',
  }
  lumpfish(parts)
  amphibians(parts)
  seahorses(parts)
  reef(parts)
  sturgeon(parts)
  rays(parts)
  cod(parts)
  galleries(parts)
  await timeline.play()
}

/** Proposes the protocols of the house and has a veterinarian confirm them; gives the versions in force by code. */
async function seedProtocols(
  { quarantine, parts }: Composition,
  { people }: DemoOutside,
): Promise<Map<string, string>> {
  const { protocols } = quarantine.services
  const as = (who: 'tech' | 'vet'): RequestContext => ({ actor: people[who], requestId: 'demo' })
  const [simple] = await quarantine.queries.protocols()
  const ids = new Map([[simple?.code ?? '', simple?.id ?? '']])
  await protocols.confirm(as('vet'), simple?.code ?? '', 1, 'Read through; taken as it is')
  for (const { code, name, content } of demoProtocols) {
    const id = parts.ids.next()
    await protocols.propose(as('tech'), {
      id,
      code,
      name,
      content: JSON.parse(JSON.stringify(content)) as never,
      source: demoProtocolSource,
      mark: 'P',
      reason: 'Written down for the quarantine wing',
    })
    ids.set(code, await protocols.confirm(as('vet'), code, 1, 'Read through step by step'))
  }
  return ids
}

/** Cleared a month ago, with a certificate, and moved to the kelp forest. */
function lumpfish(parts: StoryParts): void {
  const members = parts.batch('lumpfish')
  const told = { name: 'Lumpfish', protocol: 'QP-30', enclosure: 'QT-6', arrivedDaysAgo: 66, members }
  const story = createCaseTeller(parts, told)
  story.looks('QT-6', [65, 30], '08:20', { not: [48] })
  story.sample([52, '10:10'], [51, '16:00'], 'sample-1', { testKey: 'wet-mount', result: 'negative' })
  story.sample([37, '10:20'], [36, '15:30'], 'sample-2', { testKey: 'wet-mount', result: 'negative' })
  story.step([36, '16:10'], 'decide', 'Nothing against it', 'vet')
  story.then([30, '11:00'], async (at) => {
    const { services, printClearance } = parts.composition.quarantine
    const given = { password: demoPassword, expectedUnmet: [] }
    await services.clearance.clear(story.as('vet'), story.number(), given, new Date(at))
    await printClearance(story.number(), story.as('vet'))
  })
  story.then([29, '10:00'], (happenedAt) =>
    parts.composition.animals.service.moveAnimal(story.as('keeper'), members[0]?.accession ?? '', {
      id: story.next(),
      fromEnclosureId: parts.enclosureId('QT-6'),
      toEnclosureId: parts.enclosureId('KH-1'),
      happenedAt,
      reason: 'Cleared; to the kelp forest',
    }),
  )
}

/** Repeated PCR: the second round gave no answer and has to be taken again. */
function amphibians(parts: StoryParts): void {
  const members = parts.batch('amphibians')
  const told = {
    name: 'Axolotls and poison frogs',
    protocol: 'QP-09',
    enclosure: 'QT-5',
    arrivedDaysAgo: 38,
    members,
  }
  const story = createCaseTeller(parts, told)
  story.looks('QT-5', [37, 0], '08:50', {
    other: { 12: { feeding: 'some', words: 'Reed spits out worms' }, 6: { words: 'Reed feeds again' } },
  })
  story.sample([36, '10:40'], [33, '14:00'], 'swab-1', { testKey: 'skin-pcr', result: 'negative' })
  story.sample([31, '09:20'], [31, '15:00'], 'faecal-1', { testKey: 'faecal', result: 'negative' })
  story.sample([17, '09:20'], [17, '15:10'], 'faecal-2', { testKey: 'faecal', result: 'negative' })
  story.report([12, '09:00'], { kind: 'not-feeding', subject: 'Reed' })
  story.report([6, '09:00'], { kind: 'feeding', subject: 'Reed' })
  const repeat = 'Too little on two of the swabs'
  story.sample([7, '10:50'], [3, '13:20'], 'swab-2', { testKey: 'skin-pcr', result: 'inconclusive' }, repeat)
  story.sample([3, '09:30'], [3, '16:00'], 'faecal-3', { testKey: 'faecal', result: 'negative' })
}

/** Nothing stands between these and clearance. */
function seahorses(parts: StoryParts): void {
  const members = parts.batch('seahorses')
  const told = { name: 'Lined seahorses', protocol: 'QP-30', enclosure: 'QT-2', arrivedDaysAgo: 33, members }
  const story = createCaseTeller(parts, told)
  const counted = { count: { basis: 'counted', low: 14, high: 14 } } as const
  story.looks('QT-2', [32, 0], '08:30', {
    other: { 28: counted, 21: counted, 14: counted, 7: counted, 1: counted },
  })
  story.sample([19, '10:00'], [18, '16:00'], 'sample-1', { testKey: 'wet-mount', result: 'negative' })
  story.sample([4, '10:00'], [3, '16:00'], 'sample-2', { testKey: 'wet-mount', result: 'negative' })
}

/** Said on the day of a bath, which asks for it. */
const fitForBath = { unwell: 0, handled: false }

/** Under copper; three late animals of the shipment set its clock back, and an unexplained death extends it. */
function reef(parts: StoryParts): void {
  const members = parts.batch('reef')
  const told = { name: 'Reef shipment', protocol: 'QP-03', enclosure: 'QT-1', arrivedDaysAgo: 24, members }
  const story = createCaseTeller(parts, told)
  const spots = { skin: 'marks', signs: ['white-spots', 'rubbing'], forVeterinarian: true } as const
  const spotted = parts.composition.parts.ids.next()
  story.looks('QT-1', [23, 0], '08:10', {
    not: [9],
    other: { 23: { feeding: 'some' }, 2: { feeding: 'some' } },
  })
  story.looks('QT-1', [22, 1], '15:40', {
    not: [9],
    other: { 5: { foundDead: null, words: 'One tang stays behind the pipe' } },
  })
  story.look(
    'QT-1',
    parts.times.at(23, '16:20'),
    { ...allWell, ...spots, words: 'Fine spots on two tangs' },
    { id: spotted },
  )
  story.then([22, '08:40'], () =>
    parts.composition.quarantine.services.observations.review(story.as('vet'), spotted, {
      id: story.next(),
      words: 'Seen. Copper from this afternoon.',
    }),
  )
  story.sample([23, '10:30'], [23, '15:00'], 'mounts-in', {
    testKey: 'wet-mount',
    result: 'negative',
  })
  story.event([22, '14:00'], {
    kind: 'treatment-started',
    treatmentId: 'copper-qt-1',
    agentName: 'copper',
    masks: true,
    plannedEndOn: parts.times.dateOf(-13),
  })
  copperReadings(parts, story)
  story.joins(12, parts.batch('reef-addition'))
  story.step([11, '09:30'], 'count-in', 'The three lionfish counted in')
  story.sample([10, '10:30'], [10, '15:00'], 'mounts-in', { testKey: 'wet-mount', result: 'negative' })
  // reported, restarted the clock, and found to be a mistake
  const gear = parts.composition.parts.ids.next()
  story.report(
    [7, '17:10'],
    { kind: 'addition', what: 'undisinfected-gear', into: 'same-water' },
    'Net of QT-6 in the water',
    gear,
  )
  story.decide([6, '09:15'], 'The net had stood in the disinfectant over night, see the hygiene log', {
    kind: 'voided',
    voidsEventId: gear,
  })
  const urgentAt = new Date(parts.now.getTime() - 40 * minuteMs)
  story.look('QT-1', urgentAt.toISOString(), {
    lookedAt: true,
    breathing: 'fast',
    signs: ['gasping', 'listless'],
    words: 'Quill at the surface, gasping; the others are quiet',
    forVeterinarian: true,
    urgent: true,
  })
}

/** Free copper as it was read each day of the course: three days of ramp, then held. */
function copperReadings(parts: StoryParts, story: CaseStory): void {
  const { measurements } = parts.composition.water.services
  const held = ['0.16', '0.17', '0.15', '0.18', '0.16', '0.16', '0.17']
  for (let day = 0; day <= 22; day++) {
    const moment = [22 - day, '11:30'] as const
    if (!parts.times.hasBeen(...moment)) continue
    const value = ['0.05', '0.10'][day] ?? held[day % held.length] ?? ''
    story.then(moment, (happenedAt) =>
      measurements.recordReadings(story.as('tech2'), {
        waterBodyId: parts.waterBodyId('QT-1'),
        happenedAt,
        readings: [
          {
            id: story.next(),
            parameter: 'copper-free',
            value: { value, unit: 'mg/L' },
            instrument: 'Photometer 2',
          },
        ],
      }),
    )
  }
}

/** A death that extended the clock until a veterinarian signed its cause; gill clips are due. */
function sturgeon(parts: StoryParts): void {
  const members = parts.batch('sturgeon')
  const told = { name: 'Young sturgeon', protocol: 'QP-02', enclosure: 'QT-4', arrivedDaysAgo: 21, members }
  const story = createCaseTeller(parts, told)
  const death = parts.composition.parts.ids.next()
  const accession = members[0]?.accession ?? ''
  story.looks('QT-4', [20, 0], '08:40', {
    not: [13],
    other: { 17: { feeding: 'some', signs: ['mucus'], ...fitForBath }, 2: fitForBath, 0: fitForBath },
  })
  story.look(
    'QT-4',
    parts.times.at(13, '08:40'),
    { ...allWell, foundDead: 1, words: 'One behind the tank, dry', forVeterinarian: true },
    { deaths: [{ id: death, accession, count: 1 }] },
  )
  story.sample([14, '10:00'], [12, '15:00'], 'clip-1', { testKey: 'gill-clip', result: 'negative' })
  story.then([11, '16:30'], (at) =>
    parts.composition.quarantine.services.events.signDeathCause(
      story.as('vet'),
      story.number(),
      death,
      {
        finding: 'explained-not-transmissible',
        cause: 'jumped past the open cover; organs without change',
        password: demoPassword,
      },
      new Date(at),
    ),
  )
}

/** On praziquantel; the clock stood still while the pump was out. */
function rays(parts: StoryParts): void {
  const members = parts.batch('rays')
  const told = { name: 'Stingrays', protocol: 'QP-05', enclosure: 'QT-3', arrivedDaysAgo: 19, members }
  const story = createCaseTeller(parts, told)
  story.looks('QT-3', [18, 0], '09:00', {
    other: {
      18: { feeding: 'none' },
      17: { feeding: 'some' },
      16: { feeding: 'some' },
      14: fitForBath,
      0: fitForBath,
    },
  })
  story.sample([16, '11:00'], [15, '12:00'], 'baseline', { testKey: 'baseline', result: 'negative' })
  story.step([14, '16:30'], 'prazi-1', '2 mg/L, left in the water')
  const pump = parts.composition.parts.ids.next()
  story.report(
    [10, '20:00'],
    { kind: 'pause-started', cause: 'life-support-failure' },
    'Circulation pump out; air stones in',
    pump,
    'tech',
  )
  story.report([9, '23:10'], { kind: 'pause-ended', pauseId: pump }, 'Spare pump runs', undefined, 'tech')
  story.decide([12, '17:00'], 'Both take squid from the tongs, three days running', {
    kind: 'criterion-declared',
    criterionId: 'feeding',
    met: true,
  })
}

/** Held by a keeper while ammonia climbs; the call was seen. */
function cod(parts: StoryParts): void {
  const members = parts.batch('cod')
  const told = { name: 'Codling', protocol: 'QP-30', enclosure: 'QT-6', arrivedDaysAgo: 9, members }
  const story = createCaseTeller(parts, told)
  const counted = { count: { basis: 'counted', low: 24, high: 24 } } as const
  story.looks('QT-6', [8, 0], '08:25', {
    other: { 5: counted, 2: { feeding: 'some' }, 0: { feeding: 'some' } },
  })
  story.looks('QT-6', [7, 2], '16:10')
  const calledAt = new Date(parts.now.getTime() - 26 * hourMs)
  const { quarantine, parts: platform } = parts.composition
  const noticeId = platform.ids.next()
  story.then(calledAt, (happenedAt) =>
    quarantine.services.observations.record(story.as('keeper'), {
      ...allWell,
      id: story.next(),
      schemaVersion: 1,
      origin: 'online',
      device: 'Phone of the quarantine wing',
      happenedAt,
      enclosure: 'QT-6',
      deaths: [],
      feeding: 'none',
      breathing: 'fast',
      signs: ['gasping'],
      words: 'Whole school at the return, ammonia test darker than yesterday',
      forVeterinarian: true,
      urgent: true,
      noticeId,
    }),
  )
  story.then(new Date(calledAt.getTime() + 2 * minuteMs), (happenedAt) =>
    quarantine.services.events.hold(story.as('keeper'), story.number(), {
      id: story.next(),
      happenedAt,
      origin: 'online',
      device: 'Phone of the quarantine wing',
      reason: 'Ammonia climbs, fish breathe fast',
    }),
  )
  story.then(new Date(calledAt.getTime() + 17 * minuteMs), () =>
    quarantine.services.notices.noteSeen(story.as('vet'), noticeId, story.next()),
  )
}

/** The rounds of the galleries, whole days before and after the cases. */
function galleries(parts: StoryParts): void {
  const { looks, look } = createLooks(parts)
  looks('KH-1', [89, 0], '09:30', { everyDays: 2 })
  looks('RG-2', [88, 0], '10:00', { everyDays: 3 })
  looks('OC-1', [87, 0], '09:40', {
    everyDays: 3,
    other: { 24: { words: 'Marl took the jar apart in four minutes' } },
  })
  looks('RP-1', [86, 0], '10:20', { everyDays: 4 })
  look('RP-1', parts.times.at(1, '15:20'), {
    lookedAt: true,
    feeding: 'some',
    words: 'Sail left half of the herring, thinner along the spine',
    signs: ['thin'],
    forVeterinarian: true,
  })
}
