import type { DoseRefusal } from '../domain/dose/dose-refusal.ts'
import type { QuantityRefusal } from '../domain/units/number-refusal.ts'
import type { VolumeRefusal } from '../domain/water/volume-refusal.ts'
import { defineMessages } from './define-messages.ts'
import type { RefusalWords } from './number-refusals.ts'

/** What is asked of a record of a dose. */
export const doseInputWords = defineMessages({
  amountNeeded: 'Type how much was given.',
  nothingWentIn:
    'Nothing goes in when a dose is withheld or refused. Leave the amount out; if some of it went in, record the dose as given with what went in.',
})

/** What to do when a dose cannot be worked out. */
export const doseRefusals = defineMessages({
  'basis-missing': () =>
    'Choose what the target is of: the active substance, the product, the salt, the base, free or total.',
  'basis-not-of-unit': () =>
    'Microlitres per litre are of the product. Choose the product as the basis, or mg/L.',
  'volume-unit-for-solid': () => 'A powder is not measured by volume. Give the target in mg/L.',
  'strength-missing': () => 'Type the strength of the product from its label.',
  'strength-basis-missing': () =>
    'Choose what the strength on the label is of: the salt, the base, the active substance, or the total.',
  'strength-unit-not-usable': () => 'The strength of a powder is a share of its weight. Type it in % w/w.',
  'strength-above-all': (p) =>
    `${p.What} cannot be more than ${p.said('limit')} ${p.unit}. Check the number and its unit on the label.`,
  'density-missing': () =>
    'Type the density of the product in g/mL. Without it a percentage by weight says nothing about a volume.',
  'share-missing': () =>
    'The target is of one substance and the label of another. Give the molar masses of both, or choose the same basis.',
  'share-outside-range': () =>
    'The molar mass of the part has to be above zero and at most that of the whole.',
  'ionic-target-chelated-product': () =>
    'A target of free copper must not be used for a chelated product. Use the total copper that its label gives.',
  'target-above-strength': () =>
    'The target is above the strength of the product. Check both figures and their units.',
  'division-not-positive': (p) => `Type ${p.what} as more than zero${p.example}.`,
  'division-of-other-kind': () => 'Choose a balance for a powder and a measure for a liquid.',
  'too-little-to-measure': (p) =>
    `The amount is less than ${p.said('least')} ${p.unit}, too little for this balance or measure. ` +
    'Choose a finer one, or make a stock solution.',
  'amount-of-other-kind': () => 'Give a liquid by volume and a powder or tablet by weight.',
  'below-half-step': (p) =>
    'The amount is less than half of the smallest step of this syringe or balance. Take a finer one' +
    (p.said('parts') === ''
      ? '.'
      : `, or thin the product to 1 in ${p.said('parts')} with a diluent that its label names.`),
  'place-below-step': () =>
    'The largest amount for one place is less than one step of this syringe. Check both figures.',
  'reading-at-or-above-target': () => 'The reading is at or above the target. Nothing is to be added.',
  'reading-not-comparable': () =>
    'A target in microlitres per litre has no reading. Give the target in mg/L.',
  'nothing-missing': () => 'Nothing that counts is missing yet. Nothing is to be added.',
  'reading-too-old': (p) =>
    `The reading is ${p.said('minutes')} minutes old and counts for ${p.said('most')}. Read again before adding.`,
  'reading-in-future': () => 'The time of the reading lies in the future. Check the date and the time.',
  'retest-too-early': (p) =>
    `The reading was taken ${p.said('hours')} hours after the last addition. ` +
    `Read again at least ${p.said('least')} hours after it.`,
  'time-not-readable': () => 'The time cannot be read. Type the date and the time.',
  'limit-of-other-kind': () =>
    'Give the limits of the additions by weight for a powder and by volume for a liquid.',
  'addition-above-single-limit': (p) =>
    `The addition would be ${p.said('amount')} ${p.unit}; the order allows ${p.said('limit')} ${p.unit} at once. ` +
    'A veterinarian has to amend the order.',
  'addition-above-day-limit': (p) =>
    `The additions of 24 hours would come to ${p.said('amount')} ${p.unit}; the order allows ` +
    `${p.said('limit')} ${p.unit}. Wait, or ask a veterinarian to amend the order.`,
} satisfies Record<Exclude<DoseRefusal, QuantityRefusal | VolumeRefusal>, (p: RefusalWords) => string>)
