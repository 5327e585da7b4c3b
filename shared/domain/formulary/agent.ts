import { routeOfUse } from './dose-line.ts'
import type { RouteByWeight } from '../orders/order-route.ts'

/** Agents that are given into the water. */
export const immersionAgents = [
  'formalin',
  'copper-sulfate',
  'chelated-copper',
  'chloroquine',
  'praziquantel',
  'hydrogen-peroxide',
  'chloramine-t',
  'tricaine',
  'sodium-chloride',
  'potassium-permanganate',
  'methylene-blue',
  'metronidazole',
  'oxytetracycline',
  'fenbendazole',
] as const

/** Agents that are given to the animal itself: injected, by mouth, in its feed or on its skin. */
export const systemicAgents = [
  'enrofloxacin',
  'florfenicol',
  'ceftazidime',
  'itraconazole',
  'voriconazole',
  'butorphanol',
  'ketamine',
  'meloxicam',
  'ketoprofen',
  'dexamethasone',
] as const

/** Every agent. The code names the drug itself; its established name, as printed, is in shared/messages/formulary.ts. */
export const agentCodes = [...immersionAgents, ...systemicAgents] as const

export type AgentCode = (typeof agentCodes)[number]

/**
 * Whether a drug may be ordered into the water: it is one that is given so, or a line of the formulary that is in force
 * says how much of it to a litre (an antibiotic that is injected is a bath for some animals).
 *
 * @source common practice, no source; that a line must be there: project default (P)
 */
export function isGivenInWater(
  agent: AgentCode,
  linesInForce: readonly { agent: AgentCode; use: string }[],
): boolean {
  return (
    immersionAgents.some((one) => one === agent) ||
    linesInForce.some((line) => line.agent === agent && routeOfUse(line.use) === 'immersion')
  )
}

/** Agents of the water that are given into the mouth as well; into a needle none of them goes. */
const alsoByMouth: readonly AgentCode[] = ['praziquantel', 'oxytetracycline', 'metronidazole', 'fenbendazole']

/**
 * Whether a drug may be ordered by the weight of the animal on a route: one that is given to the animal itself on any,
 * and of those given into water the few that are given by mouth too. Formalin is never injected.
 *
 * @source treatments reference, dose lines: praziquantel, metronidazole and fenbendazole by mouth (V), oxytetracycline (P);
 *         that no other is taken: project default (P)
 */
export function isGivenByWeight(agent: AgentCode, route: RouteByWeight): boolean {
  return systemicAgents.some((one) => one === agent) || (route === 'by-mouth' && alsoByMouth.includes(agent))
}

/**
 * Agents that are handled as hazards: strong oxidants, formaldehyde, copper stock.
 *
 * @source treatments reference, rule on second calculations: project default (P)
 */
export const hazardAgents: readonly AgentCode[] = [
  'formalin',
  'hydrogen-peroxide',
  'chloramine-t',
  'potassium-permanganate',
  'copper-sulfate',
  'chelated-copper',
]

/**
 * Agents that hide nothing that a quarantine protocol tests for: anaesthetics and pain killers have no effect on
 * parasite or germ. A corticosteroid is not among them: it may hide signs.
 */
const notMasking: readonly AgentCode[] = ['tricaine', 'butorphanol', 'ketamine', 'meloxicam', 'ketoprofen']

/**
 * Whether a treatment with an agent hides what quarantine tests look for, so that a window has to pass after its end.
 *
 * @source quarantine reference K14 with the treatments reference's list of masking codes: project default (P)
 */
export function masksTests(agent: AgentCode): boolean {
  return !notMasking.includes(agent)
}
