import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { known, notApplicable, unknown } from '../../../shared/domain/cautions/fact.ts'
import type { Db } from '../../platform/database/db.ts'
import type { AnimalFacts, AnimalQuestions } from '../animals/index.ts'
import type { WaterFacts, WaterQuestions } from '../water/index.ts'

const newestPh = ({ latestReadings }: WaterFacts) =>
  latestReadings.filter(({ parameter }) => parameter === 'ph').sort((a, b) => b.at.localeCompare(a.at))[0]

/**
 * The newest pH of every water that the treated animals are brought from, for a bath in a treatment vessel. Unknown where
 * one of them was never measured, or on another scale than the bath: the two scales differ by half the allowed difference.
 *
 * @param asked.named animals that the order names; whoever is in the vessel where it names none
 * @returns not applicable where the animals are treated in the water that they live in
 */
export async function readHomePh(
  parts: { animals: AnimalQuestions; water: WaterQuestions },
  asked: { water: WaterFacts; animals: readonly AnimalFacts[]; named: readonly string[] },
  at: Date,
  db: Db,
): Promise<CautionFacts['water']['homePh']> {
  const { water, named } = asked
  const here = water.enclosures.map(({ id }) => id)
  if (!water.enclosures.some(({ id, treatmentVessel }) => id === water.enclosureId && treatmentVessel))
    return notApplicable()
  const treated = asked.animals.filter(({ animalId }) => named.length === 0 || named.includes(animalId))
  const inside = treated.filter(({ enclosureId }) => enclosureId !== null && here.includes(enclosureId))
  // also as part of the group that they were taken out of
  const stays = await parts.animals.whereabouts(
    inside.map(({ animalId }) => animalId),
    new Date(0),
    db,
  )
  const homeOf = ({ animalId, enclosureId }: AnimalFacts) =>
    enclosureId !== null && !here.includes(enclosureId)
      ? enclosureId
      : stays.findLast(
          (stay) =>
            stay.animalId === animalId &&
            !here.includes(stay.enclosureId) &&
            Date.parse(stay.from) <= at.getTime(),
        )?.enclosureId
  const homes = new Set(treated.map(homeOf))
  const bath = newestPh(water)
  const readings = []
  for (const home of homes) {
    const found = home === undefined ? null : await parts.water.connectedWaterAt(home, at, db)
    const reading = found && newestPh(found)
    if (!reading || (bath && reading.scale !== bath.scale)) return unknown()
    readings.push({ value: reading.canonicalValue, at: reading.at })
  }
  if (readings.length === 0) return unknown()
  const newest = readings.map((reading) => reading.at).sort()
  return known(readings, newest.at(-1) ?? null, 'the readings of the home water')
}
