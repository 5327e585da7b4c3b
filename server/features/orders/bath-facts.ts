import type {
  AnimalInWater,
  CautionFacts,
  OnOff,
  TimedReading,
} from '../../../shared/domain/cautions/caution-facts.ts'
import type { CautionStage } from '../../../shared/domain/cautions/caution-rule.ts'
import { known, notApplicable, unknown } from '../../../shared/domain/cautions/fact.ts'
import type { Fact } from '../../../shared/domain/cautions/fact.ts'
import { namesOf } from '../../../shared/domain/cautions/inhabitants.ts'
import { systemicAgents } from '../../../shared/domain/formulary/agent.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import type { BathFacts } from '../../../shared/domain/orders/order-facts.ts'
import type { LifeSupportKind } from '../../../shared/domain/places/life-support-kind.ts'
import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { Db } from '../../platform/database/db.ts'
import type { AnimalFacts, AnimalQuestions } from '../animals/index.ts'
import type { WaterFacts, WaterQuestions } from '../water/index.ts'
import { readAgentHistory } from './agent-history.ts'
import { readExperiencedTaxa } from './agent-history.reads.ts'
import { readCondition } from './condition.ts'
import { readHomePh } from './home-ph.ts'
import { readNitrogenFacts } from './nitrogen-facts.ts'
import type { NitrogenFacts } from './nitrogen-facts.ts'
import type { ConditionParts } from './condition.ts'

/** Salinities that part the kinds of water. Project default: no outside authority. */
const freshBelow = 1
const marineFrom = 20
/** mg/L of calcium carbonate in one milliequivalent per litre: half its molar mass. */
const mgCaCO3PerMeq = 50.043
const hoursOfTemperatures = 4

export interface BathSituation {
  base: BathFacts
  water: WaterFacts
  /** Everybody in the connected water. */
  animals: AnimalFacts[]
}

/** Whether animals are brought to the enclosure for a bath. */
export const isVessel = (water: WaterFacts): boolean =>
  water.enclosures.some(({ id, treatmentVessel }) => id === water.enclosureId && treatmentVessel)

export interface BathFactsParts extends ConditionParts {
  dataSource: Db
  water: WaterQuestions
  zone(): Promise<string>
}

/**
 * The one reader of facts for cautions about a bath: assembles what is known, at one instant, of the water that is
 * joined to an enclosure, of everybody in it, and of what was given into it. What no table holds stays unknown.
 */
