/** Kinds of paper that are kept with a transaction or a permit. */
export const documentKinds = [
  'permit',
  'health-certificate',
  'invoice',
  'loan-agreement',
  'transfer-form',
  'transport-notice',
  'collection-record',
  'hatch-record',
  'photograph',
  'correspondence',
  'other',
] as const
export type DocumentKind = (typeof documentKinds)[number]
