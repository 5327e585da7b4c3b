import type { CautionFacts, TimedReading } from '../../../shared/domain/cautions/caution-facts.ts'
import { known, unknown } from '../../../shared/domain/cautions/fact.ts'
import type { Fact } from '../../../shared/domain/cautions/fact.ts'
import { unionisedAmmonia } from '../../../shared/domain/ammonia/unionised-ammonia.ts'
import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import type { Db } from '../../platform/database/db.ts'
import type { WaterFacts, WaterQuestions } from '../water/index.ts'

/** How far back a reading is one of the time before. Project default: no outside authority. */
const daysBefore = 14
const dayMs = 86_400_000
/** Temperature and pH of the same day as the ammonia; salinity changes slowly, and its newest reading counts. */
const sameDayMs = dayMs

export type NitrogenFacts = Pick<
  CautionFacts['water'],
  | 'totalAmmoniaNMgPerL'
  | 'nitriteNMgPerL'
  | 'unionisedAmmoniaNMgPerL'
  | 'earlierTotalAmmoniaN'
  | 'earlierNitriteN'
>

const newestOf = (water: WaterFacts, parameter: ReadingParameter) =>
  water.latestReadings
    .filter((reading) => reading.parameter === parameter)
    .sort((a, b) => b.at.localeCompare(a.at))[0]

function newestFact(water: WaterFacts, parameter: ReadingParameter): Fact<number> {
  const newest = newestOf(water, parameter)
  return newest
    ? known(
        newest.canonicalValue,
        newest.at,
        `${newest.waterBodyCode}, ${newest.value} ${newest.unit}`,
        newest.unit === newest.canonicalUnit && !newest.below ? newest.value : undefined,
      )
    : unknown()
}

/** Un-ionised ammonia-nitrogen of the newest ammonia; unknown where the day lacks a temperature, a pH or any salinity. */
function unionisedFact(water: WaterFacts): Fact<number> {
  const ammonia = newestOf(water, 'total-ammonia-n')
  const ph = newestOf(water, 'ph')
  const temperature = newestOf(water, 'temperature')
  const salinity = newestOf(water, 'salinity')
  if (!ammonia || !ph || !temperature || salinity?.canonicalUnit !== 'PSS-78') return unknown()
  const isOfTheDay = (at: string) => Math.abs(Date.parse(at) - Date.parse(ammonia.at)) <= sameDayMs
  if (!isOfTheDay(ph.at) || !isOfTheDay(temperature.at)) return unknown()
  const share = unionisedAmmonia({
    ph: ph.canonicalValue,
    calibration: ph.scale ?? 'unknown',
    temperatureC: temperature.canonicalValue,
    salinityPss78: salinity.canonicalValue,
  })
  return share.ok
    ? known(ammonia.canonicalValue * share.value.fraction, ammonia.at, 'worked out from the newest readings')
    : unknown()
}

/** Ammonia and nitrite of a water, newest and of the days before. A reading "below a mark" is taken as the mark. */
export async function readNitrogenFacts(
  questions: WaterQuestions,
  water: WaterFacts,
  at: Date,
  db: Db,
): Promise<NitrogenFacts> {
  async function earlier(parameter: ReadingParameter): Promise<Fact<readonly TimedReading[]>> {
    const newest = newestOf(water, parameter)
    if (!newest) return unknown()
    const rows = await questions.recentReadings(
      water.bodies.map((body) => body.id),
      parameter,
      new Date(Date.parse(newest.at) - daysBefore * dayMs),
      at,
      db,
    )
    const before = rows.filter((row) => row.at < newest.at)
    return before.length === 0
      ? unknown()
      : known(
          before.map((row) => ({ value: row.canonicalValue, at: row.at })),
          before[0]?.at ?? null,
          `the readings of the ${daysBefore} days before`,
        )
  }
  return {
    totalAmmoniaNMgPerL: newestFact(water, 'total-ammonia-n'),
    nitriteNMgPerL: newestFact(water, 'nitrite-n'),
    unionisedAmmoniaNMgPerL: unionisedFact(water),
    earlierTotalAmmoniaN: await earlier('total-ammonia-n'),
    earlierNitriteN: await earlier('nitrite-n'),
  }
}
