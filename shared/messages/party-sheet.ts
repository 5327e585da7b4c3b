import { defineMessages } from './define-messages.ts'

/** Words of the other parties: list and form. */
export const partyWords = defineMessages({
  title: 'Other parties',
  source: 'Whom animals came from and went to.',
  search: 'Find by name, number or address',
  enter: 'Enter a party',
  correct: (p: { name: string }) => `Correct ${p.name}`,
  correctShort: 'Correct',
  name: 'Name',
  kind: 'What it is',
  address: 'Address',
  registration: 'Licence or registration number',
  email: 'E-mail',
  telephone: 'Telephone',
  note: 'Note',
  transactions: 'Transactions',
  save: 'Save',
  back: 'Not now',
  empty: 'No other parties yet',
  emptyBody: 'A registrar enters the first one, here or with a transaction.',
  mayNot: 'Only a registrar enters other parties.',
})
