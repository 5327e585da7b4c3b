import {
  conditionBeforeBath,
  lookCountsForHours,
} from '../../../shared/domain/observations/condition-before-bath.ts'
import type { Db } from '../../platform/database/db.ts'
import type { AnimalFacts, AnimalQuestions } from '../animals/index.ts'
import { readStrength } from './strength.reads.ts'

export interface ConditionParts {
  animals: AnimalQuestions
  samplesTaken(
    db: Db,
    animalIds: readonly string[],
    during: { from: Date; at: Date },
  ): Promise<readonly Date[]>
}

const looksSource = 'the observations of the last 24 h'

/**
 * How everybody in the water bears a bath, and who will be brought to it: what looks of the last day said of them where
 * they were then, and what was done to them by the ledgers.
 *
 * @param of.exceptInto the treatment vessel that is asked about: bringing them into it is the bath's own handling
 */
export async function readCondition(
  { animals: questions, samplesTaken }: ConditionParts,
  { animals, exceptInto }: { animals: readonly AnimalFacts[]; exceptInto: string | null },
  at: Date,
  db: Db,
) {
  const during = { from: new Date(at.getTime() - lookCountsForHours * 3_600_000), at }
  const ids = animals.map(({ animalId }) => animalId)
  // One after the other: inside a transaction there is one connection
  const whereabouts = await questions.whereabouts(ids, during.from, db)
  const here = animals.flatMap(({ animalId, enclosureId, count }) =>
    enclosureId === null
      ? []
      : [{ enclosureId, low: count.low, stays: whereabouts.filter((stay) => stay.animalId === animalId) }],
  )
  const places = [...here, ...whereabouts].map(({ enclosureId }) => enclosureId)
  const looks = await readStrength(db, [...new Set(places)], at)
  const handling = await questions.handling(ids, { ...during, exceptInto }, db)
  // a case knows an animal that was taken out of a group by the group
  const asIds = [...new Set([...ids, ...whereabouts.map(({ asId }) => asId)])]
  const samples = await samplesTaken(db, asIds, during)
  const recorded = [
    ...handling.map((one) => ({ at: one.at.toISOString(), source: `the ${one.what}` })),
    ...samples.map((taken) => ({ at: taken.toISOString(), source: 'the samples' })),
  ].sort((a, b) => b.at.localeCompare(a.at))
  const { unwellPercent, handled } = conditionBeforeBath(looks, here, at.toISOString())
  const [newest] = recorded
  return {
    unwellPercent: unwellPercent && { ...unwellPercent, source: looksSource },
    // what a ledger has stands against what anybody said
    handled:
      newest && handled?.value !== true
        ? { value: true, ...newest }
        : handled && { ...handled, source: looksSource },
  }
}
