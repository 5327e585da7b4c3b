import type { ArithmeticRefusal } from '../domain/units/arithmetic-refusal.ts'
import type { QuantityRefusal } from '../domain/units/number-refusal.ts'
import { defineMessages } from './define-messages.ts'
import type { RefusalWords } from './number-refusals.ts'

/** What to do when arithmetic typed into a number field gives no number. */
export const arithmeticRefusals = defineMessages({
  'arithmetic-not-readable': () =>
    'This cannot be worked out. Use numbers, units, plus, minus, times, divided by and brackets, for example 2.4 * 1.2.',
  'arithmetic-unit-not-usable': (p) =>
    `“${p.said('typed')}” cannot be used in arithmetic. Work it out first, and type the result.`,
  'arithmetic-with-temperatures': () => 'Temperatures cannot be added up with their units. Type the result.',
  'arithmetic-units-do-not-fit': (p) =>
    `The units do not fit together, or do not give ${p.unit === '' ? 'the unit of this field' : p.unit}. ` +
    'Give a unit to each number of a sum, or to none.',
  'arithmetic-not-loaded': () =>
    'The arithmetic could not be loaded. Type the result, or try again when there is a signal.',
} satisfies Record<Exclude<ArithmeticRefusal, QuantityRefusal>, (p: RefusalWords) => string>)
