import type { LifeStage } from '../animals/description.ts'
import type { AgentCode } from '../formulary/agent.ts'
import type { WaterKind } from '../formulary/dose-line.ts'
import type { OrderRoute } from '../orders/order-route.ts'
import type { TaxonGroup } from '../taxa/taxon-group.ts'
import type { FacilityDate, Instant, Zone } from '../time/instant.ts'
import type { ConcentrationBasis } from '../units/basis.ts'
import type { UnitOf } from '../units/unit-table.ts'
import type { NamedAnimal } from './caution-param.ts'
import type { Fact } from './fact.ts'

export type ConcentrationUnit = UnitOf<'massConcentration'> | UnitOf<'volumeConcentration'>
/** What a target or a dose line is in: so much in the water, or so much for the weight of the animal. */
export type DoseUnit = ConcentrationUnit | UnitOf<'bodyDose'>

/** What is wanted in the water, or for the weight of the animal. Without a basis the figure has no meaning (R27). */
export interface DoseTarget {
  value: number
  unit: DoseUnit
  basis: ConcentrationBasis | null
}

/** A dose line of the formulary: its range, and what it is for. */
export interface DefaultRange {
  low: number | null
  high: number
  unit: DoseUnit
  basis: ConcentrationBasis
  /** Longest contact that its source names; null: left in the water, or to effect. */
  longestContactMinutes: number | null
  water: WaterKind
  /** Its use leaves the agent in the water. */
  stays: boolean
}

/** One animal or group in the connected water. */
export interface AnimalInWater {
  animalId: string
  /** Accession number, for the sentence. */
  label: string
  commonName: string
  scientificName: string
  taxonGroup: TaxonGroup
  lifeStage: LifeStage
  enclosureCode: string
  /** Of eggs: sum of daily mean temperatures since fertilisation, °C·days; null when not told. */
  dailyTemperatureUnits: number | null
}

/** The newest weight of one animal, or the mean of a group. */
export interface WeightFact {
  animalId: string
  /** Accession number, for the sentence. */
  label: string
  taxonGroup: TaxonGroup
  lifeStage: LifeStage
  grams: number
  at: Instant
  /** Measured on a balance, or reckoned. */
  measured: boolean
  /** Whether it lies in the plausible band of its taxon; null where the taxon has none. */
  plausible: boolean | null
}

/** Which animals may be eaten or set free, and of which nobody said; of the others somebody said that they are not. */
export interface FoodOrRelease {
  yes: readonly NamedAnimal[]
  notSaid: readonly NamedAnimal[]
}

/** An order or dose of any agent into this water, this one left out. `from` null: no day set yet; `until` null: no end. */
export interface AgentUse {
  agent: AgentCode
  orderNumber: string
  state: 'ordered' | 'running' | 'ended'
  from: Instant | null
  until: Instant | null
}

/** Net volume that the dose is worked out from. */
export interface VolumeFact {
  netVolumeLitres: number
  method: 'geometry' | 'metered' | 'dilution' | 'estimated'
  displacementSubtracted: boolean
  /** One side, percent; null when nobody gave one. */
  errorPercent: number | null
  determinedOn: FacilityDate
  /** Whether it holds for the valves as they stand. */
  holdsForValves: boolean
  /** What was confirmed for the same water before it; null when this is the first. */
  previousLitres: number | null
}

/** Doses of the same order line so far, for their spacing. */
export interface DoseSpacing {
  intervalHours: number
  lastGivenAt: Instant | null
  givenDoses: number
  plannedDoses: number
  /** Worked out from a reading each time, inside signed limits: spacing is then the limits' matter. */
  readingDriven: boolean
}

export interface TimedReading {
  value: number
  at: Instant
}

export type OnOff = 'on' | 'off'

/**
 * Everything that the rules ask, assembled by one reader at one instant and evaluated by the same code on both sides.
 * A reading's fact carries the time of the reading, and the rule judges its age.
 */
