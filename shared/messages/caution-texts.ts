import type { CautionCode } from '../domain/cautions/caution-code.ts'
import type { CautionTexts } from './caution-texts-more.ts'
import { moreCautionTexts, moreCautionTitles } from './caution-texts-more.ts'
import { counted, defineMessages } from './define-messages.ts'

const minutes = (count: number) => duration(count)
const hours = (count: number) => counted(Math.round(count * 100) / 100, 'hour', 'hours')
const days = (count: number) => counted(count, 'day', 'days')

/** A share that is too much, to a tenth and upwards, so that it never reads as the limit that it exceeds. */
const shareAbove = (percent: number) => String(Math.ceil(Number((percent * 10).toPrecision(12))) / 10)

/** Which dose comes after those that count already. */
const nextOf = (p: { given: number; planned: number }) =>
  p.given < p.planned ? `the next is dose ${p.given + 1}` : 'none is left to come'

function duration(inMinutes: number): string {
  if (inMinutes < 120) return counted(inMinutes, 'minute', 'minutes')
  const whole = Math.floor(inMinutes / 60)
  const rest = inMinutes - whole * 60
  return rest === 0 ? hours(whole) : `${hours(whole)} ${counted(rest, 'minute', 'minutes')}`
}

/** A few words that name the finding. */
export const cautionTitles = defineMessages({
  'oxygen-unknown': 'Oxygen is not known',
  'oxygen-old': 'Oxygen reading is too old',
  'oxygen-low': 'Oxygen is too low',
  'oxygen-would-fall': 'Oxygen would fall too low',
  'oxygen-fall-unknown': 'Oxygen is not known, and formalin takes it',
  'pond-warm': 'Pond is too warm for formalin',
  'pond-temperature-unknown': 'Temperature of the pond is not known',
  'pond-bloom': 'Bloom in the pond',
  'pond-bloom-unknown': 'Nobody said whether the pond is in bloom',
  'pond-striped-bass': 'Striped bass in the pond',
  'formalin-too-long': 'Contact time is over the label',
  'formalin-too-long-for-strength': 'Contact time is over the label for this strength',
  'formalin-indefinite': 'Too strong to stay in the water',
  'formalin-indefinite-not-allowed': 'Formalin may not stay in the water here',
  'formalin-time-unknown': 'Contact time is not stated',
  'formalin-over-ceiling': 'Formalin is over the label',
  'formalin-over-salmonid-ceiling': 'Formalin is over the label for salmonids in warmer water',
  'formalin-salmonid-temperature-unknown':
    'Formalin is over the label for salmonids unless the water is cold',
  'formalin-in-warm-water': 'Strong formalin in warm water',
  'formalin-temperature-unknown': 'Strong formalin, and the temperature is not known',
  'formalin-storage-fault': 'Formalin was kept wrongly',
  'formalin-storage-unknown': 'Nobody said how this formalin was kept',
  'formalin-and-permanganate': 'Formalin and permanganate too close together',
  'formalin-and-permanganate-together': 'Formalin and permanganate together',
  'agent-history-unknown': 'Earlier treatments of this water are not known',
  'inhabitants-unknown': 'Animals in the connected water are not known',
  'copper-invertebrates': 'Invertebrates in copper',
  'copper-elasmobranchs': 'Elasmobranchs in copper',
  'alkalinity-unknown': 'Alkalinity is not known',
  'alkalinity-old': 'Alkalinity reading is too old',
  'alkalinity-low': 'Alkalinity is too low for copper',
  'copper-over-alkalinity': 'Too much copper for this alkalinity',
  'copper-over-cap': 'Copper is over the cap',
  'copper-target-high': 'Copper target is too high',
  'copper-high': 'Free copper is high',
  'copper-very-high': 'Free copper is too high',
  'copper-low': 'Free copper is too low to treat',
  'copper-reading-missing': 'No fresh reading of free copper',
  'copper-forms-mixed': 'Two forms of copper',
  'copper-reducer': 'Reducer or binder with chelated copper',
  'copper-reducer-unknown': 'Nobody said whether a reducer is in use',
  'carbon-on': 'Carbon is on',
  'carbon-unknown': 'Nobody recorded carbon off',
  'ozone-on': 'Ozone is on',
  'ozone-unknown': 'Nobody recorded ozone off',
  'uv-on': 'Ultraviolet lamp is on',
  'uv-unknown': 'Nobody recorded the ultraviolet lamp off',
  'fractionator-on': 'Foam fractionator is on',
  'fractionator-unknown': 'Nobody recorded the foam fractionator off',
  'chloroquine-invertebrates': 'Invertebrates in chloroquine',
  'chloroquine-algae': 'Algae or plants in chloroquine',
  'chloroquine-algae-unknown': 'Nobody said whether algae or plants live here',
  'chloroquine-lights': 'Lights at full with chloroquine',
  'chloroquine-lights-unknown': 'Lights are not recorded',
  'peroxide-excluded': 'Species excluded by the label',
  'peroxide-walleye': 'Walleye in hydrogen peroxide',
  'peroxide-eggs': 'Eggs at a sensitive age',
  'peroxide-eggs-age-unknown': 'Age of the eggs is not known',
  'peroxide-warm': 'Hydrogen peroxide in warm water',
  'peroxide-temperature-unknown': 'Temperature is not known',
  'chloramine-acid': 'Chloramine-T in acid water',
  'chloramine-soft': 'Chloramine-T in soft water',
  'chloramine-unknown': 'Water is not tested for chloramine-T',
  'permanganate-alkaline': 'Permanganate in alkaline water',
  'permanganate-hard': 'Permanganate in hard water',
  'permanganate-unknown': 'Water is not tested for permanganate',
  'permanganate-total': 'Permanganate of 24 hours is over the cap',
  'permanganate-total-unknown': 'Permanganate of the last 24 hours is not known',
  'permanganate-repeated': 'Permanganate repeated within days',
  'over-default': 'Dose is over its range',
  'far-over-default': 'Dose is far over its range',
  'under-default': 'Dose is far under its range',
  'no-default-range': 'No range to compare with',
  'default-not-comparable': 'Range can’t be compared',
  'no-line-fits': 'No dose line is for this water and contact',
  'line-not-named': 'No dose line is named',
  'beyond-every-line': 'Dose is beyond every dose line',
  'line-water-unknown': 'Kind of water is not known, and the dose line is for one',
  'line-of-other-water': 'Dose line is for other water',
  'left-in-bath-line': 'Left in the water, and the dose line is for a bath',
  'left-in-over-line': 'Left in the water, and the dose line is for a time',
  'contact-over-line': 'Contact is longer than the dose line',
  'contact-far-over-line': 'Contact is far longer than the dose line',
  'day-over-line': 'The baths of a day are together longer than the dose line',
  'day-far-over-line': 'The baths of a day are together far longer than the dose line',
  'contact-over-untimed-line': 'Contact is long, and the dose line names no time',
  'contact-far-over-untimed-line': 'Contact is far too long for a bath whose dose line names no time',
  'doses-add-up': 'Doses add up in the water',
  'dose-on-dose': 'An earlier dose is in the water',
  'basis-missing': 'Figure does not say of what it is',
  'dose-early': 'Dose is early',
  'dose-very-early': 'Dose is much too early',
  'interval-within-contact': 'Next dose comes before the bath is over',
  'dose-late': 'Dose is late',
  'doses-past-plan': 'All planned doses are given',
  'same-agent-together': 'The same drug is ordered for this water already',
  'same-agent-same-day': 'The same drug within a day by another order',
  'agents-not-together': 'Drugs that do not go together',
  'agent-in-water': 'Another drug is in this water',
  'agent-same-day': 'Another drug within a day',
  'start-past': 'First dose lies in the past',
  'start-far': 'First dose lies far ahead',
  'plan-long': 'Plan is very long',
  'doses-carried': 'Doses given before count',
  'plan-counts-given': 'The plan begins after doses were given, and counts them',
  'test-missing': 'Water test is missing',
  'test-old': 'Water test is too old',
  'volume-unknown': 'Volume is not determined',
  'volume-other-valves': 'Volume is of another valve state',
  'volume-gross': 'Volume is gross',
  'volume-old': 'Volume was determined long ago',
  'volume-estimated': 'Volume is estimated',
  'volume-estimated-error-unknown': 'Volume is estimated without an error',
  'volume-error-large': 'Volume is not known closely',
  'volume-differs': 'Volume differs much from the one before',
  'weight-unknown': 'Weight is not known',
  'weight-missing': 'Never weighed',
  'weight-old': 'Weight is old',
  'weight-implausible': 'Weight is not plausible',
  'weight-estimated': 'Weight was reckoned, not weighed',
  'lot-expired': 'Lot has expired',
  'lot-expiry-unknown': 'Expiry of the lot is not known',
  'lot-recalled': 'Lot was recalled',
  'lot-quarantined': 'Lot is set aside',
  'lot-status-unknown': 'Lot is not chosen',
  'lot-beyond-use': 'Stock is past its use',
  'lot-beyond-use-unknown': 'Use-by of the stock is not known',
  'second-calculation': 'Second calculation by another person',
  'animals-unwell': 'Many animals are unwell',
  'animals-unwell-unknown': 'Nobody said how the animals are',
  'animals-handled': 'Animals were handled within a day',
  'animals-handled-unknown': 'Handling of the last day is not known',
  'first-use': 'First use in a taxon here',
  'first-use-unknown': 'Earlier use here is not known',
  ...moreCautionTitles,
} satisfies Record<CautionCode, string>)

