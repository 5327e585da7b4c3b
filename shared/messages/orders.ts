import { capital } from './capital.ts'
import { counted, defineMessages } from './define-messages.ts'

/** Words of treatment orders, on screen and on paper. */
export const orderWords = defineMessages({
  drugGone: 'not known any more',
  drugUnknown: 'Unknown drug',
  stopIfUnreadable:
    'What the order said about stopping cannot be relied on any more. Stop at any sign of distress.',
  order: 'Treatment order: bath',
  meaningAuthor: 'author of this order',
  lotOfOther: 'The lot is not one of the product that is ordered. Choose a lot of this product, or none.',
  between: 'to',
  animalsCounted: (p: { count: number }) => counted(p.count, 'animal', 'animals'),
  animalsEstimated: (p: { low: number; high: number }) => `estimated ${String(p.low)} to ${String(p.high)}`,
  noVolume: 'There is no volume to dose by.',
  volumeByMethod: (p: { method: string; date: string; by: string }) => `${p.method}, ${p.date}${p.by}`,
})

/** What a signed order still lacks, by field. */
export const orderMissing = defineMessages({
  animalIds: 'Choose the animals that are treated.',
  productId: 'Choose the product.',
  problem: 'Type the condition that is treated.',
  use: 'Choose as labelled or extralabel.',
  target: 'Type what is wanted in the water, with its unit.',
  basis: 'Choose what the target is of.',
  timing: 'Choose for a time, or left in the water.',
  contactMinutes: 'Type the contact time in minutes.',
  intervalHours: 'Type the hours between doses.',
  startsAt: 'Choose when the first dose is given.',
  setting: 'Choose tank, raceway or pond.',
  division: 'Type the smallest step of the balance or measure.',
  stopIf: 'Type when the bath is stopped at once.',
})
export type OrderField = keyof typeof orderMissing

/** Figures that somebody changed past the program, by the table they stand in, and what to do. */
export const figureChanged = defineMessages({
  products:
    'The strength of this product, or something else about it, is not what was entered. Do not use it: have it entered anew from its label, choose that one, and tell the administrator.',
  product_lots:
    'This lot is not what was entered. Do not use it: have it entered anew from its container, choose that one, and tell the administrator.',
  dose_lines:
    'A dose line of this drug is not what was entered. Have it proposed and confirmed anew, and tell the administrator.',
  volume_determinations:
    'The volume of this water is not the one that was determined. Determine it anew, have it confirmed, and tell the administrator.',
  weights:
    'The weight of this animal is not the one that was recorded. Do not dose by it: weigh it anew, and tell the administrator.',
})

/** Why an order is refused, and what to do. */
/**
 * What a signer states under an extralabel order, in our words.
 *
 * @source 21 CFR 530.3(i)(1) to (3), as the treatments reference restates it (V)
 */
export const relationshipWords = defineMessages({
  statement:
    'I have taken on the medical judgement for these animals, and the facility follows my instructions. I know them well enough for at least a preliminary diagnosis, by a recent examination or by visits to where they are kept. I can be reached for follow-up.',
  heading: 'Veterinarian-client-patient relationship',
  needed: 'An extralabel order is signed only with this statement. Read it, and tick it if it is true.',
})

export const orderProblemWords = defineMessages({
  noLabel:
    'This order is not what was signed, so there is no label for it. Tell a veterinarian and the administrator.',
  versionGone:
    'This order was signed, and the signed version is not in the database any more. Do not dose; tell the administrator.',
  veterinariansDraft:
    'This is the draft of a veterinarian. Tell them what should be different, or write a proposal of your own.',
  startYears: (p: { years: number }) =>
    `The first dose lies more than ${counted(p.years, 'year', 'years')} from today. Check the year, and type the date again.`,
  planYears: (p: { years: number }) =>
    `From the first dose to the last it would be more than ${counted(p.years, 'year', 'years')}. Check the number of doses and the hours between them.`,
  lineNotInForce:
    'This dose line is not in force: it waits to be confirmed, or another took its place. Choose the dose line again.',
  lineByWeight: 'This dose line goes by the weight of the animal. Choose a dose line for the water.',
  lineOfOther: (p: { line: string; product: string }) =>
    `This dose line is one of ${p.line}, and the product is ${p.product}. Choose a dose line of the product.`,
  notForWater: (p: { product: string }) =>
    `${capital(p.product)} is given to the animal itself: no dose line in force says how much of it goes into water. Choose a product that is given into water.`,
  cautionsChanged:
    'Nothing was signed. An answer belongs to no caution that stands now. Read the cautions as they are now, answer those, and sign again.',
})

