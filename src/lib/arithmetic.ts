import { decimalText } from '../../shared/domain/quantities/decimal.ts'
import { finiteDecimal, withoutTrailingZeros } from '../../shared/domain/quantities/number-text.ts'
import { ok, refuse } from '../../shared/domain/result.ts'
import type { Result } from '../../shared/domain/result.ts'
import type { ArithmeticRefusal } from '../../shared/domain/units/arithmetic-refusal.ts'
import { convert } from '../../shared/domain/units/convert.ts'
import { unitOf } from '../../shared/domain/units/unit-of.ts'
import type { UnitCode } from '../../shared/domain/units/unit-table.ts'
import { expressionUnit } from '../../shared/domain/working/expression-unit.ts'
import { arithmeticTerms } from './arithmetic-terms.ts'

const longest = 200

export interface WorkedOutNumber {
  value: number
  /** The digits to stand in the field, at most twelve, with a decimal point and no trailing zeros. */
  text: string
}

/**
 * Works out arithmetic that a person typed into a number field: `2.4 * 1.2`, `38 gal(US) + 12 L`. The answer is in the
 * field's own unit, whatever units were typed; numbers without any unit count as the field's.
 *
 * Loads mathjs on first use and only then. The typed text itself is never evaluated: it is rewritten to known parts
 * first, and the tree that mathjs makes of it may hold nothing but numbers, brackets, + − × ÷ and units.
 *
 * @param options.gallon what a bare "gal" is at this facility; without it a bare gallon is refused
 */
export async function workOutArithmetic(
  typed: string,
  fieldUnit: UnitCode,
  options: { gallon?: 'us' | 'imperial' } = {},
): Promise<Result<WorkedOutNumber, ArithmeticRefusal>> {
  if (typed.length > longest) return refuse('too-long', undefined, { most: longest })
  const terms = arithmeticTerms(typed, fieldUnit, options.gallon)
  if (!terms.ok) return terms
  if (terms.value.expression === '') return refuse('blank')
  let math: MathJs
  try {
    math = await loadMath()
  } catch {
    // the module comes over the network, and the tank is in a basement: the next attempt loads it again
    loaded = undefined
    return refuse('arithmetic-not-loaded')
  }
  const answer = evaluated(math, terms.value.expression)
  if (!answer.ok) return refuse(answer.refusal.code, undefined, { unit: fieldUnit })
  const value = inFieldUnit(math, answer.value, terms.value.hasUnits, fieldUnit)
  if (value === undefined) return refuse('arithmetic-units-do-not-fit', undefined, { unit: fieldUnit })
  if (!Number.isFinite(value)) return refuse('not-finite')
  const text = withoutTrailingZeros(decimalText(finiteDecimal(value)))
  return ok({ value: Number(text), text })
}

/** The answer as a number in the field's unit; undefined where it is of another kind. */
function inFieldUnit(
  math: MathJs,
  answer: unknown,
  hasUnits: boolean,
  fieldUnit: UnitCode,
): number | undefined {
  const name = expressionUnit(fieldUnit)
  if (typeof answer === 'number') {
    if (!hasUnits) return answer
    // volume by volume has no dimension left: 250 µL/L has become 0.00025
    if (unitOf(fieldUnit).dimension !== 'volumeConcentration') return undefined
    const converted = convert(answer * 1_000_000, 'uL/L', fieldUnit)
    return converted.ok ? converted.value : undefined
  }
  if (!math.isUnit(answer) || name === undefined || name === '') return undefined
  try {
    return answer.toNumber(name)
  } catch {
    return undefined
  }
}

const allowedOperators = new Set(['add', 'subtract', 'multiply', 'divide', 'unaryMinus', 'unaryPlus'])

function evaluated(math: MathJs, expression: string): Result<unknown, ArithmeticRefusal> {
  try {
    const tree = math.parse(expression)
    let sound = true
    tree.traverse((node) => {
      if (math.isConstantNode(node)) sound &&= typeof node.value === 'number'
      else if (math.isSymbolNode(node)) sound &&= math.Unit.isValuelessUnit(node.name)
      else if (math.isOperatorNode(node)) sound &&= allowedOperators.has(node.fn)
      else sound &&= math.isParenthesisNode(node)
    })
    if (!sound) return refuse('arithmetic-not-readable')
    try {
      return ok(tree.evaluate() as unknown)
    } catch {
      // mathjs throws where litres meet grams, or a number with a unit meets one without
      return refuse('arithmetic-units-do-not-fit')
    }
  } catch {
    // mathjs throws on a sum that ends in a sign, or on an open bracket
    return refuse('arithmetic-not-readable')
  }
}

async function importMath() {
  const { all, create } = await import('mathjs')
  const math = create(all ?? {})
  math.createUnit('impgal', '4.54609 L')
  return math
}

type MathJs = Awaited<ReturnType<typeof importMath>>

let loaded: Promise<MathJs> | undefined

function loadMath(): Promise<MathJs> {
  loaded ??= importMath()
  return loaded
}
