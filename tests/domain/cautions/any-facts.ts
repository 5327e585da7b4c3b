import fc from 'fast-check'
import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { type Fact, known, notApplicable, unknown } from '../../../shared/domain/cautions/fact.ts'
import { agentCodes } from '../../../shared/domain/formulary/agent.ts'
import { orderRoutes } from '../../../shared/domain/orders/order-route.ts'
import { taxonGroupNames } from '../../../shared/domain/taxa/taxon-group.ts'
import { at, minutesAgo } from './some-facts.ts'

/** A fact in any of its states. */
function anyFact<T>(value: fc.Arbitrary<T>): fc.Arbitrary<Fact<T>> {
  const age = fc.constantFrom(0, 20, 40, 200, 300, 2000)
  return fc.oneof(
    { weight: 4, arbitrary: fc.tuple(value, age).map(([one, minutes]) => known(one, minutesAgo(minutes))) },
    { weight: 1, arbitrary: value.map((one) => known(one)) },
    { weight: 1, arbitrary: fc.constant(unknown<T>()) },
    { weight: 1, arbitrary: fc.constant(notApplicable<T>()) },
  )
}

/** Figures as they come, absurd ones among them. */
const figure = fc.oneof(
  fc.constantFrom(0, 0.14, 0.15, 0.2, 0.26, 2, 5, 10, 21, 25, 50, 150, 170, 250, 1500, 5000),
  fc.integer({ min: 0, max: 3_000_000 }).map((thousandths) => thousandths / 1000),
  fc.constantFrom(-1, Number.NaN, Infinity, 100_000),
)
const unit = fc.constantFrom(
  'mg/L' as const,
  'uL/L' as const,
  'g/L' as const,
  'percent_v_v' as const,
  'mg/kg' as const,
)
const basis = fc.constantFrom('active', 'product', 'salt', 'base', 'free', 'total') as fc.Arbitrary<
  'active' | 'product' | 'salt' | 'base' | 'free' | 'total'
>
const onOff = fc.constantFrom('on' as const, 'off' as const)
const instant = fc.integer({ min: -200, max: 200 }).map((hours) => minutesAgo(hours * 60))
const date = fc.constantFrom('2024-02-29', '2025-05-13', '2026-05-13', '2026-05-14', '2027-01-31')
const animal = fc.record({
  animalId: fc.uuid(),
  label: fc.constant('HP-0001'),
  commonName: fc.constant('animal'),
  scientificName: fc.constantFrom('Esox lucius', 'Morone saxatilis', 'Sander vitreus', 'Genus species'),
  taxonGroup: fc.constantFrom(...taxonGroupNames),
  lifeStage: fc.constantFrom('egg' as const, 'fry' as const, 'adult' as const, 'unknown' as const),
  enclosureCode: fc.constant('QT-1'),
  dailyTemperatureUnits: fc.option(figure),
})
const weight = fc.record({
  animalId: fc.uuid(),
  label: fc.constant('HP-0001'),
  taxonGroup: fc.constantFrom(...taxonGroupNames),
  lifeStage: fc.constantFrom('egg' as const, 'fry' as const, 'adult' as const, 'unknown' as const),
  grams: figure,
  at: instant,
  measured: fc.boolean(),
  plausible: fc.option(fc.boolean()),
})
const use = fc.record({
  agent: fc.constantFrom(...agentCodes),
  orderNumber: fc.constant('TO-1'),
  state: fc.constantFrom('ordered' as const, 'running' as const, 'ended' as const),
  from: fc.option(instant),
  until: fc.option(instant),
})

const range = fc.record({
  low: fc.option(figure),
  high: figure,
  unit,
  basis,
  longestContactMinutes: fc.option(fc.constantFrom(10, 30, 60, 2880)),
  water: fc.constantFrom('fresh' as const, 'marine' as const, 'both' as const),
  stays: fc.boolean(),
})

const timed = fc.array(fc.record({ value: figure, at: instant }), { maxLength: 3 })

const named = fc.array(fc.constant({ label: 'HP-0419', commonName: 'trout', enclosureCode: 'QT-3' }), {
  maxLength: 1,
})

