import type { QuantityRefusal } from '../domain/units/number-refusal.ts'
import { defineMessages } from './define-messages.ts'

/** What a sentence about a refused number is made of; every part is already in words or symbols. */
export interface RefusalWords {
  /** "the depth of the water" */
  what: string
  /** "The depth of the water" */
  What: string
  /** ", for example 0.68", or nothing */
  example: string
  /** " in metres", or nothing */
  inUnit: string
  /** The symbol of the unit concerned, or nothing. */
  unit: string
  /** Whatever else the refusal carries: limit, typed, grouped, decimal … */
  said: (key: string) => string
}

/** The limit with its unit; a plain number has none to check. */
function withLimit({ said, unit }: RefusalWords): string {
  return unit === ''
    ? `${said('limit')}. Check the number.`
    : `${said('limit')} ${unit}. Check the number and its unit.`
}

/** What to do when a typed number or unit is not taken: one plain sentence or two for each code. */
export const numberRefusals = defineMessages({
  blank: (p) => `Type ${p.what}${p.inUnit}${p.example}.`,
  'not-a-number': (p) => `${p.What} is not a number. Type digits with at most one decimal point${p.example}.`,
  'two-separators': (p) =>
    `Type ${p.what} with one decimal point and nothing between the thousands${p.example}.`,
  'thousands-or-decimal': (p) =>
    `${p.What} can be read in two ways. Type ${p.said('grouped')} or ${p.said('decimal')}.`,
  'too-long': (p) => `${p.What} is too long. Type at most ${p.said('most')} characters.`,
  'unit-missing': (p) => `Choose the unit of ${p.what}.`,
  'unknown-unit': (p) =>
    `“${p.said('typed')}” is not a unit known here. Choose a unit for ${p.what} from the list.`,
  'bare-ppm': () =>
    'Parts per million can mean three things that differ up to 2.5 times. ' +
    'Choose mg/L of the active substance, mg/L of the product, or µL/L of the product.',
  'parts-per-thousand': () =>
    'Parts per thousand does not say of what. For salinity choose g/kg or PSS-78, for a salt bath choose g/L.',
  'gallon-not-stated': () => 'US and imperial gallons differ by a fifth. Choose US gal or imperial gal.',
  'fluid-ounce-not-stated': () =>
    'US and imperial fluid ounces differ. Choose US fl oz, or type millilitres.',
  'ton-not-stated': () => 'There are three tons. Type tonnes (t) or kilograms.',
  'percent-not-stated': () =>
    'A percentage does not say of what. Choose % w/w, % w/v or % v/v as printed on the label.',
  'write-millilitres': () => 'Type millilitres as mL.',
  'spell-units': () => 'Spell out units: type the word units.',
  'household-measure': () =>
    'Drops, spoons and cups differ from one another. Measure in mL, or weigh in grams.',
  'not-finite': (p) =>
    `${p.What} is too large or too small to work with. Check it, and type it again${p.example}.`,
  'dimensions-differ': (p) => `${p.What} cannot be given in this unit. Choose a unit from the list.`,
  'below-absolute-zero': (p) => `${p.What} is below absolute zero. Check the sign and the unit.`,
  'not-above-zero': (p) => `Type ${p.what} as more than zero${p.example}.`,
  'below-least': (p) => `${p.What} has to be at least ${withLimit(p)}`,
  'above-most': (p) => `${p.What} has to be at most ${withLimit(p)}`,
} satisfies Record<QuantityRefusal, (p: RefusalWords) => string>)
