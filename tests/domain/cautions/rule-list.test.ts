import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import type { CautionStage, RuleParameter } from '../../../shared/domain/cautions/caution-rule.ts'
import { cautionRules } from '../../../shared/domain/cautions/caution-rules.ts'
import {
  checkParameter,
  isLegal,
  loosens,
  parameterLimits,
} from '../../../shared/domain/cautions/check-parameter.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { listCautionRules } from '../../../shared/domain/cautions/list-caution-rules.ts'
import { normaliseFacts } from '../../../shared/domain/cautions/normalise-facts.ts'
import { resolveParameters } from '../../../shared/domain/cautions/resolve-parameters.ts'
import { sources } from '../../../shared/domain/sources.ts'
import { cautionReasonWords } from '../../../shared/messages/caution-reasons.ts'
import { cautionTitles } from '../../../shared/messages/caution-texts.ts'
import { cautionRuleWords, resolveWords, ruleParameterWords } from '../../../shared/messages/cautions.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { anyFacts as rawFacts } from './any-facts.ts'
import { formalin, read, someFacts } from './some-facts.ts'

const anyFacts = rawFacts.map(normaliseFacts)
const stage = fc.constantFrom<CautionStage>('design', 'start')

describe('what a rule says of itself', () => {
  it('names every finding that it makes, with all that would resolve it, and every effect', () => {
    fc.assert(
      fc.property(anyFacts, stage, (facts, at) => {
        for (const rule of cautionRules) {
          if (!rule.concerns(facts)) continue
          const values = Object.fromEntries(resolveParameters(rule, {}).map(({ key, value }) => [key, value]))
          for (const { code, resolvedBy, effects = [] } of rule.judge(facts, values, at)) {
            expect(Object.keys(rule.findings), rule.id).toContain(code)
            for (const one of resolvedBy) expect(rule.findings[code], `${rule.id} ${code}`).toContain(one)
            for (const { kind } of effects) expect(rule.effects ?? [], rule.id).toContain(kind)
          }
        }
      }),
      { numRuns: 300 },
    )
  })

  it('is listed whole: findings, effects, routes and sources, each with words', () => {
    const listed = listCautionRules()
    expect(listed).toHaveLength(cautionRules.length)
    for (const rule of listed) {
      expect(cautionRuleWords[rule.ruleId], rule.ruleId).toMatch(/^[A-Z].*[^.]$/)
      expect(cautionReasonWords[rule.ruleId], rule.ruleId).toMatch(/^[A-Z].*\.$/)
      expect(rule.routes.length, rule.ruleId).toBeGreaterThan(0)
      expect(rule.findings.length, rule.ruleId).toBeGreaterThan(0)
      for (const { code, resolvedBy } of rule.findings) {
        expect(cautionTitles[code], code).toBeTruthy()
        expect(resolvedBy.length, code).toBeGreaterThan(0)
        for (const one of resolvedBy) expect(resolveWords[one]).toMatch(/\.$/)
      }
      for (const { source } of rule.sources) expect(sources[source].citation).toBeTruthy()
      for (const { key } of rule.parameters)
        expect(ruleParameterWords[key as keyof typeof ruleParameterWords], key).toBeTruthy()
    }
  })
})

const parameter = (over: Partial<RuleParameter> = {}): RuleParameter => ({
  default: 5,
  unit: 'mg/L',
  source: 'project-default',
  mark: 'P',
  tighter: 'higher',
  ...over,
})
const refusalOf = (of: RuleParameter | undefined, value: string, unit: string = of?.unit ?? 'mg/L') => {
  const checked = checkParameter(of, { value, unit })
  return checked.ok ? checked.value : checked.refusal
}