/** Facts of any order in any state of knowledge. */
export const anyFacts: fc.Arbitrary<CautionFacts> = fc.record({
  at: fc.constant(at),
  zone: fc.constantFrom('Europe/Lisbon', 'America/Halifax'),
  agent: fc.constantFrom(...agentCodes),
  route: fc.constantFrom(...orderRoutes),
  order: fc.record({
    target: anyFact(fc.record({ value: figure, unit, basis: fc.option(basis) })),
    timing: anyFact(fc.constantFrom('timed' as const, 'indefinite' as const)),
    contactMinutes: anyFact(figure),
    contactMinutesPerDay: anyFact(figure),
    setting: anyFact(fc.constantFrom('tank' as const, 'raceway' as const, 'pond' as const)),
    startsAt: anyFact(instant),
    endsAt: anyFact(instant),
    defaultRange: anyFact(range),
    agentRanges: anyFact(fc.array(range, { maxLength: 3 })),
    amountGrams: anyFact(figure),
    amountMillilitres: anyFact(figure),
    amountShareOfPlan: anyFact(figure),
    isTopUpInsideLimits: anyFact(fc.boolean()),
    dosesGiven: anyFact(fc.nat(5)),
    dosesStillIn: anyFact(fc.nat(5)),
    changedSinceLastCalculation: anyFact(fc.boolean()),
    copperCourse: anyFact(fc.constantFrom('not-started' as const, 'ramp' as const, 'hold' as const)),
    isBuffered: anyFact(fc.boolean()),
    isAired: anyFact(fc.boolean()),
    spacing: anyFact(
      fc.record({
        intervalHours: fc.constantFrom(0, 6, 24, 48, Number.NaN),
        lastGivenAt: fc.option(instant),
        givenDoses: fc.nat(5),
        plannedDoses: fc.nat(5),
        readingDriven: fc.boolean(),
      }),
    ),
  }),
  water: fc.record({
    kind: anyFact(fc.constantFrom('fresh' as const, 'brackish' as const, 'marine' as const)),
    temperatureC: anyFact(figure),
    recentTemperaturesC: anyFact(fc.array(fc.record({ value: figure, at: instant }), { maxLength: 3 })),
    oxygenMgPerL: anyFact(figure),
    pH: anyFact(figure),
    homePh: anyFact(fc.array(fc.record({ value: figure, at: instant }), { maxLength: 2 })),
    alkalinityMgPerLCaCO3: anyFact(figure),
    hardnessMgPerLCaCO3: anyFact(figure),
    freeCopperMgPerL: anyFact(figure),
    totalCopperMgPerL: anyFact(figure),
    totalAmmoniaNMgPerL: anyFact(figure),
    nitriteNMgPerL: anyFact(figure),
    unionisedAmmoniaNMgPerL: anyFact(figure),
    earlierTotalAmmoniaN: anyFact(timed),
    earlierNitriteN: anyFact(timed),
    oxygenIsLogged: anyFact(fc.boolean()),
    hasBloom: anyFact(fc.boolean()),
    hasPlantsOrAlgae: anyFact(fc.boolean()),
  }),
  animals: fc.record({
    inWater: anyFact(fc.array(animal, { maxLength: 3 })),
    unwellPercent: anyFact(figure),
    handledInLast24h: anyFact(fc.boolean()),
    foodOrRelease: anyFact(fc.record({ yes: named, notSaid: named })),
    withoutExperience: anyFact(fc.array(fc.constant('Genus species'), { maxLength: 2 })),
    weights: anyFact(fc.array(weight, { maxLength: 3 })),
    neverWeighed: anyFact(fc.array(fc.constant('HP-0002'), { maxLength: 2 })),
  }),
  volume: fc.record({
    determination: anyFact(
      fc.record({
        netVolumeLitres: figure,
        method: fc.constantFrom(
          'geometry' as const,
          'metered' as const,
          'dilution' as const,
          'estimated' as const,
        ),
        displacementSubtracted: fc.boolean(),
        errorPercent: fc.option(figure),
        determinedOn: date,
        holdsForValves: fc.boolean(),
        previousLitres: fc.option(figure),
      }),
    ),
  }),
  lifeSupport: fc.record({
    carbon: anyFact(onOff),
    ozone: anyFact(onOff),
    uv: anyFact(onOff),
    foamFractionator: anyFact(onOff),
    biofilter: anyFact(onOff),
    aeration: anyFact(onOff),
    lights: anyFact(fc.constantFrom('full' as const, 'dimmed' as const, 'off' as const)),
  }),
  lot: fc.record({
    expiresOn: anyFact(date),
    beyondUseOn: anyFact(date),
    status: anyFact(fc.constantFrom('usable' as const, 'recalled' as const, 'quarantined' as const)),
    storageFault: anyFact(fc.boolean()),
    isFromBulk: anyFact(fc.boolean()),
    densityGPerMl: anyFact(figure),
  }),
  history: fc.record({
    agentUses: anyFact(fc.array(use, { maxLength: 3 })),
    animalUses: anyFact(fc.array(use, { maxLength: 3 })),
    givenInLast24hMgPerL: anyFact(figure),
    reducerInUse: anyFact(fc.boolean()),
  }),
})
