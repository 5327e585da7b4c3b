import { counted, defineMessages } from './define-messages.ts'

/** Words of the screen on which a dose by weight is worked out. */
export const weightFormWords = defineMessages({
  title: 'Dose by weight',
  source: 'Worked out by the newest weight of the animal, and judged by what is known of it now.',
  toList: 'Work out a dose by weight',
  noOrder: 'This is no order. Nothing of it is kept, and nobody gives a dose by it.',
  animal: 'Animal or group',
  route: 'How it is given',
  injection: 'Injection',
  'by-mouth': 'By mouth',
  'on-skin': 'On the skin',
  place: 'Where the needle goes in',
  muscle: 'Into muscle',
  'body-cavity': 'Into the body cavity',
  'under-skin': 'Under the skin',
  vein: 'Into a vein',
  problem: 'Problem treated',
  product: 'Drug product, to the animal itself',
  noProducts:
    'The formulary has no product that is given so. A technician or veterinarian enters one under Pharmacy.',
  target: 'Dose for the weight',
  targetHint: 'For example 10 mg/kg: so much for each kilogram of the animal.',
  basis: 'Dose is counted',
  division: 'Syringe or balance reads to',
  mostPerPlace: 'Largest volume at one place',
  mostPerPlaceHint: 'Above it the amount is divided over several places.',
  notNow: 'Nothing to work out yet',
  chooseAnimal: 'Choose the animal first; its newest weight is shown here.',
  chooseRest: 'Choose how it is given and the product.',
  each: 'For one animal',
  weight: 'Newest weight',
  weighed: (p: { date: string; basis: string }) => `${p.basis}, ${p.date}`,
  weighedTogether: (p: { date: string; basis: string; count: number }) =>
    `${p.basis}, ${p.date}; the mean of ${counted(p.count, 'animal', 'animals')}`,
  measured: 'Measured',
  estimated: 'Estimated',
  noWeight: 'Nobody weighed it.',
  rounding: (p: { percent: string; larger: boolean }) =>
    `Rounded to the step, the dose is ${p.percent} ${p.larger ? 'larger' : 'smaller'}.`,
  exact: 'The step changes nothing of the dose.',
  thin: (p: { times: number }) =>
    `So little is hard to read on this step. Thinned 1 in ${String(p.times)}, it could be read.`,
  portions: 'At each place',
  portion: (p: { n: number }) => `Place ${String(p.n)}`,
})