export function createBathFactsReader(parts: BathFactsParts) {
  /** Animals that an order names for a treatment vessel before they are in it: they are judged as its inhabitants to be. */
  async function broughtTo(
    water: WaterFacts,
    inside: readonly AnimalFacts[],
    ids: readonly string[],
    at: Date,
    db: Db,
  ): Promise<AnimalFacts[]> {
    const elsewhere = ids.filter((id) => !inside.some((animal) => animal.animalId === id))
    if (!isVessel(water) || elsewhere.length === 0) return []
    const found = await parts.animals.animalsById(elsewhere, at, db)
    return found.filter((animal) => animal.enclosureId !== null && animal.count.high > 0)
  }

  return {
    /**
     * @param options.named animals that the order names. Where the enclosure is a treatment vessel, those that are not in
     *                      it yet are judged as its inhabitants to be
     * @param options.stage at the start of a dose only who is there counts, save that how strong animals are is asked of
     *                      those that are still to come as well: an empty vessel says nothing of them
     * @param agent what is to be given; null while nothing is chosen, which leaves what is known of an agent unknown
     * @returns null when there is no such enclosure or it has no water
     */
    async read(
      enclosureId: string,
      agent: AgentCode | null,
      at: Date,
      options: {
        db?: Db
        exceptOrderId?: string | null
        named?: readonly string[]
        stage?: CautionStage
      } = {},
    ): Promise<BathSituation | null> {
      const db = options.db ?? parts.dataSource
      const water = await parts.water.connectedWaterAt(enclosureId, at, db)
      if (!water) return null
      const enclosureIds = water.enclosures.map((enclosure) => enclosure.id)
      const inside = await parts.animals.animalsIn(enclosureIds, at, db)
      const withThoseToCome = [...inside, ...(await broughtTo(water, inside, options.named ?? [], at, db))]
      const animals = options.stage === 'start' ? inside : withThoseToCome
      const taxonIds = [...new Set(animals.map((animal) => animal.taxonId))]
      // One after the other: inside a transaction there is one connection
      const history = await readAgentHistory(
        parts.water,
        { enclosureId, enclosureIds, agent, at },
        options,
        db,
      )
      const experienced = agent && (await readExperiencedTaxa(db, agent, taxonIds, at))
      const temperatures = await parts.water.recentReadings(
        water.bodies.map((body) => body.id),
        'temperature',
        new Date(at.getTime() - hoursOfTemperatures * 3_600_000),
        at,
        db,
      )
      const exceptInto = isVessel(water) ? water.enclosureId : null
      const food = await parts.animals.foodOrRelease(
        animals.map(({ animalId }) => animalId),
        at,
        db,
      )
      const nitrogen = await readNitrogenFacts(parts.water, water, at, db)
      const homePh =
        agent === 'tricaine'
          ? await readHomePh(parts, { water, animals: withThoseToCome, named: options.named ?? [] }, at, db)
          : notApplicable<readonly TimedReading[]>()
      const condition = await readCondition(parts, { animals: withThoseToCome, exceptInto }, at, db)
      const zone = await parts.zone()
      const newTaxa =
        experienced &&
        animals.filter((animal) => !experienced.has(animal.taxonId)).map((animal) => animal.scientificName)
      const base: BathFacts = {
        at: at.toISOString(),
        zone,
        water: { ...waterFacts(water, temperatures), homePh, ...nitrogen },
        animals: {
          inWater: known(animals.map(animalInWater), at.toISOString(), 'the register of animals'),
          unwellPercent: lookFact(condition.unwellPercent),
          handledInLast24h: lookFact(condition.handled),
          withoutExperience: newTaxa
            ? known([...new Set(newTaxa)], at.toISOString(), 'the doses recorded here')
            : unknown(),
          foodOrRelease: foodFact(
            // what is given to the animal itself reaches no other
            agent !== null && systemicAgents.some((one) => one === agent)
              ? animals.filter(({ animalId }) => (options.named ?? []).includes(animalId))
              : animals,
            food,
          ),
          weights: notApplicable(),
        },
        volume: { determination: volumeFact(water) },
        lifeSupport: {
          carbon: machineFact(water, 'carbon'),
          ozone: machineFact(water, 'ozone'),
          uv: machineFact(water, 'uv'),
          foamFractionator: machineFact(water, 'foam-fractionator'),
          biofilter: biofilterFact(water),
          aeration: machineFact(water, 'aeration'),
          lights: unknown(),
        },
        history: {
          ...history,
          reducerInUse: unknown(),
          // no order gives a drug to the animals themselves yet
          animalUses: notApplicable(),
        },
      }
      return { base, water, animals }
    },
  }
}

const lookFact = <T>(said: { value: T; at: string | null; source: string } | null): Fact<T> =>
  said ? known(said.value, said.at, said.source) : unknown()

/** Which of them may be eaten or set free, and of which nobody said; it stands since the newest statement. */
function foodFact(
  animals: readonly AnimalFacts[],
  food: Awaited<ReturnType<AnimalQuestions['foodOrRelease']>>,
): CautionFacts['animals']['foodOrRelease'] {
  const named = (wanted: 'yes' | undefined) =>
    namesOf(animals.filter(({ animalId }) => food.get(animalId)?.answer === wanted).map(animalInWater))
  const said = animals.flatMap(({ animalId }) => food.get(animalId)?.recordedAt ?? []).sort()
  return known({ yes: named('yes'), notSaid: named(undefined) }, said.at(-1) ?? null, 'the animals')
}

export type BathFactsReader = ReturnType<typeof createBathFactsReader>

function animalInWater(animal: AnimalFacts): AnimalInWater {
  return {
    animalId: animal.animalId,
    label: animal.accession,
    commonName: animal.commonName,
    scientificName: animal.scientificName,
    taxonGroup: animal.taxonGroup,
    lifeStage: animal.stage,
    enclosureCode: animal.enclosureCode ?? '',
    dailyTemperatureUnits: null,
  }
}

