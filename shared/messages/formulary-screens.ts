import { counted, defineMessages } from './define-messages.ts'

/** Words of the formulary: dose lines, products and their lots. */
export const formularyWords = defineMessages({
  title: 'Formulary',
  sheet: 'Pharmacy: formulary',
  place: 'Pharmacy',
  source:
    'Baths: what range is usual, where the figure comes from, and who confirmed it here. Nothing is filled in from it.',
  to: 'to',
  upTo: (p: { amount: string }) => `up to ${p.amount}`,
  search: 'Drug, use or product',
  state: 'Standing',
  anyState: 'Any standing',
  drug: 'Drug',
  anyDrug: 'Every drug',

  lines: 'Dose lines',
  use: 'Drug and use',
  range: 'Range',
  water: 'Water',
  contact: 'Longest contact',
  noContact: 'none named',
  intoNoWater: 'none: given to the animal',
  origin: 'Source and mark',
  standing: 'Standing',
  noLines: 'No dose line here',
  noneBody: 'Nothing matches the search and filters. Take a filter away to see more.',
  confirmedBy: (p: { by: string; at: string }) => `${p.by}, ${p.at}`,
  read: 'Read',
  readLine: (p: { drug: string; use: string }) => `${p.drug}, ${p.use}`,

  lineTitle: 'Dose line',
  lineUse: 'Use',
  basis: 'Counted',
  mark: 'Mark',
  citation: 'Source',
  confirmedWho: 'Confirmed by',
  notConfirmed: 'nobody here yet',
  confirm: 'Confirm for this facility',
  confirmQuestion: (p: { drug: string }) => `Confirm this line of ${p.drug}?`,
  confirmBody:
    'Your name and the time will stand beside it. Confirm what you have checked against its source, the label and local law.',
  confirmReason: 'How it was checked',
  confirmBack: 'Leave it as it is',
  confirmed: 'The line is confirmed.',
  alreadyConfirmed: 'Confirmed already.',
  productsOfDrug: 'Products of this drug',
  gone: 'There is no such line in force, or another has taken its place.',

  products: 'Products and lots',
  product: 'Product',
  strength: 'Strength',
  notAsEntered: 'Not what was entered: do not use it. Enter the product anew, and tell the administrator.',
  lots: 'Lots',
  noProducts: 'No product here',
  noneOfDrug: 'No product of this drug is entered.',
  notInUse: 'not in use',
  noLots: 'no lot entered',
  lot: (p: { lot: string; expires: string }) => `${p.lot}, use by ${p.expires}`,
  clear: (p: { at: string }) => `looked at and found clear ${p.at}`,
  note: 'Note',
  noteFor: (p: { lot: string }) => `Note what happened to lot ${p.lot}`,
  noteQuestion: (p: { lot: string }) => `What happened to lot ${p.lot}?`,
  noteKind: 'What happened',
  noteNeeded: 'Choose what happened.',
  noteWhen: 'When, facility time',
  noteWords: 'In words',
  noteAct: 'Note it',
  noteBack: 'Back',
  noted: 'Noted.',
  density: (p: { density: string }) => `density ${p.density}`,
  countLots: (p: { count: number }) => counted(p.count, 'lot', 'lots'),
})

/** How a dose line stands. */
export const lineStateNames = defineMessages({
  default: 'Project default, not confirmed here',
  proposed: 'Proposed, not in force',
  confirmed: 'Confirmed here',
})

/** Whether a lot may be used today, and if not why. */
export const lotStateNames = defineMessages({
  usable: 'may be used',
  expired: 'expired',
  recalled: 'recalled',
  'set-aside': 'set aside',
  'stored-cold': 'was kept too cold',
  precipitate: 'shows a precipitate',
  'used-up': 'used up',
})

/** What can happen to a lot. */
export const lotEventNames = defineMessages({
  'looked-at': 'Looked at and found clear',
  precipitate: 'Shows a precipitate',
  'stored-cold': 'Was kept too cold',
  'set-aside': 'Set aside',
  recalled: 'Recalled',
  'returned-to-use': 'Back in use',
  'used-up': 'Used up',
})

/** How well a figure is known, spelled out: a mark alone says nothing to whoever has not read the key. */
export const markNames = defineMessages({
  V: 'the source itself was opened',
  V2: 'a page restating the source was opened',
  C: 'computed from stated inputs',
  M: 'from memory of the source, confirm before relying on it',
  P: 'project default, no outside authority',
})
