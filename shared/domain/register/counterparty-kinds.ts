/** Kinds of party that animals come from or go to. */
export const counterpartyKinds = [
  'institution',
  'dealer',
  'collector',
  'authority',
  'person',
  'other',
] as const
export type CounterpartyKind = (typeof counterpartyKinds)[number]