/** Words of what an order keeps from the bench. */
export const orderBenchWords = defineMessages({
  head: (p: { name: string; result: string }) => `${p.name}: ${p.result}`,
  source: (p: { citation: string; mark: string }) => `${p.citation} (${p.mark})`,
  same: (p: { own: string; bench: string }) =>
    `The order’s own amount is ${p.own}; the bench came to ${p.bench}. They are the same.`,
  differs: (p: { own: string; bench: string }) =>
    `The order’s own amount is ${p.own}; the bench came to ${p.bench}. They differ. The order’s own counts: it rests on its product, its target and the confirmed volume.`,
  refused: (p: { why: string }) =>
    `What was asked on the bench cannot be worked out again: ${p.why} Leave the bench’s working out of this order, or work it out anew on the bench.`,
  unknown: 'there is no such calculator.',
  heading: 'Worked out beforehand on the bench',
  notTheAmount: 'Not the amount of this order, which is worked out above.',
  inputs: (p: { inputs: string }) => `Asked: ${p.inputs}.`,
  working: (p: { lines: string }) => `Working: ${p.lines}.`,
  sources: (p: { sources: string }) => `Sources: ${p.sources}`,
})

export const volumeMethods = defineMessages({
  geometry: 'worked out from measurements',
  metered: 'metered',
  dilution: 'by dilution',
  estimated: 'estimated',
})

/** Words of the printed order. */
/** What became of a planned dose. */
export const doseKindNames = defineMessages({
  given: 'given',
  recorded: 'recorded as given',
  withheld: 'withheld',
  refused: 'refused by the animals',
})

export const orderPaper = defineMessages({
  source: 'Volumes in litres. Amounts in grams or millilitres of product.',
  sourceMicrolitres: 'Volumes in litres. µL/L means microlitres of product per litre of water.',
  into: ', into the water',
  lot: (p: { lot: string; expires: string }) => `, lot ${p.lot}, use by ${p.expires}`,
  noLot: ', lot to be written down at the dose',
  strength: (p: { strength: string; basis: string }) => `${p.strength}, ${p.basis}`,
  range: (p: { range: string }) => `Range from the error of the volume: ${p.range}.`,
  problem: 'Problem',
  target: 'Target',
  doseLine: 'Formulary',
  contact: 'Contact',
  contactTimed: (p: { minutes: string }) => p.minutes,
  contactIndefinite: 'left in the water',
  doses: 'Doses',
  dosesText: (p: { doses: number; hours: number | null }) =>
    p.hours === null
      ? counted(p.doses, 'dose', 'doses')
      : `${counted(p.doses, 'dose', 'doses')}, every ${String(p.hours)} h`,
  start: 'First dose',
  use: 'Use',
  asLabelled: 'as labelled',
  extralabel: 'extralabel',
  how: 'How',
  water: 'Connected water',
  waterText: (p: { bodies: string; valves: string }) =>
    p.valves === '' ? p.bodies : `${p.bodies}. ${p.valves}`,
  valve: (p: { code: string; state: string }) => `${p.code} ${p.state}`,
  volumeHeading: (p: { volume: string; note: string }) => `Net volume: ${p.volume}, ${p.note}`,
  workingHeading: 'Amount for each dose',
  conditionsHeading: 'Before each dose, true before the first gram',
  cautionsHeading: 'Cautions',
  noCautions: 'No caution fired at signing.',
  overridden: (p: { name: string }) => `Overridden by ${p.name},`,
  reason: (p: { reason: string }) => ` reason: ${p.reason}`,
  animalsHeading: 'Animals',
  accession: 'Number',
  animal: 'Animal',
  count: 'How many',
  place: 'Enclosure',
  treated: 'Treated',
  yes: 'treated',
  shares: 'shares the water',
  noAnimals: 'Nobody is in this water.',
  givenHeading: 'Given',
  alone: (p: { key: string; calculated: string }) =>
    `Dose ${p.key}: no second person calculated the amount. ${p.calculated}`,
  /** Of one that is recorded: the kind of the record stands beside what was weighed. */
  amountAs: (p: { amount: string; kind: string }) => (p.amount === '' ? p.kind : `${p.amount}, ${p.kind}`),
  noSecond: 'none',
  doseNote: (p: { key: string; at: string; text: string }) => `Dose ${p.key}, ${p.at}: ${p.text}`,
  stoppedEarly: (p: { at: string; seen: string }) =>
    `stopped before its time, ${p.at}.${p.seen === '' ? '' : ` Seen: ${p.seen}`}`,
  dose: 'Dose',
  due: 'Due',
  second: 'Second calculation',
  measured: 'Weighed or measured',
  started: 'Started',
  ended: 'Ended',
  by: 'Given by',
  version: (p: { n: number }) => `version ${String(p.n)}`,
  title: (p: { number: string; n: number }) => `Treatment order ${p.number}, version ${String(p.n)}`,
  completed: 'All doses are recorded. Do not dose from this page.',
  lastRuns: 'No dose is to come, and a bath runs. Do not dose from this page.',
  discontinued: 'Discontinued. Do not dose from this page.',
  expired: 'Expired. Do not dose from this page.',
})
