import type { Discrepancy } from '../../../shared/contracts/animals.contract.ts'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { waiting } from './work.ts'
import type { Moment } from './work.ts'

/** Records that do not fit, each for whoever is named to explain it. */
export function gatherDiscrepancies(discrepancies: readonly Discrepancy[], moment: Moment): TodayWork[] {
  return discrepancies
    .filter(({ forRole }) => moment.actor.roles.some((role) => role === forRole))
    .map((one) =>
      waiting({
        id: `discrepancy:${one.id}`,
        kind: one.forRole === 'veterinarian' ? 'discrepancy-veterinarian' : 'discrepancy-registrar',
        at: one.happenedAt,
        params: {
          ...factParams(one.facts),
          accession: one.accession,
          animal: one.animalName,
          code: one.kind,
        },
      }),
    )
}

/** The figures of its sentence, kept apart from the names by a prefix. */
const factParams = (facts: Discrepancy['facts']) =>
  Object.fromEntries(Object.entries(facts).map(([key, value]) => [`fact.${key}`, value]))
