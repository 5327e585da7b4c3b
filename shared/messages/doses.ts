import { defineMessages } from './define-messages.ts'

/** Words about giving and recording doses. */
export const doseWords = defineMessages({
  anotherEnd: 'Another end of the same bath was recorded.',
  unreadable:
    'The signed text of this order was changed or cannot be read any more. Do not dose; tell the administrator.',
  earlierOpen: (p: { key: string }) =>
    `Dose ${p.key} comes before this one and has no record. Record first what became of it: given, withheld or refused.`,
  stillRunning: (p: { key: string; at: string }) =>
    `The bath of dose ${p.key}, begun ${p.at}, has no end. Record first when the animals were out of it or the water was changed.`,
  limitChanged: (p: { limit: string; name: string }) =>
    `Since signing the facility has changed this limit to ${p.limit} (${p.name}). Each dose is judged by the limit in force.`,
  meaningOverride: 'override of a stop for this dose',
  overrideUnreadable: 'An override that cannot be read any more',
  findingChanged:
    'Nothing was signed. What was found is no longer what you were shown: look at the sheet as it is now, then sign again.',
  notOverridable: 'Nobody may override this stop. Remove its cause.',
  underBroken: 'The order is not what was signed',
  underBrokenText:
    'The dose was recorded under an order whose text, or what is stored beside it, is not what was signed. A veterinarian finds out what was meant.',
  held: 'The order is held. A veterinarian lifts the hold.',
  ended: 'The order has ended.',
  alreadyRecorded: 'This dose is recorded already.',
  figuresChanged: 'A figure of this dose is not what was entered',
  notAsRecorded: 'Not what was recorded',
  notAsRecordedText:
    'Somebody changed this record in the database. Go by nothing in it: ask whoever gave the dose, and tell the administrator.',
  noAmount: 'The amount cannot be worked out for the water as it is now.',
  driftOutside: (p: { percent: string; allowed: string }) =>
    `The volume has moved by ${p.percent} since the signature; the order allows ${p.allowed}. A veterinarian amends the order.`,
  amountMoved: (p: { now: string; signed: string; allowed: string }) =>
    `${p.now} is worked out now and ${p.signed} was signed, though the volume has hardly moved; the order allows ${p.allowed}. Somebody changed the strength of the product or another figure. A veterinarian looks, and amends the order.`,
  amountMovedBlind:
    'The amount worked out now is not the one signed, though the volume has hardly moved. Somebody changed the strength of the product or another figure. A veterinarian looks, and amends the order.',
  secondMissing: 'Another person has to calculate the amount without seeing yours.',
  secondDisagrees: 'The two calculations do not agree. Both begin again from the label.',
  firstMissing: 'Ask the first person to calculate.',
  samePerson: 'The second calculation is another person’s.',
  repeatEarly: (p: { from: string }) =>
    `You made the first calculation. Ask another person. Where nobody can be reached you may repeat it yourself from ${p.from}.`,
  calculatedAlone: 'No second person calculated the amount',
  calculatedAloneBy: (p: { by: string; minutes: number }) =>
    `Calculated alone by ${p.by}, repeated after ${String(p.minutes)} min.`,
  calculatedAloneText: (p: { calculated: string }) =>
    `${p.calculated} Nobody else could be reached. It was worked out again from label, mark and container. A veterinarian reviews it.`,
  amountLeftOut:
    'The amounts are left out here: you may still calculate a dose of this drug in this water blind.',
  amountLeftOutHere: '(amount left out: you may still calculate it blind; the order shows it)',
  amountSeen:
    'You have been shown the amount of this dose or signed the order, so your calculation would not be blind. Ask somebody who has not seen it.',
  beginAgain: 'The first is worked out anew before the second. Then both begin again from the label.',
  markUnreadable: 'Type the depth as a number with its unit, for example 0.68 m.',
  secondOutdated: 'The lot or the volume has changed since the second calculation. Calculate again.',
  amountDiffers: (p: { amount: string }) =>
    `The amount has to be ${p.amount}, within one step of the balance.`,
  otherProduct: 'The lot is of another product',
  otherProductText: (p: { lot: string; product: string }) =>
    `Lot ${p.lot} is ${p.product}, which is not what was ordered. A veterinarian reviews it.`,
  animalsGone: 'No animal of this order was in the water',
  animalsGoneText: (p: { animals: string }) =>
    `By the register none of them was in this water at that time: ${p.animals}. A veterinarian reviews it.`,
  animalsLeft: 'Not all animals of the order were in the water',
  animalsLeftText: (p: { animals: string }) => `No longer in this water: ${p.animals}.`,
  animalsLeftNow: 'Some animals of this order have left the water',
  noLongerHere: (p: { animals: string }) => `${p.animals} (no longer in this water)`,
  allGone: (p: { animals: string }) =>
    `The animals of this order are not in this water any more: ${p.animals}. Give nothing. A veterinarian amends or discontinues the order.`,
  strikeOwn:
    'You may strike out your own record on its day. Later, and others’ records, a veterinarian does: quarantine and the next dose rest on it.',
  unexplained:
    'A dose of this order was recorded that does not fit it. A veterinarian looks at it and explains it first.',
  amountOff: 'Another amount was given than was worked out',
  amountOffText: (p: { given: string; signed: string; workedOut: string }) =>
    `Given: ${p.given}. Signed: ${p.signed}. Worked out for the water then: ${p.workedOut}.`,
  timesMore: (p: { times: string }) => `That is about ${p.times} times as much.`,
  timesLess: (p: { times: string }) => `That is about ${p.times} times less.`,
  notComparable: 'The two cannot be compared: one is a weight and the other a volume.',
  notWorkedOut: 'not possible',
  notJudged: 'The water of that time cannot be judged',
  notJudgedText: 'No rule was applied to this dose. A veterinarian reviews it.',
  volumeMoved: 'The volume had moved more than the order allows',
  volumeMovedText: 'A veterinarian would have had to amend the order first.',
  wrongEnclosure: 'The enclosure read is not the one of the order.',
  wrongLot: 'The lot read is not the one of the first calculation.',
  longBeforeOrder: (p: { signedAt: string }) =>
    `The order was signed ${p.signedAt}, and this time lies more than a year before it. Check the year, and type the time again.`,
  signedAfter: 'The order was signed after this dose',
  signedAfterText: 'The dose was given before the order was signed. A veterinarian reviews it.',
  whileHeld: 'The order was held',
  whileHeldText: 'The dose was given while the order was held. A veterinarian reviews it.',
})
