/**
 * Agents given into the water. The code names the drug itself; its established name, as printed, is in
 * shared/messages/formulary.ts.
 */
export const agentCodes = [
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

export type AgentCode = (typeof agentCodes)[number]

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

/** Agents that hide nothing that a quarantine protocol tests for: an anaesthetic has no effect on parasite or germ. */
const notMasking: readonly AgentCode[] = ['tricaine']

/**
 * Whether a bath with an agent hides what quarantine tests look for, so that a window has to pass after its end.
 *
 * @source quarantine reference K14 with the treatments reference's list of masking codes: project default (P)
 */
export function masksTests(agent: AgentCode): boolean {
  return !notMasking.includes(agent)
}
