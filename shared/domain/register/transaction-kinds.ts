import type { CountKind } from '../ledger/count-entry.ts'

/** What is asked of a kind of transaction. */
export interface TransactionKindRules {
  way: 'in' | 'out'
  /** Whether another party must be named, may be, or has no part in it. */
  party: 'needed' | 'possible' | 'none'
  /** Something that befalls the collection: it is only ever recorded after it happened, so no rule refuses it. */
  befalls: boolean
  /** The other party stays or becomes the owner. */
  loan: boolean
}

const dealt = (way: 'in' | 'out', loan = false): TransactionKindRules => ({
  way,
  party: 'needed',
  befalls: false,
  loan,
})
const open = (way: 'in' | 'out'): TransactionKindRules => ({
  way,
  party: 'possible',
  befalls: false,
  loan: false,
})
const befallen = (way: 'in' | 'out', party: 'possible' | 'none' = 'none'): TransactionKindRules => ({
  way,
  party,
  befalls: true,
  loan: false,
})

/**
 * The kinds of transaction in the registrar's trade terms. Each is also the kind of the line it writes into the count
 * ledger; splits, merges and adjustments move animals inside the house and are no transactions.
 *
 * @source project-default: the list of kinds is common practice of registrars, from memory
 */
export const transactionKinds = {
  'wild-collection': open('in'),
  purchase: dealt('in'),
  'donation-in': dealt('in'),
  'birth-or-hatch': befallen('in'),
  propagation: befallen('in'),
  'loan-in': dealt('in', true),
  'transfer-in': dealt('in'),
  rescue: befallen('in', 'possible'),
  confiscation: dealt('in'),
  'exchange-in': dealt('in'),
  found: befallen('in', 'possible'),
  'transfer-out': dealt('out'),
  'loan-out': dealt('out', true),
  'loan-returned': dealt('out'),
  sale: dealt('out'),
  'donation-out': dealt('out'),
  'exchange-out': dealt('out'),
  release: open('out'),
  death: befallen('out'),
  euthanasia: befallen('out'),
  escape: befallen('out'),
  theft: befallen('out'),
  'lost-from-count': befallen('out'),
} as const satisfies Partial<Record<CountKind, TransactionKindRules>>

export type TransactionKind = keyof typeof transactionKinds
export const transactionKindNames = Object.keys(transactionKinds) as [TransactionKind, ...TransactionKind[]]

const ofWay = (way: 'in' | 'out') =>
  transactionKindNames.filter((kind) => transactionKinds[kind].way === way) as [
    TransactionKind,
    ...TransactionKind[],
  ]
/** Kinds by which animals come into the collection. */
export const acquisitionKinds = ofWay('in')
/** Kinds by which they leave it. */
export const dispositionKinds = ofWay('out')
