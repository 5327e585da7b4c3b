import { defineMessages } from './define-messages.ts'

/** Words about giving and recording doses. */
export const doseWords = defineMessages({
  unreadable: 'The signed text of this order cannot be read any more. Do not dose; tell the administrator.',
  notIntact: 'The signed order no longer matches its signature. Do not dose; tell a veterinarian.',
  held: 'The order is held. A veterinarian lifts the hold.',
  ended: 'The order has ended.',
  alreadyRecorded: 'This dose is recorded already.',
  noAmount: 'The amount cannot be worked out for the water as it is now.',
  driftOutside: (p: { percent: string; allowed: string }) =>
    `The volume has moved by ${p.percent} since the signature; the order allows ${p.allowed}. A veterinarian amends the order.`,
  secondMissing: 'Another person has to calculate the amount without seeing yours.',
  secondDisagrees: 'The two calculations do not agree. Both begin again from the label.',
  secondOutdated: 'The lot or the volume has changed since the second calculation. Calculate again.',
  amountDiffers: (p: { amount: string }) =>
    `The amount has to be ${p.amount}, within one step of the balance.`,
  wrongEnclosure: 'The enclosure read is not the one of the order.',
  wrongLot: 'The lot read is not the one of the first calculation.',
  signedAfter: 'The order was signed after this dose',
  signedAfterText: 'The dose was given before the order was signed. A veterinarian reviews it.',
  whileHeld: 'The order was held',
  whileHeldText: 'The dose was given while the order was held. A veterinarian reviews it.',
})
