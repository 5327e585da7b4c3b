/**
 * Kinds of permit and paper that a movement of animals may need.
 *
 * @source convention articles III to V for the first four (V); the others from memory (M)
 */
export const permitKinds = [
  'cites-import',
  'cites-export',
  'cites-re-export',
  'cites-origin',
  'collecting',
  'protected-species',
  'import-health',
  'authority-approval',
  'wildlife-loan',
  'transport-notice',
  'marine-mammal-holding',
  'holding',
  'release',
  'other',
] as const
export type PermitKind = (typeof permitKinds)[number]

/**
 * Where an animal comes from in the convention's letters: W wild, R ranched, D bred for trade, A plants, C bred in
 * captivity, F born in captivity, U unknown, I confiscated, O before the convention, X from the sea, Y assisted.
 *
 * @source resolution 12.3 of the convention, from memory (M)
 */
export const sourceCodes = ['W', 'R', 'D', 'A', 'C', 'F', 'U', 'I', 'O', 'X', 'Y'] as const
export type SourceCode = (typeof sourceCodes)[number]

/**
 * What a permit was given for, in the convention's letters: T trade, Z zoos and aquariums, S science, E education,
 * N reintroduction, B breeding, M medicine, Q circus, H hunting trophy, P personal, L law enforcement, G gardens.
 *
 * @source resolution 12.3 of the convention, from memory (M)
 */
export const purposeCodes = ['T', 'Z', 'S', 'E', 'N', 'B', 'M', 'Q', 'H', 'P', 'L', 'G'] as const
export type PurposeCode = (typeof purposeCodes)[number]