/** What was found, in a sentence or two. */
export const cautionTexts = defineMessages({
  'oxygen-unknown': (p) =>
    `Oxygen was not read. A bath needs a reading of at least ${p.floor}, at most ${minutes(p.maxAgeMinutes)} old.`,
  'oxygen-old': (p) =>
    `Oxygen was ${p.oxygen} at ${p.readAt}, ${minutes(p.ageMinutes)} ago. It counts for ${minutes(p.maxAgeMinutes)}.`,
  'oxygen-low': (p) => `Oxygen is ${p.oxygen}. A bath needs at least ${p.floor}.`,
  'oxygen-would-fall': (p) =>
    `Oxygen is ${p.oxygen}. This strength takes about ${p.takes} over a day and a half, which leaves ${p.predicted}; at least ${p.floor} has to be left.`,
  'oxygen-fall-unknown': (p) =>
    `This strength takes about ${p.takes} of oxygen over a day and a half, and at least ${p.floor} has to be left. There is no reading to tell.`,
  'pond-warm': (p) =>
    `The warmest reading of the last hours is ${p.temperature}. The label allows formalin in ponds up to ${p.limit}.`,
  'pond-temperature-unknown': (p) =>
    `There is no reading of the last hours. The label allows formalin in ponds up to ${p.limit}.`,
  'pond-bloom': () => 'The label does not allow formalin in ponds with a heavy bloom.',
  'pond-bloom-unknown': () => 'The label does not allow formalin in ponds with a heavy bloom.',
  'pond-striped-bass': (p) => `The label does not allow formalin in ponds with striped bass: ${p.animals}.`,
  'formalin-too-long': (p) =>
    `${minutes(p.minutes)} is longer than the ${minutes(p.limitMinutes)} of the label for ${p.row}.`,
  'formalin-too-long-for-strength': (p) =>
    `${minutes(p.minutes)} at ${p.target} of product is longer than the ${minutes(p.limitMinutes)} of the label. Only up to ${p.limit} may stay longer.`,
  'formalin-indefinite': (p) => `${p.target} of product is to stay in the water. Up to ${p.limit} may.`,
  'formalin-indefinite-not-allowed': (p) =>
    `The label allows ${minutes(p.limitMinutes)} for ${p.row}. The agent is to stay in the water.`,
  'formalin-time-unknown': (p) =>
    `The contact time is not stated. The label allows ${minutes(p.limitMinutes)}.`,
  'formalin-over-ceiling': (p) =>
    `${p.target} of product is above the ${p.ceiling} of the label for ${p.row}.`,
  'formalin-over-salmonid-ceiling': (p) =>
    `${p.target} of product is above the ${p.ceiling} of the label for salmonids at ${p.boundary} and warmer. The warmest reading of the last hours is ${p.temperature}.`,
  'formalin-salmonid-temperature-unknown': (p) =>
    `${p.target} of product is above the ${p.ceiling} of the label for salmonids at ${p.boundary} and warmer. There is no reading of the last hours, so the stricter row holds.`,
  'formalin-in-warm-water': (p) =>
    `${p.target} of product at ${p.temperature}. Above ${p.boundary} the extension sheet advises at most ${p.limit} of product.`,
  'formalin-temperature-unknown': (p) =>
    `${p.target} of product, and no temperature of the last hours. Above ${p.boundary} the extension sheet advises at most ${p.limit} of product.`,
  'formalin-storage-fault': () =>
    'Formalin that was frozen, kept too cold or shows a white precipitate holds paraformaldehyde, which is far more toxic.',
  'formalin-storage-unknown': () =>
    'Formalin that was frozen, kept too cold or shows a white precipitate holds paraformaldehyde, which is far more toxic. Somebody has to have looked.',
  'formalin-and-permanganate': (p) =>
    `Order ${p.orderNumber} is ${hours(p.hours)} away in the same water. The two are kept ${hours(p.limitHours)} apart: mixed, they can explode.`,
  'formalin-and-permanganate-together': (p) =>
    `Order ${p.orderNumber} runs in the same water at the same time, or has no day yet. The two are kept ${hours(p.limitHours)} apart: mixed, they can explode.`,
  'agent-history-unknown': () =>
    'What was given into this water before is not known, so drugs that must not meet can’t be told apart.',
  'inhabitants-unknown': () =>
    'Who is in the connected water is not known, so nobody can say that this drug is safe for them.',
  'copper-invertebrates': (p) => `Copper kills most invertebrates. In the connected water: ${p.animals}.`,
  'copper-elasmobranchs': (p) =>
    `Copper has killed many sharks and rays. In the connected water: ${p.animals}.`,
  'alkalinity-unknown': (p) =>
    `Alkalinity was not read. Copper in fresh water needs at least ${p.floor}, from a reading at most ${hours(p.maxAgeHours)} old.`,
  'alkalinity-old': (p) =>
    `Alkalinity was ${p.alkalinity} at ${p.readAt}. The reading counts for ${hours(p.maxAgeHours)}.`,
  'alkalinity-low': (p) => `Alkalinity is ${p.alkalinity}. Below ${p.floor} copper kills fish.`,
  'copper-over-alkalinity': (p) =>
    `${p.target} of copper sulfate pentahydrate is above the ${p.limit} that an alkalinity of ${p.alkalinity} allows.`,
  'copper-over-cap': (p) => `${p.target} of copper sulfate pentahydrate is above the cap of ${p.limit}.`,
  'copper-target-high': (p) =>
    `The target is ${p.target} of copper. In sea water nothing is added above ${p.limit} of free copper. A figure of a chelated product is not a figure of free copper.`,
  'copper-high': (p) => `Free copper is ${p.reading}, above ${p.limit}.`,
  'copper-very-high': (p) => `Free copper is ${p.reading}, above ${p.limit}. Nothing is added.`,
  'copper-low': (p) => `Free copper is ${p.reading}, below the ${p.limit} that treats.`,
  'copper-reading-missing': (p) => `Free copper was not read within ${hours(p.maxAgeHours)}.`,
  'copper-forms-mixed': (p) =>
    p.orderNumber === ''
      ? 'A figure of total copper belongs to a chelated product. This order is for copper sulfate, which is dosed by free copper.'
      : `Order ${p.orderNumber} puts the other form of copper into the same water. Together they release copper.`,
  'copper-reducer': () => 'Reducers and ammonia binders set copper free from its chelate.',
  'copper-reducer-unknown': () =>
    'Reducers and ammonia binders set copper free from its chelate. Nobody said whether one is in use.',
  'carbon-on': () => 'Carbon or resin is on and takes the drug out of the water.',
  'carbon-unknown': () => 'Carbon or resin takes the drug out of the water, and its state is not recorded.',
  'ozone-on': () => 'Ozone is on. It breaks this drug down, or adds to an oxidant.',
  'ozone-unknown': () => 'Ozone breaks this drug down, or adds to an oxidant, and its state is not recorded.',
  'uv-on': () => 'The ultraviolet lamp is on and breaks this drug down.',
  'uv-unknown': () => 'Ultraviolet light breaks this drug down, and the state of the lamp is not recorded.',
  'fractionator-on': () => 'The foam fractionator is on. It carries the drug out and can overflow.',
  'fractionator-unknown': () =>
    'A foam fractionator carries the drug out and can overflow, and its state is not recorded.',
  'chloroquine-invertebrates': (p) =>
    `Chloroquine is toxic to some invertebrates. In the connected water: ${p.animals}.`,
  'chloroquine-algae': () => 'Chloroquine is toxic to algae and plants.',
  'chloroquine-algae-unknown': () =>
    'Chloroquine is toxic to algae and plants. Nobody said whether any are in this water.',
  'chloroquine-lights': () => 'The lights are at full, and light breaks chloroquine down.',
  'chloroquine-lights-unknown': () => 'Light breaks chloroquine down, and the lights are not recorded.',
  'peroxide-excluded': (p) => `The label excludes: ${p.animals}.`,
  'peroxide-walleye': (p) => `The label advises care with walleye: ${p.animals}.`,
  'peroxide-eggs': (p) =>
    `Eggs between ${p.from} and ${p.to} daily temperature units are sensitive: ${p.animals}.`,
  'peroxide-eggs-age-unknown': (p) =>
    `Eggs between ${p.from} and ${p.to} daily temperature units are sensitive, and the age is not told: ${p.animals}.`,
  'peroxide-warm': (p) =>
    `The warmest reading of the last hours is ${p.temperature}. Above ${p.limit} hydrogen peroxide is more toxic.`,
  'peroxide-temperature-unknown': (p) =>
    `There is no reading of the last hours. Above ${p.limit} hydrogen peroxide is more toxic.`,
  'chloramine-acid': (p) => `The reading is ${p.reading}. Below ${p.limit} chloramine-T is more toxic.`,
  'chloramine-soft': (p) => `Alkalinity is ${p.reading}. Below ${p.limit} chloramine-T is more toxic.`,
  'chloramine-unknown': (p) =>
    `No fresh reading of ${p.reading}. Chloramine-T is more toxic in acid, soft water.`,
  'permanganate-alkaline': (p) =>
    `The reading is ${p.reading}. Above ${p.limit} permanganate leaves manganese dioxide on gills.`,
  'permanganate-hard': (p) =>
    `Hardness is ${p.reading}. Above ${p.limit} permanganate leaves manganese dioxide on gills.`,
  'permanganate-unknown': (p) =>
    `No fresh reading of ${p.reading}. In alkaline or hard water permanganate leaves manganese dioxide on gills.`,
  'permanganate-total': (p) =>
    `With what was given before it makes ${p.total} in 24 hours, above the cap of ${p.limit}.`,
  'permanganate-total-unknown': (p) =>
    `What was given in the last 24 hours is not known. The cap is ${p.limit}.`,
  'permanganate-repeated': (p) => `Order ${p.orderNumber} ended less than ${days(p.limitDays)} before.`,
  'over-default': (p) =>
    `${p.target} is ${p.factor.toFixed(2)} times the upper end of the dose line, ${p.high}.`,
  'far-over-default': (p) =>
    `${p.target} is ${p.factor.toFixed(1)} times the upper end of the dose line, ${p.high}.`,
  'under-default': (p) => `${p.target} is far below the lower end of the dose line, ${p.low}.`,
  'no-default-range': () =>
    'The formulary has no dose line in force for this drug, so nothing shows whether the figure is usual.',
  'default-not-comparable': () => 'The figure and the dose line are on different bases that nothing joins.',
  'no-line-fits': () =>
    'The order names no dose line, and none of this drug is for this water and for so long a contact. A figure for a short bath says nothing about a long one.',
  'line-not-named': (p) =>
    `The order names no dose line. ${p.target} was held against the highest of the drug for this water and contact, ${p.high}.`,
  'beyond-every-line': (p) =>
    `${p.target} is more than ${p.limitFactor} times ${p.high}, the highest dose line of this drug. A figure so far off is taken for a slip: check the decimal point and the unit.`,
  'line-water-unknown': (p) =>
    `The dose line is for ${p.lineWater}. Nobody said what this water is, and no salinity was read.`,
  'line-of-other-water': (p) => `The dose line is for ${p.lineWater}. This is ${p.water}.`,
  'left-in-bath-line': () =>
    'The dose line is for a bath that has an end, though its source names no minutes. The agent is to stay in the water.',
  'left-in-over-line': (p) =>
    `The dose line is for a contact of at most ${minutes(p.limitMinutes)}. The agent is to stay in the water.`,
  'contact-over-line': (p) =>
    `${minutes(p.minutes)} is longer than the ${minutes(p.limitMinutes)} of the dose line.`,
  'contact-far-over-line': (p) =>
    `${minutes(p.minutes)} is far longer than the ${minutes(p.limitMinutes)} of the dose line.`,
  'day-over-line': (p) =>
    `The dose line is for ${minutes(p.limitMinutes)}. All baths of a day together are ${minutes(p.minutes)}, longer.`,
  'day-far-over-line': (p) =>
    `The dose line is for ${minutes(p.limitMinutes)}. All baths of a day together are ${minutes(p.minutes)}, far longer.`,
  'contact-over-untimed-line': (p) =>
    `The dose line is for a bath that has an end, and names no time. ${minutes(p.minutes)}, the longest bath or all baths of a day together, is longer than the ${minutes(p.limitMinutes)} that such a bath may take.`,
  'contact-far-over-untimed-line': (p) =>
    `The dose line is for a bath that has an end, and names no time. ${minutes(p.minutes)}, the longest bath or all baths of a day together, is far longer than the ${minutes(p.limitMinutes)} that such a bath may take.`,
  'doses-add-up': (p) =>
    `${p.doses} doses of ${p.target} each are to stay in the water. Unless the agent is out of it before each next one, the last makes up to ${p.total}, ${p.factor.toFixed(1)} times the upper end of the dose line, ${p.high}.`,
  'dose-on-dose': (p) =>
    `${counted(p.stillIn, 'dose of this order is', 'doses of this order are')} in the water, and nobody recorded the agent as out. With this one it makes up to ${p.total}, ${p.factor.toFixed(1)} times the upper end of the dose line, ${p.high}.`,
  'basis-missing': () =>
    'Product or active part, salt or base, free or total: the same figure is another dose on another basis, up to four times as much.',
  'dose-early': (p) =>
    `${hours(p.hours)} after the last dose. The window opens after ${hours(p.earliestHours)}.`,
  'dose-very-early': (p) =>
    `${hours(p.hours)} after the last dose, less than half of the ${hours(p.intervalHours)} between doses.`,
  'interval-within-contact': (p) =>
    `Doses are ${hours(p.intervalHours)} apart, and each bath lasts ${minutes(p.contactMinutes)}. The animals would be in two doses at once.`,
  'dose-late': (p) =>
    `${hours(p.hours)} after the last dose. The window closed after ${hours(p.latestHours)}.`,
  'doses-past-plan': (p) =>
    `${p.given} of ${counted(p.planned, 'planned dose', 'planned doses')} ${p.given === 1 ? 'is' : 'are'} given.`,
  'same-agent-same-day': (p) =>
    `Order ${p.orderNumber} gives the same drug into this connected water within a day. Neither order counts the other: look at both together.`,
  'same-agent-together': (p) =>
    `Order ${p.orderNumber} gives the same drug into this connected water at the same time. Together the animals get both doses.`,
  'agents-not-together': (p) =>
    `Order ${p.orderNumber} gives ${p.agent} into this connected water at the same time or within a day. The two are not combined.`,
  'agent-in-water': (p) =>
    `Order ${p.orderNumber} gives ${p.agent} into this connected water at the same time, or nobody recorded that it is out.`,
  'agent-same-day': (p) => `Order ${p.orderNumber} gives ${p.agent} into this connected water within a day.`,
  'start-past': (p) => `The first dose is planned for ${p.startsAt}, and its window has closed.`,
  'start-far': (p) =>
    `The first dose is planned for ${p.startsAt}, more than ${days(p.limitDays)} ahead. Animals and water will not be as they are judged now.`,
  'plan-long': (p) =>
    `From the first dose to the last it is ${days(p.days)}, more than ${days(p.limitDays)}. Animals and water will not be as they are judged now.`,
  'doses-carried': (p) =>
    `${p.given} of ${counted(p.planned, 'planned dose', 'planned doses')} were given already, the last at ${p.lastAt}. They count: ${nextOf(p)}.`,
  'plan-counts-given': (p) =>
    `The plan begins at ${p.startsAt}, and ${counted(p.given, 'dose was', 'doses were')} given before, the last at ${p.lastAt}. They count as the first of the ${counted(p.planned, 'planned dose', 'planned doses')}: ${nextOf(p)}.`,
  'test-missing': (p) => `No reading of ${p.reading}. It has to be at most ${minutes(p.maxAgeMinutes)} old.`,
  'test-old': (p) =>
    `The reading of ${p.reading} of ${p.readAt} is ${minutes(p.ageMinutes)} old. It counts for ${minutes(p.maxAgeMinutes)}.`,
  'volume-unknown': () => 'There is no net volume for the water as it is connected.',
  'volume-other-valves': (p) => `The volume of ${p.determinedOn} holds for other valves than stand open now.`,
  'volume-gross': (p) =>
    `The volume of ${p.determinedOn} is what the tank could hold; rock, décor and fittings were not taken off. The dose would be too strong.`,
  'volume-old': (p) =>
    `The volume was determined on ${p.determinedOn}, more than ${counted(p.limitMonths, 'month', 'months')} ago.`,
  'volume-estimated': (p) =>
    `The volume is estimated with an error of ${p.errorPercent} %, more than ${p.limitPercent} %. The dose is wrong by as much.`,
  'volume-estimated-error-unknown': (p) =>
    `The volume is estimated, and nobody said how far it may be off. More than ${p.limitPercent} % is too much.`,
  'volume-error-large': (p) =>
    `The volume has an error of ${p.errorPercent} %, more than ${p.limitPercent} %. The dose is wrong by as much.`,
  'volume-differs': (p) =>
    `The volume of ${p.determinedOn} is ${p.now}; before, ${p.before} was confirmed for the same water. A figure so far off is often a slip of the decimal point.`,
  'weight-unknown': () => 'It is not known what the animals weigh. Without a weight there is no amount.',
  'weight-missing': (p) => `There is no weight of ${p.animals}. Without one there is no amount.`,
  'weight-old': (p) =>
    `The newest weight is more than ${counted(p.limitDays, 'day', 'days')} old: ${p.animals}. The dose is wrong by whatever was gained or lost since.`,
  'weight-implausible': (p) =>
    `The weight lies outside what such an animal weighs: ${p.animals}. A slip of the decimal point is the same slip of the dose.`,
  'weight-estimated': (p) => `The weight was reckoned, not weighed: ${p.animals}.`,
  'lot-expired': (p) => `The lot expired on ${p.expiresOn}.`,
  'lot-expiry-unknown': () => 'The lot has no expiry date on record.',
  'lot-recalled': () => 'The lot was recalled.',
  'lot-quarantined': () => 'The lot is set aside and may not be used.',
  'lot-status-unknown': () => 'No lot is chosen, or its state is not on record.',
  'lot-beyond-use': (p) => `The stock made from it could be used until ${p.beyondUseOn}.`,
  'lot-beyond-use-unknown': () => 'The stock made from it has no use-by date on record.',
  'second-calculation': (p) =>
    `Because ${p.because}, another person works out the amount from the label, the mark and the container, without seeing the first result.`,
  'animals-unwell': (p) =>
    `${shareAbove(p.percent)} % of the animals are moribund or not eating, more than ${p.limitPercent} %.`,
  'animals-unwell-unknown': (p) =>
    `The share of moribund or not eating animals is not recorded. More than ${p.limitPercent} % is too much.`,
  'animals-handled': () => 'The animals were handled within the last 24 hours.',
  'animals-handled-unknown': () =>
    'Nobody recorded whether the animals were handled within the last 24 hours.',
  'first-use': (p) => `This drug was not used here before in: ${p.taxa}.`,
  'first-use-unknown': () => 'Whether this drug was used here before in these taxa is not known.',
  ...moreCautionTexts,
} satisfies CautionTexts)
