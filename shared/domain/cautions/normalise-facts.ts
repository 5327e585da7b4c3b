import { type CautionFacts, type FactPath, factAt, factGroups } from './caution-facts.ts'
import type { Fact } from './fact.ts'

/** Facts as an order may hold that was signed before there were other routes than the water. */
type SignedFacts = Omit<CautionFacts, 'route'> & Partial<Pick<CautionFacts, 'route'>>

/** Facts that orders were signed without before a rule asked for them: nobody said, which is unknown. */
export const askedLater = [
  'order.isBuffered',
  'order.isAired',
  'lot.isFromBulk',
  'history.animalUses',
  'water.homePh',
  'lifeSupport.biofilter',
  'animals.foodOrRelease',
  'water.totalAmmoniaNMgPerL',
  'water.nitriteNMgPerL',
  'water.unionisedAmmoniaNMgPerL',
  'water.earlierTotalAmmoniaN',
  'water.earlierNitriteN',
] as const satisfies readonly FactPath[]

function withAskedLater(facts: CautionFacts): CautionFacts {
  let whole = facts
  for (const path of askedLater) {
    const [group, name] = path.split('.') as ['order', string]
    if (name in whole[group]) continue
    whole = { ...whole, [group]: { ...whole[group], [name]: { state: 'unknown' } } }
  }
  return whole
}

/**
 * The facts, with every one that holds a figure which is no finite number set to unknown. A broken figure must not pass
 * a comparison by being neither above nor below a limit. What nobody was asked at the time is unknown.
 */
export function normaliseFacts(given: SignedFacts): CautionFacts {
  const facts = withAskedLater({ ...given, route: given.route ?? 'immersion' })
  let sound = facts
  for (const group of factGroups) {
    const broken = Object.keys(facts[group]).filter((name) => {
      const fact: Fact<unknown> = factAt(facts, `${group}.${name}` as FactPath)
      return fact.state === 'known' && !isFinite(fact.value)
    })
    if (broken.length === 0) continue
    const unknowns = Object.fromEntries(broken.map((name) => [name, { state: 'unknown' }]))
    sound = { ...sound, [group]: { ...sound[group], ...unknowns } }
  }
  return sound
}

/** Whether facts were assembled when a fact was asked for already. */
export function isAskedIn(facts: CautionFacts, path: FactPath): boolean {
  const [group, name] = path.split('.') as ['order', string]
  return name in facts[group]
}

/** Whether no figure anywhere in a value is NaN or infinite. */
function isFinite(value: unknown): boolean {
  if (typeof value === 'number') return Number.isFinite(value)
  if (typeof value !== 'object' || value === null) return true
  return Object.values(value).every(isFinite)
}