/**
 * The newest reading of a parameter in any of the joined bodies, in the unit of the fact. The digits of the instrument
 * go with it where it was entered in that unit: 7.0 is said as 7.0.
 */
function readingFact(
  water: WaterFacts,
  parameter: ReadingParameter,
  unit: UnitCode,
  factor = 1,
): Fact<number> {
  const newest = water.latestReadings
    .filter((reading) => reading.parameter === parameter)
    .sort((a, b) => b.at.localeCompare(a.at))[0]
  return newest
    ? known(
        newest.canonicalValue * factor,
        newest.at,
        `${newest.waterBodyCode}, ${newest.value} ${newest.unit}`,
        newest.unit === unit && !newest.below ? newest.value : undefined,
      )
    : unknown()
}

function waterKind(water: WaterFacts): CautionFacts['water']['kind'] {
  const salinity = readingFact(water, 'salinity', 'PSS-78')
  if (salinity.state !== 'known') return unknown()
  const kind = salinity.value < freshBelow ? 'fresh' : salinity.value >= marineFrom ? 'marine' : 'brackish'
  return { ...salinity, value: kind }
}

function waterFacts(
  water: WaterFacts,
  temperatures: readonly { canonicalValue: number; at: string }[],
): Omit<CautionFacts['water'], 'homePh' | keyof NitrogenFacts> {
  return {
    kind: waterKind(water),
    temperatureC: readingFact(water, 'temperature', 'degC'),
    recentTemperaturesC:
      temperatures.length === 0
        ? unknown()
        : known(
            temperatures.map((reading) => ({ value: reading.canonicalValue, at: reading.at })),
            temperatures[0]?.at ?? null,
            'the readings of the last 4 h',
          ),
    oxygenMgPerL: readingFact(water, 'dissolved-oxygen', 'mg/L'),
    pH: readingFact(water, 'ph', 'pH'),
    alkalinityMgPerLCaCO3: readingFact(water, 'alkalinity', 'mg/L_CaCO3', mgCaCO3PerMeq),
    hardnessMgPerLCaCO3: readingFact(water, 'hardness', 'mg/L_CaCO3', mgCaCO3PerMeq),
    freeCopperMgPerL: readingFact(water, 'copper-free', 'mg/L'),
    totalCopperMgPerL: readingFact(water, 'copper-total', 'mg/L'),
    oxygenIsLogged: unknown(),
    hasBloom: unknown(),
    hasPlantsOrAlgae: unknown(),
  }
}

function machineFact(water: WaterFacts, kind: LifeSupportKind): Fact<OnOff> {
  const machines = water.lifeSupport.filter((machine) => machine.kind === kind)
  if (machines.length === 0) return notApplicable()
  const running = machines.find((machine) => machine.on === true)
  if (running) return known('on', running.since, `${running.code}, from the life-support log`)
  const unrecorded = machines.find((machine) => machine.on === null)
  if (unrecorded) return unknown()
  return known('off', machines[0]?.since ?? null, 'the life-support log')
}

/** Where no biofilter is on the list of machines, another filter may do its work: that is asked, not taken as none. */
function biofilterFact(water: WaterFacts): Fact<OnOff> {
  const fact = machineFact(water, 'biofilter')
  return fact.state === 'not-applicable' ? unknown() : fact
}

/** Only a confirmed determination that holds for the valves as they stand is a volume to dose by. */
function volumeFact(water: WaterFacts): CautionFacts['volume']['determination'] {
  const { volume, volumeRefusal } = water
  if (!volume || volumeRefusal) return unknown()
  return known(
    {
      netVolumeLitres: volume.netVolumeLitres,
      method: volume.method,
      displacementSubtracted: volume.displacementSubtracted,
      errorPercent: volume.errorPercent,
      determinedOn: volume.measuredOn,
      holdsForValves: volume.holdsForThisValveState,
      previousLitres: volume.previousLitres,
    },
    volume.measuredAt,
    'the volume determination',
  )
}
