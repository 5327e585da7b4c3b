import type { Discrepancy } from '../../../shared/contracts/animals.contract.ts'
import { isMoveBreach } from '../../../shared/domain/animals/discrepancy.ts'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { waiting } from './work.ts'
import type { Moment } from './work.ts'

/**
 * Records that do not fit, each for whoever is named to explain it. Of a move against a rule the registrar is told too:
 * the places in the register rest on it. A dose that does not fit is one thing to explain, however many it was for.
 */
export function gatherDiscrepancies(discrepancies: readonly Discrepancy[], moment: Moment): TodayWork[] {
  const { roles } = moment.actor
  const told = new Set<string>()
  return discrepancies.flatMap((one) => {
    const isNamed = roles.includes(one.forRole)
    if (!isNamed && !(isMoveBreach(one.kind) && roles.includes('registrar'))) return []
    const about = one.facts['dose'] === undefined ? one.id : `${one.kind} ${String(one.facts['dose'])}`
    if (told.has(about)) return []
    told.add(about)
    const named = one.forRole === 'veterinarian' ? 'discrepancy-veterinarian' : 'discrepancy-registrar'
    return [
      waiting({
        id: `discrepancy:${one.id}`,
        kind: isNamed ? named : 'movement-marked',
        at: one.happenedAt,
        params: {
          ...factParams(one.facts),
          accession: one.accession,
          animal: one.animalName,
          code: one.kind,
        },
      }),
    ]
  })
}

/** The figures of its sentence, kept apart from the names by a prefix. */
const factParams = (facts: Discrepancy['facts']) =>
  Object.fromEntries(Object.entries(facts).map(([key, value]) => [`fact.${key}`, value]))
