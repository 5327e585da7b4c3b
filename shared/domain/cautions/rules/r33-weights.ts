import type { AgentCode } from '../../formulary/agent.ts'
import { routesByWeight } from '../../orders/order-route.ts'
import { taxonGroups } from '../../taxa/taxon-group.ts'
import type { FactPath, WeightFact } from '../caution-facts.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { unknown, valueOf } from '../fact.ts'
import { hoursBetween } from '../../time/instant-arithmetic.ts'

/**
 * Drugs of which a little too much does harm: a weight twice too old stops them.
 *
 * @source project default (P): anaesthetic and opioid by injection, and voriconazole, which adds up in the animal
 */
const narrowMargin: readonly AgentCode[] = ['ketamine', 'butorphanol', 'voriconazole']

const days = (standard: number) =>
  ({ default: standard, unit: 'd', source: 'project-default', mark: 'P', tighter: 'lower' }) as const

const hoursPerDay = 24

type AgeLimits = Record<'neonateDays' | 'birdDays' | 'growingDays' | 'adultDays', number>

/**
 * How long a weight counts, by how fast such an animal gains or loses. What is not known to be adult counts as growing:
 * the shorter time is the safer one.
 */
function ageLimitDays({ taxonGroup, lifeStage }: WeightFact, limits: AgeLimits): number {
  const { neonateDays, birdDays, growingDays, adultDays } = limits
  if (lifeStage === 'egg' || lifeStage === 'larva' || lifeStage === 'fry') return neonateDays
  if (taxonGroups[taxonGroup] === 'bird') return birdDays
  return lifeStage === 'adult' ? adultDays : growingDays
}

/** A dose for a weight is as good as the weight: recent, weighed, and one that such an animal can have. */
export const weights = defineRule({
  id: 'R33',
  levels: ['warning', 'stop'],
  when: 'both',
  overridable: true,
  routes: routesByWeight,
  parameters: {
    neonateDays: days(7),
    birdDays: days(14),
    growingDays: days(30),
    adultDays: days(90),
    weightStopFactor: { default: 2, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['animals.weights', 'animals.neverWeighed'],
  findings: {
    'weight-unknown': ['weigh-animals'],
    'weight-missing': ['weigh-animals'],
    'weight-old': ['weigh-animals'],
    'weight-implausible': ['weigh-animals'],
    'weight-estimated': ['weigh-animals'],
  },
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: () => true,
  judge({ agent, animals, at }, limits) {
    const resolvedBy = ['weigh-animals'] as const
    const found: CautionFinding[] = []
    const neverWeighed = animals.neverWeighed ?? unknown<readonly string[]>()
    const unknowns: FactPath[] = []
    if (animals.weights.state === 'unknown') unknowns.push('animals.weights')
    if (neverWeighed.state === 'unknown') unknowns.push('animals.neverWeighed')
    // without a weight there is no amount, whatever the drug
    if (unknowns.length > 0)
      found.push({ code: 'weight-unknown', level: 'stop', params: {}, resolvedBy, unknown: unknowns })
    const weighed = valueOf(animals.weights) ?? []
    const never = valueOf(neverWeighed) ?? []
    if (never.length > 0)
      found.push({ code: 'weight-missing', level: 'stop', params: { animals: never }, resolvedBy })
    const old = weighed.flatMap((one) => {
      const limitDays = ageLimitDays(one, limits)
      const ageDays = hoursBetween(one.at, at) / hoursPerDay
      const isStop = narrowMargin.includes(agent) && exceeds(ageDays, limitDays * limits.weightStopFactor)
      return exceeds(ageDays, limitDays) ? [{ label: one.label, limitDays, isStop }] : []
    })
    // animals of one limit and one level are one sentence
    for (const isStop of [true, false])
      for (const limitDays of new Set(old.map((one) => one.limitDays))) {
        const named = old.filter((one) => one.limitDays === limitDays && one.isStop === isStop)
        if (named.length > 0)
          found.push({
            code: 'weight-old',
            level: isStop ? 'stop' : 'warning',
            params: { animals: named.map(({ label }) => label), limitDays },
            resolvedBy,
          })
      }
    const name = (some: readonly WeightFact[]) => some.map(({ label }) => label)
    const odd = weighed.filter(({ plausible }) => plausible === false)
    if (odd.length > 0)
      found.push({ code: 'weight-implausible', level: 'warning', params: { animals: name(odd) }, resolvedBy })
    const reckoned = weighed.filter(({ measured }) => !measured)
    if (reckoned.length > 0)
      found.push({
        code: 'weight-estimated',
        level: 'warning',
        params: { animals: name(reckoned) },
        resolvedBy,
      })
    return found
  },
})
