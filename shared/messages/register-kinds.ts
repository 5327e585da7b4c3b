import type { CountKind } from '../domain/ledger/count-entry.ts'
import type { CounterpartyKind } from '../domain/register/counterparty-kinds.ts'
import type { DocumentKind } from '../domain/register/document-kinds.ts'
import type { ExportFormat } from '../domain/register/export-formats.ts'
import type { PermitMark } from '../domain/register/judge-permit-use.ts'
import type { CustodyKind } from '../domain/register/list-custody.ts'
import type { PermitKind, PurposeCode, SourceCode } from '../domain/register/permit-kinds.ts'
import type { PermitState } from '../domain/register/permit-state.ts'
import type { TransactionKind } from '../domain/register/transaction-kinds.ts'
import { defineMessages } from './define-messages.ts'

/** Kinds of transaction as the registrar names them: in lists and choices. */
export const transactionKindNames = defineMessages({
  'wild-collection': 'Wild collection',
  purchase: 'Purchase',
  'donation-in': 'Donation to us',
  'birth-or-hatch': 'Birth or hatch',
  propagation: 'Propagation',
  'loan-in': 'Loan in',
  'transfer-in': 'Transfer in',
  rescue: 'Rescue or stranding',
  confiscation: 'Confiscation',
  'exchange-in': 'Exchange, in',
  found: 'Found, origin unknown',
  'transfer-out': 'Transfer out',
  'loan-out': 'Loan out',
  'loan-returned': 'Return of a loan',
  sale: 'Sale',
  'donation-out': 'Donation by us',
  'exchange-out': 'Exchange, out',
  release: 'Release to the wild',
  death: 'Death',
  euthanasia: 'Euthanasia',
  escape: 'Escape',
  theft: 'Theft',
  'lost-from-count': 'Lost from count',
} satisfies Record<TransactionKind, string>)

/** Every kind of event of a history, for tables and files. */
export const custodyKindNames = defineMessages({
  'wild-collection': 'Wild collection',
  purchase: 'Purchase',
  'donation-in': 'Donation to us',
  'birth-or-hatch': 'Birth or hatch',
  propagation: 'Propagation',
  'loan-in': 'Loan in',
  'transfer-in': 'Transfer in',
  rescue: 'Rescue or stranding',
  confiscation: 'Confiscation',
  'exchange-in': 'Exchange, in',
  found: 'Found, origin unknown',
  'split-in': 'Split, in',
  'merge-in': 'Merge, in',
  'transfer-out': 'Transfer out',
  'loan-out': 'Loan out',
  'loan-returned': 'Return of a loan',
  sale: 'Sale',
  'donation-out': 'Donation by us',
  'exchange-out': 'Exchange, out',
  release: 'Release to the wild',
  death: 'Death',
  euthanasia: 'Euthanasia',
  escape: 'Escape',
  theft: 'Theft',
  'lost-from-count': 'Lost from count',
  'split-out': 'Split, out',
  'merge-out': 'Merge, out',
  'count-adjustment': 'Count adjusted',
  move: 'Move',
  counted: 'Counted',
  estimated: 'Estimated',
} satisfies Record<CountKind | CustodyKind, string>)

export const counterpartyKindNames = defineMessages({
  institution: 'Institution',
  dealer: 'Dealer',
  collector: 'Collector',
  authority: 'Authority',
  person: 'Private person',
  other: 'Other',
} satisfies Record<CounterpartyKind, string>)

export const permitKindNames = defineMessages({
  'cites-import': 'CITES import permit',
  'cites-export': 'CITES export permit',
  'cites-re-export': 'CITES re-export certificate',
  'cites-origin': 'CITES certificate of origin',
  collecting: 'Collecting permit',
  'protected-species': 'Protected-species permit',
  'import-health': 'Import health certificate',
  'authority-approval': 'Approval of the competent authority',
  'wildlife-loan': 'Wildlife loan',
  'transport-notice': 'Transport notice',
  'marine-mammal-holding': 'Marine-mammal holding permit',
  holding: 'Holding permit',
  release: 'Release permit',
  other: 'Other permit',
} satisfies Record<PermitKind, string>)

export const permitStateNames = defineMessages({
  void: 'Void',
  'not-yet': 'Not yet valid',
  expired: 'Expired',
  'runs-out': 'Runs out soon',
  valid: 'Valid',
} satisfies Record<PermitState, string>)

/** In which respect a permit does not cover a use. */
export const permitMarkNames = defineMessages({
  'over-quantity': 'More than the permit allows',
  'not-yet-valid': 'Before its first day',
  expired: 'After its last day',
  'other-taxon': 'Another taxon than it names',
  voided: 'The permit is void',
  'fewer-than-animals': 'Fewer taken under it than animals in the line',
  'more-than-animals': 'More taken under it than animals in the line',
} satisfies Record<PermitMark, string>)

export const documentKindNames = defineMessages({
  permit: 'Permit',
  licence: 'Licence or registration',
  'health-certificate': 'Health certificate',
  invoice: 'Invoice',
  'loan-agreement': 'Loan agreement',
  'transfer-form': 'Transfer form',
  'transport-notice': 'Transport notice',
  'collection-record': 'Collection record',
  'hatch-record': 'Hatch record',
  photograph: 'Photograph',
  correspondence: 'Correspondence',
  other: 'Other paper',
} satisfies Record<DocumentKind, string>)

export const exportFormatNames = defineMessages({
  pdf: 'PDF pages',
  csv: 'CSV',
  'csv-guarded': 'CSV for spreadsheets',
  json: 'JSON',
  'darwin-core': 'Darwin Core',
} satisfies Record<ExportFormat, string>)

export const sourceCodeNames = defineMessages({
  W: 'W, taken from the wild',
  R: 'R, ranched',
  D: 'D, bred for trade',
  A: 'A, propagated plant',
  C: 'C, bred in captivity',
  F: 'F, born in captivity',
  U: 'U, source unknown',
  I: 'I, confiscated',
  O: 'O, before the convention',
  X: 'X, taken from the sea',
  Y: 'Y, assisted production',
} satisfies Record<SourceCode, string>)

export const purposeCodeNames = defineMessages({
  T: 'T, trade',
  Z: 'Z, zoo or aquarium',
  S: 'S, science',
  E: 'E, education',
  N: 'N, reintroduction',
  B: 'B, breeding',
  M: 'M, medicine',
  Q: 'Q, travelling exhibition',
  H: 'H, hunting trophy',
  P: 'P, personal',
  L: 'L, law enforcement',
  G: 'G, botanical garden',
} satisfies Record<PurposeCode, string>)
