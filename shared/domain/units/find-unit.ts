import { ok, refuse, type Result } from '../result.ts'
import { isUnitCode } from './is-unit-code.ts'
import type { UnitTextRefusal } from './number-refusal.ts'
import { unitOf } from './unit-of.ts'
import { ambiguousSpellings, unitSpellings } from './unit-spellings.ts'
import type { Dimension, UnitCode } from './unit-table.ts'

export interface FindUnitOptions {
  /** What the field is about: decides what "%" and "g/mL" mean. */
  dimension?: Dimension
  /** What a bare "gallon" is here, when the facility has said so. */
  gallon?: 'us' | 'imperial'
}

const spelled = new Map<string, UnitCode>()
for (const [code, spellings] of Object.entries(unitSpellings) as [UnitCode, readonly string[]][])
  for (const spelling of spellings) spelled.set(spelling, code)

const wordLength = 4

/**
 * The unit that a person means by what they typed.
 *
 * @refuses unit-missing | unknown-unit | and one code for each unit that says too little: bare-ppm, parts-per-thousand,
 *          gallon-not-stated (unless `gallon` is given), fluid-ounce-not-stated, ton-not-stated, percent-not-stated
 *          (a bare "%" where the field is no percentage), write-millilitres ("cc"), spell-units ("IU"),
 *          household-measure (drops, spoons, cups)
 */
export function findUnit(typed: unknown, options: FindUnitOptions = {}): Result<UnitCode, UnitTextRefusal> {
  if (typeof typed !== 'string' || typed.trim() === '') return refuse('unit-missing', 'unit')
  // a code that fits is what programs and forms send: it needs no reading
  if (isUnitCode(typed) && unitOf(typed).dimension === options.dimension) return ok(typed)
  const text = normaliseUnitText(typed)
  const lower = text.length >= wordLength ? text.toLowerCase() : text
  const ambiguous = own(ambiguousSpellings, text) ?? own(ambiguousSpellings, lower)
  if (ambiguous === 'gallon-not-stated' && options.gallon !== undefined && !/gpm|\//.test(text))
    return ok(options.gallon === 'us' ? 'gal_us' : 'gal_imp')
  if (ambiguous !== undefined) return refuse(ambiguous, 'unit', { typed: text })
  const code = isUnitCode(text) ? text : (spelled.get(text) ?? spelled.get(lower))
  if (code === undefined) return refuse('unknown-unit', 'unit', { typed: text.slice(0, 20) })
  if (options.dimension === undefined || unitOf(code).dimension === options.dimension) return ok(code)
  if (code === 'percent') return refuse('percent-not-stated', 'unit')
  return ok(homonyms[code]?.find((other) => unitOf(other).dimension === options.dimension) ?? code)
}

/** The same letters in fields of different dimensions: "mg/kg" of body mass, and of a product. */
const homonyms: Partial<Record<UnitCode, readonly UnitCode[]>> = {
  'g/mL': ['g/mL_w_v'],
  'mg/kg': ['mg/kg_w_w'],
  'g/kg': ['g/kg_w_w'],
  degC: ['delta_degC'],
  degF: ['delta_degF'],
}

/** One spelling for the many signs that keyboards and copied labels give. */
function normaliseUnitText(typed: string): string {
  return typed
    .trim()
    .replace(/[µμ]/g, 'u')
    .replace(/³/g, '3')
    .replace(/²/g, '2')
    .replace(/°\s*/g, 'deg')
    .replace(/\s+/g, ' ')
    .replace(/\.$/, '')
}

function own<T>(table: Record<string, T>, key: string): T | undefined {
  return Object.hasOwn(table, key) ? table[key] : undefined
}
