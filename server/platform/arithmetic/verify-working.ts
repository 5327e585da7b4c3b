import type { MathJsInstance, MathNode } from 'mathjs'
import { workingUnit } from '../../../shared/domain/working/expression-unit.ts'
import { valueTerm } from '../../../shared/domain/working/value-term.ts'
import type { WorkingLine } from '../../../shared/domain/working/working-line.ts'
import { unitTable, type UnitCode } from '../../../shared/domain/units/unit-table.ts'

/** A line of working that the second evaluation does not bear out. */
export interface Disagreement {
  key: string
  expression: string
  /** What the line says, in its unit. */
  stated: number
  /** What the second evaluation gives, in the same unit; absent when there was nothing to evaluate. */
  found?: number
  why: 'different' | 'form-not-allowed' | 'not-evaluable' | 'key-not-unique' | 'does-not-rest-on-earlier-line'
}

/** What is checked of a line, whatever it is called. */
export type CheckedLine = Pick<WorkingLine, 'key' | 'expression' | 'value' | 'unit' | 'rests'>

export type Verification = { ok: true } | { ok: false; disagreements: Disagreement[] }

const relativeTolerance = 1e-9

/**
 * Evaluates every line of a working a second way: its expression, with its units, by mathjs, which shares neither
 * factors nor code with the engines. Before a signature and before a dose both must agree to 1e-9 of the value.
 *
 * Also checks that a line which says it rests on earlier ones really takes their values, so that a working cannot skip
 * from one sum to another. Only the forms that the engines write are evaluated at all; anything else in an expression
 * is a disagreement.
 *
 * @param lines one whole working, in order; an empty working agrees with nothing and is refused by the caller
 */
export async function verifyWorking(lines: readonly CheckedLine[]): Promise<Verification> {
  const math = await loadMath()
  const earlier = new Map<string, CheckedLine>()
  const disagreements: Disagreement[] = []
  for (const line of lines) {
    const { key, expression, value: stated } = line
    const disagree = (why: Disagreement['why'], found?: number) =>
      disagreements.push({ key, expression, stated, why, ...(found === undefined ? {} : { found }) })
    if (earlier.has(key)) disagree('key-not-unique')
    else if (!line.rests.every((rest) => takesValueOf(line, earlier.get(rest))))
      disagree('does-not-rest-on-earlier-line')
    else {
      const found = evaluateLine(math, line)
      if (typeof found === 'string') disagree(found)
      else if (!agree(stated, found)) disagree('different', found)
    }
    earlier.set(key, line)
  }
  return disagreements.length === 0 ? { ok: true } : { ok: false, disagreements }
}

function agree(stated: number, found: number): boolean {
  if (!Number.isFinite(stated) || !Number.isFinite(found)) return false
  return Math.abs(stated - found) <= relativeTolerance * Math.max(Math.abs(stated), Math.abs(found))
}

function evaluateLine(
  math: MathJsInstance,
  line: CheckedLine,
): number | 'form-not-allowed' | 'not-evaluable' {
  const unit = workingUnit(line.unit)
  if (unit === undefined) return 'form-not-allowed'
  try {
    const tree = math.parse(line.expression)
    if (!allowed(math, tree)) return 'form-not-allowed'
    const answer: unknown = tree.evaluate()
    if (unit === '') return typeof answer === 'number' ? answer : 'not-evaluable'
    // milligrams per kilogram have no dimension left: mathjs makes a plain number of them
    const one: unknown = math.evaluate(`1 ${unit}`)
    if (typeof answer === 'number' && typeof one === 'number') return answer / one
    return math.isUnit(answer) ? answer.toNumber(unit) : 'not-evaluable'
  } catch {
    // mathjs throws on what it cannot read and on units that do not fit: both mean that the line is not borne out.
    return 'not-evaluable'
  }
}

const allowedOperators = new Set(['add', 'subtract', 'multiply', 'divide', 'pow', 'unaryMinus', 'to'])
const allowedFunctions = new Set(['sqrt', 'asin', 'tan', 'log', 'exp', 'ceil'])
const allowedSymbols = new Set(['pi', ...allowedFunctions])
for (const code of Object.keys(unitTable) as UnitCode[])
  for (const name of (workingUnit(code) ?? '').split('/')) if (name !== '') allowedSymbols.add(name)

function allowed(math: MathJsInstance, tree: MathNode): boolean {
  let sound = true
  tree.traverse((node) => {
    if (math.isConstantNode(node)) sound &&= typeof node.value === 'number'
    else if (math.isSymbolNode(node)) sound &&= allowedSymbols.has(node.name)
    else if (math.isOperatorNode(node)) sound &&= allowedOperators.has(node.fn)
    else if (math.isFunctionNode(node))
      sound &&= math.isSymbolNode(node.fn) && allowedFunctions.has(node.fn.name)
    else sound &&= math.isParenthesisNode(node)
  })
  return sound
}

function takesValueOf(line: CheckedLine, rest: CheckedLine | undefined): boolean {
  if (rest === undefined || workingUnit(rest.unit) === undefined) return false
  const term = valueTerm(rest.value, rest.unit).replace(/[.*+?^${}()|[\]\\]/g, '\\$&')
  return new RegExp(`(?<![\\w.])${term}(?![\\w/.])`).test(line.expression)
}

let loaded: Promise<MathJsInstance> | undefined

/** mathjs takes about a second to load, so it is loaded when the first working is verified. */
function loadMath(): Promise<MathJsInstance> {
  loaded ??= import('mathjs').then(({ all, create }) => {
    // a quotient that is whole but for the last binary digit is whole, as in the engines (whole-steps.ts)
    const math = create(all ?? {}, { relTol: 1e-9, absTol: 1e-9 })
    math.createUnit('impgal', '4.54609 L')
    return math
  })
  return loaded
}