export interface CautionFacts {
  /** The instant that is judged: of signing, of the dose, or of the dose that was given and is now being recorded. */
  at: Instant
  zone: Zone
  agent: AgentCode
  route: OrderRoute
  order: {
    target: Fact<DoseTarget>
    timing: Fact<'timed' | 'indefinite'>
    /** Of one treatment. */
    contactMinutes: Fact<number>
    /** Of all treatments of one day together. */
    contactMinutesPerDay: Fact<number>
    setting: Fact<'tank' | 'raceway' | 'pond'>
    startsAt: Fact<Instant>
    endsAt: Fact<Instant>
    /** The dose line that the order names. */
    defaultRange: Fact<DefaultRange>
    /** Every dose line in force for this agent, whether the order names one or not. */
    agentRanges: Fact<readonly DefaultRange[]>
    amountGrams: Fact<number>
    amountMillilitres: Fact<number>
    /** Amount now ÷ amount planned. */
    amountShareOfPlan: Fact<number>
    isTopUpInsideLimits: Fact<boolean>
    dosesGiven: Fact<number>
    /** Doses of this order that went in and that nobody recorded as out of the water. */
    dosesStillIn: Fact<number>
    /** Volume, lot or order version other than at the last second calculation. */
    changedSinceLastCalculation: Fact<boolean>
    copperCourse: Fact<'not-started' | 'ramp' | 'hold'>
    /** Bicarbonate goes into the bath with tricaine. */
    isBuffered: Fact<boolean>
    /** Out of doors, or in a room whose air is changed. */
    isAired: Fact<boolean>
    spacing: Fact<DoseSpacing>
  }
  water: {
    kind: Fact<'fresh' | 'brackish' | 'marine'>
    /** The newest reading. */
    temperatureC: Fact<number>
    /** All readings of the hours before; the warmest of the last four counts at a boundary. */
    recentTemperaturesC: Fact<readonly TimedReading[]>
    oxygenMgPerL: Fact<number>
    pH: Fact<number>
    /** Newest pH of each water that the animals are brought from; not applicable where they are treated at home. */
    homePh: Fact<readonly TimedReading[]>
    alkalinityMgPerLCaCO3: Fact<number>
    hardnessMgPerLCaCO3: Fact<number>
    freeCopperMgPerL: Fact<number>
    totalCopperMgPerL: Fact<number>
    /** The newest, as nitrogen. */
    totalAmmoniaNMgPerL: Fact<number>
    nitriteNMgPerL: Fact<number>
    /** Worked out from the newest ammonia, temperature, pH and salinity. */
    unionisedAmmoniaNMgPerL: Fact<number>
    /** Readings of the days before the newest, mg/L as nitrogen. */
    earlierTotalAmmoniaN: Fact<readonly TimedReading[]>
    earlierNitriteN: Fact<readonly TimedReading[]>
    oxygenIsLogged: Fact<boolean>
    hasBloom: Fact<boolean>
    hasPlantsOrAlgae: Fact<boolean>
  }
  animals: {
    /** Everybody in the connected water, treated or not. */
    inWater: Fact<readonly AnimalInWater[]>
    unwellPercent: Fact<number>
    handledInLast24h: Fact<boolean>
    /** Taxa in the water for which this agent is new here: not used before, no test group, no declared experience. */
    withoutExperience: Fact<readonly string[]>
    /** Of those who are reached by the agent. */
    foodOrRelease: Fact<FoodOrRelease>
    /** Newest weights of those who are treated; whoever was never weighed is not among them. */
    weights: Fact<readonly WeightFact[]>
    /** Those who are treated and were never weighed; absent in orders signed before weights were asked for. */
    neverWeighed?: Fact<readonly string[]>
  }
  volume: {
    determination: Fact<VolumeFact>
  }
  lifeSupport: {
    carbon: Fact<OnOff>
    ozone: Fact<OnOff>
    uv: Fact<OnOff>
    foamFractionator: Fact<OnOff>
    /** On: it stands in the connected water and runs. */
    biofilter: Fact<OnOff>
    aeration: Fact<OnOff>
    lights: Fact<'full' | 'dimmed' | 'off'>
  }
  lot: {
    expiresOn: Fact<FacilityDate>
    /** Of what was compounded from it. */
    beyondUseOn: Fact<FacilityDate>
    status: Fact<'usable' | 'recalled' | 'quarantined'>
    /** Kept too cold or frozen, or a white precipitate seen. */
    storageFault: Fact<boolean>
    /** Compounded from powder that is no approved product. */
    isFromBulk: Fact<boolean>
    densityGPerMl: Fact<number>
  }
  history: {
    agentUses: Fact<readonly AgentUse[]>
    /** Other orders that are given to these animals themselves. */
    animalUses: Fact<readonly AgentUse[]>
    /** Of this agent into this water in the 24 h before, mg/L. */
    givenInLast24hMgPerL: Fact<number>
    reducerInUse: Fact<boolean>
  }
}

type FactGroup = 'order' | 'water' | 'animals' | 'volume' | 'lifeSupport' | 'lot' | 'history'

/** The name of one fact, such as `water.oxygenMgPerL`. */
export type FactPath = { [G in FactGroup]: `${G}.${Extract<keyof CautionFacts[G], string>}` }[FactGroup]

/** The groups of facts, for whoever walks them all. */
export const factGroups = [
  'order',
  'water',
  'animals',
  'volume',
  'lifeSupport',
  'lot',
  'history',
] as const satisfies readonly FactGroup[]

/** The fact of a name. */
export function factAt(facts: CautionFacts, path: FactPath): Fact<unknown> {
  const [group = '', name = ''] = path.split('.')
  const found = (facts[group as FactGroup] as Record<string, Fact<unknown>>)[name]
  return found ?? { state: 'unknown' }
}
