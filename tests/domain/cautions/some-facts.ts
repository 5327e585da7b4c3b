import type {
  AnimalInWater,
  CautionFacts,
  DefaultRange,
  DoseTarget,
} from '../../../shared/domain/cautions/caution-facts.ts'
import type { CautionSettings, CautionStage } from '../../../shared/domain/cautions/caution-rule.ts'
import { type Caution, evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { known, notApplicable } from '../../../shared/domain/cautions/fact.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import type { TaxonGroup } from '../../../shared/domain/taxa/taxon-group.ts'

/** The instant that the facts of these tests are judged at. */
export const at = '2026-05-14T14:20:00Z'

/** So many minutes before the instant judged. */
export function minutesAgo(minutes: number): string {
  return new Date(Date.parse(at) - minutes * 60_000).toISOString()
}

/** A reading so many minutes old. */
export function read(value: number, minutes = 10) {
  return known(value, minutesAgo(minutes), 'reading')
}

/** An animal of a group in tank QT-3. */
export function anAnimal(taxonGroup: TaxonGroup, more: Partial<AnimalInWater> = {}): AnimalInWater {
  return {
    animalId: `animal-${taxonGroup}`,
    label: 'HP-0419',
    commonName: taxonGroup,
    scientificName: 'Genus species',
    taxonGroup,
    lifeStage: 'adult',
    enclosureCode: 'QT-3',
    dailyTemperatureUnits: null,
    ...more,
  }
}

/** What a test changes of the facts. */
export type Change = {
  [G in keyof CautionFacts]?: CautionFacts[G] extends string ? CautionFacts[G] : Partial<CautionFacts[G]>
}

/** Facts of a bath at which no rule has anything to say; a test changes what it is about. */
export function someFacts(agent: AgentCode, target: DoseTarget, change: Change = {}): CautionFacts {
  const quiet: CautionFacts = {
    at,
    zone: 'Europe/Lisbon',
    agent,
    route: 'immersion',
    order: {
      target: known(target),
      timing: known('timed'),
      contactMinutes: known(45),
      contactMinutesPerDay: known(45),
      setting: known('tank'),
      startsAt: known(at),
      endsAt: known(new Date(Date.parse(at) + 45 * 60_000).toISOString()),
      defaultRange: known({
        low: null,
        high: target.value,
        unit: target.unit,
        basis: target.basis ?? 'active',
        longestContactMinutes: null,
        water: 'both',
        stays: true,
      }),
      agentRanges: known([]),
      amountGrams: known(10),
      amountMillilitres: notApplicable(),
      amountShareOfPlan: known(1),
      isTopUpInsideLimits: known(false),
      dosesGiven: known(1),
      dosesStillIn: known(0),
      changedSinceLastCalculation: known(false),
      copperCourse: known('not-started'),
      isBuffered: known(true),
      isAired: known(true),
      spacing: known({
        intervalHours: 24,
        lastGivenAt: null,
        givenDoses: 0,
        plannedDoses: 3,
        readingDriven: false,
      }),
    },
    water: {
      kind: known('marine'),
      temperatureC: read(18),
      recentTemperaturesC: known([]),
      oxygenMgPerL: read(7.8),
      pH: read(8),
      homePh: notApplicable(),
      alkalinityMgPerLCaCO3: read(120),
      hardnessMgPerLCaCO3: read(150),
      freeCopperMgPerL: read(0),
      totalCopperMgPerL: read(0),
      totalAmmoniaNMgPerL: read(0.02),
      nitriteNMgPerL: read(0.02),
      unionisedAmmoniaNMgPerL: read(0.001),
      earlierTotalAmmoniaN: known([{ value: 0.02, at: minutesAgo(1440) }]),
      earlierNitriteN: known([{ value: 0.02, at: minutesAgo(1440) }]),
      oxygenIsLogged: known(true),
      hasBloom: known(false),
      hasPlantsOrAlgae: known(false),
    },
    animals: {
      inWater: known([anAnimal('teleost')]),
      unwellPercent: known(0),
      handledInLast24h: known(false),
      withoutExperience: known([]),
      foodOrRelease: known({ yes: [], notSaid: [] }),
      weights: notApplicable(),
      neverWeighed: notApplicable(),
    },
    volume: {
      determination: known({
        netVolumeLitres: 2220,
        method: 'dilution',
        displacementSubtracted: true,
        errorPercent: 2,
        determinedOn: '2026-03-02',
        holdsForValves: true,
        previousLitres: null,
      }),
    },
    lifeSupport: {
      carbon: known('off'),
      ozone: known('off'),
      uv: known('off'),
      foamFractionator: known('off'),
      biofilter: known('off'),
      aeration: known('on'),
      lights: known('dimmed'),
    },
    lot: {
      expiresOn: known('2028-03-31'),
      beyondUseOn: notApplicable(),
      status: known('usable'),
      storageFault: known(false),
      isFromBulk: known(false),
      densityGPerMl: notApplicable(),
    },
    history: {
      agentUses: known([]),
      animalUses: known([]),
      givenInLast24hMgPerL: known(0),
      reducerInUse: known(false),
    },
  }
  return {
    ...quiet,
    at: change.at ?? quiet.at,
    zone: change.zone ?? quiet.zone,
    order: { ...quiet.order, ...change.order },
    water: { ...quiet.water, ...change.water },
    animals: { ...quiet.animals, ...change.animals },
    volume: { ...quiet.volume, ...change.volume },
    lifeSupport: { ...quiet.lifeSupport, ...change.lifeSupport },
    lot: { ...quiet.lot, ...change.lot },
    history: { ...quiet.history, ...change.history },
  }
}

/** What fires, as `R05 stop formalin-over-ceiling`. */
export function fired(
  facts: CautionFacts,
  stage: CautionStage = 'design',
  settings: CautionSettings = {},
): string[] {
  return cautions(facts, stage, settings).map(({ ruleId, level, code }) => `${ruleId} ${level} ${code}`)
}

/** What one rule fires. */
export function firedBy(ruleId: string, facts: CautionFacts, stage: CautionStage = 'design'): string[] {
  return fired(facts, stage)
    .filter((line) => line.startsWith(`${ruleId} `))
    .map((line) => line.slice(4))
}

export function cautions(
  facts: CautionFacts,
  stage: CautionStage = 'design',
  settings: CautionSettings = {},
): Caution[] {
  return evaluateCautions({ facts, stage, settings }).cautions
}

/** A dose line of an agent in mg of it per litre, for any water and any time unless told. */
export function aLine(high: number, change: Partial<DefaultRange> = {}): DefaultRange {
  return {
    low: null,
    high,
    unit: 'mg/L',
    basis: 'active',
    longestContactMinutes: null,
    water: 'both',
    stays: true,
    ...change,
  }
}

/** A formalin target in microlitres of product per litre. */
export function formalin(value: number): DoseTarget {
  return { value, unit: 'uL/L', basis: 'product' }
}
