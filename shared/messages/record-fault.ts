import type { RecordFault } from '../contracts/signing.contract.ts'
import type { EntryBeside } from '../domain/orders/entries-beside.ts'
import { defineMessages } from './define-messages.ts'

/** What is kept beside the text of a signed order, as people call it. */
export const entryNames: Record<EntryBeside, string> = defineMessages({
  text: 'the text',
  number: 'the number of the order',
  order_id: 'the order that the text belongs to',
  version_no: 'the number of the version',
  agent: 'the drug',
  product_id: 'the product',
  lot_id: 'the lot',
  enclosure_id: 'the enclosure',
  animals: 'the animals',
  determination_id: 'the volume that the amount rests on',
  net_volume_litres: 'the net volume',
  allowed_drift_percent: 'how far the volume may have moved',
  amount_entered_value: 'the amount',
  amount_entered_unit: 'the unit of the amount',
  target_mg_per_l: 'the target',
  starts_at: 'the first dose',
  doses: 'the number of doses',
  interval_hours: 'the interval',
  contact_minutes: 'the contact time',
  signed_at: 'the time of signing',
})

/** What is wrong with a signed record, to be said in front of what to do about it. */
export const faultWords = defineMessages({
  text: 'This is not the text that was signed, or it can’t be read any more.',
  whose:
    'A signature of this record is missing, or the text stored here is that of another: nobody can tell whether it is the one in force.',
  entries: (p: { names: string }) =>
    p.names === ''
      ? 'The signed text is as it was signed. What is stored beside it was changed.'
      : `The signed text is as it was signed. What is stored beside it was changed: ${p.names}.`,
  /** The same for one line on each page. */
  textShort: 'this is not the text that was signed',
  whoseShort: 'a signature is missing, or the text is that of another record',
  entriesShort: 'what is stored beside the signed text was changed',
  notice: (p: { what: string }) => `Record check failed: ${p.what}. Do not act on this page.`,
  underSignature: (p: { what: string }) => `Record check failed: ${p.what}. Do not act on it.`,
  doNotDose: (p: { what: string }) => `${p.what} Do not dose; tell a veterinarian and the administrator.`,
  fromText: 'From the signed text, which was checked and is as it was signed. Do not dose.',
  unknownKey: 'Not shown to be what was signed. Do not dose.',
  noFigures: 'None of its figures is shown.',
})

/** What is wrong with it, in a sentence. */
export function sayFault({ what, entries }: RecordFault): string {
  return what === 'entries'
    ? faultWords.entries({ names: entries.map((name) => entryNames[name]).join(', ') })
    : faultWords[what]
}

const shortly = ({ what }: RecordFault): string =>
  ({ text: faultWords.textShort, whose: faultWords.whoseShort, entries: faultWords.entriesShort })[what]

/** Why nothing may be dosed by a record that is not known to be what was signed. */
export const sayDoNotDose = (fault: RecordFault | null): string =>
  fault ? faultWords.doNotDose({ what: sayFault(fault) }) : faultWords.unknownKey

/** For each page of a print. */
export const sayFaultNotice = (fault: RecordFault): string => faultWords.notice({ what: shortly(fault) })

/** Under the signature of a print. */
export const sayFaultUnderSignature = (fault: RecordFault): string =>
  faultWords.underSignature({ what: shortly(fault) })
