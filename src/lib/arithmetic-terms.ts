import { ok, refuse } from '../../shared/domain/result.ts'
import type { Result } from '../../shared/domain/result.ts'
import type { ArithmeticRefusal } from '../../shared/domain/units/arithmetic-refusal.ts'
import { findUnit } from '../../shared/domain/units/find-unit.ts'
import { parseNumber } from '../../shared/domain/units/parse-number.ts'
import { unitOf } from '../../shared/domain/units/unit-of.ts'
import { unitSpellings } from '../../shared/domain/units/unit-spellings.ts'
import type { UnitCode } from '../../shared/domain/units/unit-table.ts'
import { expressionUnit } from '../../shared/domain/working/expression-unit.ts'

export interface ArithmeticTerms {
  /** The typed arithmetic in the form that the evaluator reads: numbers, known units and four operators. */
  expression: string
  hasUnits: boolean
}

/** Spellings with a space or a bracket in them ("US gal", "gal (US)"), longest first, so that they are taken whole. */
const longSpellings = [...Object.values(unitSpellings).flat(), 'fl oz']
  .filter((spelling) => /[ ()]/.test(spelling))
  .sort((a, b) => b.length - a.length)
  .map((spelling) => spelling.replace(/[.*+?^${}()|[\]\\]/g, '\\$&'))

const token = new RegExp(
  [
    String.raw`(?<number>[\d.,]*\d[\d.,]*|[.,]+)`,
    `(?<long>(?:${longSpellings.join('|')})(?![A-Za-z]))`,
    String.raw`(?<times>[xX](?![A-Za-zµμ]))`,
    String.raw`(?<word>[A-Za-zµμ°%‰][\w³²µμ-]*(?:\/[A-Za-zµμ][\w³²]*)?)`,
    String.raw`(?<sign>[-+*/()×÷·−–])`,
    String.raw`(?<space>\s+)`,
    String.raw`(?<other>.)`,
  ].join('|'),
  'gsu',
)

const signs: Readonly<Record<string, string>> = { '×': '*', '·': '*', '÷': '/', '−': '-', '–': '-' }

/**
 * Rewrites typed arithmetic for the evaluator, letting nothing through but numbers, the units of our table, brackets
 * and + − × ÷.
 *
 * @param fieldUnit unit of the field: decides what a bare "%" means
 * @param gallon    what a bare "gal" is at this facility; without it a bare gallon is refused
 */
export function arithmeticTerms(
  typed: string,
  fieldUnit: UnitCode,
  gallon?: 'us' | 'imperial',
): Result<ArithmeticTerms, ArithmeticRefusal> {
  const { dimension } = unitOf(fieldUnit)
  const parts: string[] = []
  let hasUnits = false
  for (const { groups = {} } of typed.matchAll(token)) {
    const word = groups.long ?? groups.word
    if (groups.space !== undefined) continue
    if (groups.number !== undefined) {
      const number = parseNumber(groups.number)
      if (!number.ok) return number
      parts.push(number.value.text)
    } else if (groups.times !== undefined) parts.push('*')
    else if (groups.sign !== undefined) parts.push(signs[groups.sign] ?? groups.sign)
    else if (word !== undefined) {
      const unit = findUnit(word, { dimension, gallon })
      if (!unit.ok) return refuse(unit.refusal.code, undefined, unit.refusal.params)
      if (unitOf(unit.value).dimension === 'temperature') return refuse('arithmetic-with-temperatures')
      const name = expressionUnit(unit.value)
      if (name === undefined) return refuse('arithmetic-unit-not-usable', undefined, { typed: word })
      // a percentage is a plain number in a field of percentages, and nothing anywhere else
      if (name === '' && dimension !== unitOf(unit.value).dimension)
        return refuse('arithmetic-unit-not-usable', undefined, { typed: word })
      hasUnits ||= name !== ''
      parts.push(name)
    } else return refuse('arithmetic-not-readable')
  }
  return ok({ expression: parts.join(' '), hasUnits })
}
