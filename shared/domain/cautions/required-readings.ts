import type { AgentCode, immersionAgents } from '../formulary/agent.ts'
import type { CautionFacts, FactPath } from './caution-facts.ts'
import type { Fact } from './fact.ts'
import { valueOf } from './fact.ts'
import type { ReadingName } from './reading-name.ts'

/** Beside oxygen, which every bath asks for. */
const byAgent: Record<
  (typeof immersionAgents)[number],
  { always: readonly ReadingName[]; fresh?: readonly ReadingName[]; marine?: readonly ReadingName[] }
> = {
  formalin: { always: ['temperature'] },
  'copper-sulfate': { always: ['pH'], fresh: ['alkalinity'], marine: ['free-copper'] },
  'chelated-copper': { always: ['pH', 'total-copper'] },
  chloroquine: { always: ['temperature'] },
  praziquantel: { always: ['temperature'] },
  'hydrogen-peroxide': { always: ['temperature'] },
  'chloramine-t': { always: ['pH', 'alkalinity'] },
  tricaine: { always: ['pH', 'temperature'] },
  'sodium-chloride': { always: ['temperature'] },
  'potassium-permanganate': { always: ['pH'] },
  'methylene-blue': { always: [] },
  metronidazole: { always: ['temperature'] },
  oxytetracycline: { always: ['pH', 'temperature'] },
  fenbendazole: { always: ['temperature'] },
}

const readingsOf = (agent: AgentCode): (typeof byAgent)[keyof typeof byAgent] =>
  agent in byAgent ? byAgent[agent as keyof typeof byAgent] : { always: [] }

/**
 * The readings of the water that a bath asks for before a dose: oxygen whatever the agent, and what the agent needs. Water of unknown kind asks for those of both kinds.
 *
 * @source project-default: the rule (R31) names the readings, which agent needs which is ours
 */
export function requiredReadings(facts: CautionFacts): readonly ReadingName[] {
  const { always, fresh = [], marine = [] } = readingsOf(facts.agent)
  const kind = valueOf(facts.water.kind)
  const isFresh = kind === null || kind === 'fresh' || kind === 'brackish'
  const isMarine = kind === null || kind === 'marine' || kind === 'brackish'
  return ['oxygen', ...always, ...(isFresh ? fresh : []), ...(isMarine ? marine : [])]
}

export const readingFacts: Record<ReadingName, FactPath> = {
  oxygen: 'water.oxygenMgPerL',
  temperature: 'water.temperatureC',
  pH: 'water.pH',
  alkalinity: 'water.alkalinityMgPerLCaCO3',
  hardness: 'water.hardnessMgPerLCaCO3',
  'free-copper': 'water.freeCopperMgPerL',
  'total-copper': 'water.totalCopperMgPerL',
  'total-ammonia': 'water.totalAmmoniaNMgPerL',
  nitrite: 'water.nitriteNMgPerL',
}

/** The reading of a name. */
export function readingFact(facts: CautionFacts, name: ReadingName): Fact<number> {
  const { water } = facts
  const all: Record<ReadingName, Fact<number>> = {
    oxygen: water.oxygenMgPerL,
    temperature: water.temperatureC,
    pH: water.pH,
    alkalinity: water.alkalinityMgPerLCaCO3,
    hardness: water.hardnessMgPerLCaCO3,
    'free-copper': water.freeCopperMgPerL,
    'total-copper': water.totalCopperMgPerL,
    'total-ammonia': water.totalAmmoniaNMgPerL,
    nitrite: water.nitriteNMgPerL,
  }
  return all[name]
}
