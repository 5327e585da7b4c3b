import { defineMessages } from './define-messages.ts'

/** The label for a container of what is dispensed under an order. */
export const labelPaper = defineMessages({
  name: 'Label',
  title: (p: { number: string; n: number }) =>
    `Label for treatment order ${p.number}, version ${String(p.n)}`,
  source: 'For the container. It tells no amount: that is worked out anew for each dose.',
  contents: 'In this container',
  lot: 'Lot',
  lotText: (p: { lot: string; expires: string }) => `${p.lot}, use by ${p.expires}`,
  lotToWrite: 'Lot and expiry date',
  prescribedBy: 'Prescribed by',
  licence: (p: { name: string; number: string; jurisdiction: string }) =>
    `${p.name}, licence ${p.number}, ${p.jurisdiction}`,
  address: 'Address',
  addressToWrite: 'Address of the veterinarian',
  directions: 'Directions',
  animals: 'For',
  problem: 'Problem',
  dosage: 'Dosage',
  route: 'Route',
  intoWater: (p: { enclosure: string; bodies: string }) => `into the water of ${p.enclosure} (${p.bodies})`,
  frequency: 'How often',
  duration: 'How long',
  use: 'Use',
  extralabel: 'extralabel, by order of the veterinarian',
  asLabelled: 'as labelled',
  amount: 'Amount',
  amountText: 'From the bath sheet of each dose, never from this label.',
  withdrawal: 'Withdrawal',
  withdrawalText:
    'None is stated in this order. Not for animals that may be eaten or released; ask the veterinarian first.',
  cautions: 'Cautions',
  keep: 'Keep in this container, closed, away from food, feed and whoever is not to handle it.',
  how: 'How',
})
