/** Kinds of paper that are kept with a transaction, a permit or a licence. */
export const documentKinds = [
  'permit',
  'licence',
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