describe('a value for a parameter', () => {
  it('is taken inside its limits, the ends too', () => {
    for (const [typed, value] of [
      ['6', 6],
      ['0.5', 0.5],
      ['50', 50],
      ['5.25', 5.25],
    ] as const)
      expect(refusalOf(parameter(), typed)).toBe(value)
  })
  it('is refused where it is no number, in another unit, zero, or beyond a hard limit', () => {
    for (const bad of ['', 'abc', '5,5', '1e3', 'NaN', '0x10', 'Infinity'])
      expect(refusalOf(parameter(), bad), bad).toMatchObject({ code: 'not-a-number', field: 'value' })
    expect(refusalOf(parameter(), '5', 'ug/L')).toMatchObject({ code: 'other-unit', field: 'unit' })
    expect(refusalOf(parameter(), '0')).toMatchObject({ code: 'not-above-zero' })
    expect(refusalOf(parameter(), '-3')).toMatchObject({ code: 'not-above-zero' })
    expect(refusalOf(parameter(), '0.49')).toMatchObject({ code: 'below-least', params: { limit: 0.5 } })
    expect(refusalOf(parameter(), '50.1')).toMatchObject({ code: 'above-most', params: { limit: 50 } })
    expect(refusalOf(undefined, '5')).toMatchObject({ code: 'no-such-parameter' })
  })
  it('keeps to what its unit can mean', () => {
    const pH = parameter({ unit: 'pH', default: 6.5 })
    expect(refusalOf(pH, '14.1')).toMatchObject({ code: 'above-most' })
    expect(refusalOf(parameter({ unit: 'percent', default: 20 }), '101')).toMatchObject({
      code: 'above-most',
    })
    expect(refusalOf(parameter({ unit: 'degC', default: 27 }), '46')).toMatchObject({ code: 'above-most' })
    // a part never becomes a multiple, nor a multiple a part
    expect(refusalOf(parameter({ unit: 'factor', default: 0.5 }), '1.1')).toMatchObject({
      code: 'above-most',
    })
    expect(refusalOf(parameter({ unit: 'factor', default: 2 }), '0.9')).toMatchObject({ code: 'below-least' })
    expect(refusalOf(parameter({ least: 4, most: 6 }), '3.9')).toMatchObject({ code: 'below-least' })
  })
  it('every default of every rule lies inside its own limits', () => {
    for (const rule of cautionRules)
      for (const [key, of] of Object.entries(rule.parameters)) {
        const { least, most } = parameterLimits(of)
        expect(least, `${rule.id} ${key}`).toBeLessThanOrEqual(of.default)
        expect(most, `${rule.id} ${key}`).toBeGreaterThanOrEqual(of.default)
        expect(refusalOf(of, String(of.default)), `${rule.id} ${key}`).toBe(of.default)
      }
  })
  it('loosens only the way that lets more through; a limit that was read at its source is legal', () => {
    expect(loosens(parameter(), 4)).toBe(true)
    expect([5, 6].some((value) => loosens(parameter(), value))).toBe(false)
    expect(loosens(parameter({ tighter: 'lower' }), 6)).toBe(true)
    expect([isLegal({ mark: 'V' }), isLegal({ mark: 'V2' }), isLegal({ mark: 'P' })]).toEqual([
      true,
      false,
      false,
    ])
  })
})

describe('a loosened parameter', () => {
  const by = {
    confirmedBy: 'Dr Ilse Marrow',
    confirmedOn: '2026-02-01',
    reason: 'aerated hard, logged.',
    jurisdiction: 'Norrell Sound',
  }
  const told = (value: number) => {
    const facts = someFacts('formalin', formalin(150), { water: { oxygenMgPerL: read(3) } })
    const settings = { R01: { oxygenFloorMgPerL: { value, ...by } } }
    const [caution] = evaluateCautions({ facts, stage: 'start', settings }).cautions
    if (!caution) throw new Error('nothing fired')
    return sayCaution(caution, 'UTC').text.replaceAll('\u00a0', ' ')
  }
  it('shows on the caution that it touches, with who, when, for where and why', () => {
    expect(told(4)).toContain(
      'Loosened here: lowest oxygen 4 mg/L in place of 5 mg/L, confirmed by Dr Ilse Marrow on 1 Feb 2026 for Norrell Sound: aerated hard, logged.',
    )
  })
  it('a tightened one says nothing more', () => {
    expect(told(6)).not.toContain('Loosened')
  })
})
