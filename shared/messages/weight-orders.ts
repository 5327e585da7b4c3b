import { defineMessages } from './define-messages.ts'

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1)

/** What is still to be filled in of a dose by weight, by field. */
export const weightOrderMissing = defineMessages({
  place: 'Choose where the needle goes in.',
  productId: 'Choose the product.',
  problem: 'Type the condition that is treated.',
  use: 'Choose as labelled or extralabel.',
  target: 'Type the dose for the weight of the animal, with its unit.',
  basis: 'Choose what the dose is of.',
  intervalHours: 'Type the hours between doses.',
  startsAt: 'Choose when the first dose is given.',
  division: 'Type the smallest step of the syringe or balance.',
  stopIf: 'Type when it is stopped at once.',
})
export type WeightOrderField = keyof typeof weightOrderMissing

/** How a dose by weight reaches the animal. */
export const routeWords = defineMessages({
  injection: 'by injection',
  'by-mouth': 'by mouth',
  'on-skin': 'on the skin',
})

/** Why a dose by weight is refused, and what to do. */
export const weightOrderProblems = defineMessages({
  noAnimal: 'There is no such animal, or it is not in this house. Choose the animal again.',
  notByRoute: (p: { product: string; route: string }) =>
    `${capital(p.product)} is not given ${p.route}. Choose another product or another route.`,
  placeOfOther: 'Only an injection has a place where the needle goes in. Leave it out, or choose injection.',
  perPlaceOfOther:
    'Only an injection is divided over places. Leave the largest volume out, or choose injection.',
  noWeight: 'Nobody weighed this animal. Weigh it, and record the weight with the animal.',
  noAmount:
    'The amount cannot be worked out from this product, dose and weight. Check the basis, the strength and the step.',
  lotOfOther: 'This lot is of another product. Choose the lot again.',
})
