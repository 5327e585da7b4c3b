import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import {
  type CautionFacts,
  type FactPath,
  factAt,
  factGroups,
} from '../../../shared/domain/cautions/caution-facts.ts'
import {
  type CautionLevel,
  type CautionStage,
  cautionLevels,
} from '../../../shared/domain/cautions/caution-rule.ts'
import { cautionRules } from '../../../shared/domain/cautions/caution-rules.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { unknown } from '../../../shared/domain/cautions/fact.ts'
import { normaliseFacts } from '../../../shared/domain/cautions/normalise-facts.ts'
import { resolveParameters } from '../../../shared/domain/cautions/resolve-parameters.ts'
import { sayCaution, sayCondition } from '../../../shared/messages/say-caution.ts'
import { findUnsafeWriting } from '../../../shared/domain/quantities/find-unsafe-writing.ts'
import { anyFacts as rawFacts } from './any-facts.ts'

// Rules are asked by the evaluator alone, which sets broken figures to unknown first.
const anyFacts = rawFacts.map(normaliseFacts)
const stage = fc.constantFrom<CautionStage>('design', 'start')

function allPaths(facts: CautionFacts): FactPath[] {
  return factGroups.flatMap((group) =>
    Object.keys(facts[group]).map((name) => `${group}.${name}` as FactPath),
  )
}

/** The facts with one of them replaced. */
function withFact(facts: CautionFacts, path: FactPath, fact: unknown): CautionFacts {
  const [group = '', name = ''] = path.split('.')
  const old = facts[group as keyof CautionFacts] as object
  return { ...facts, [group]: { ...old, [name]: fact } }
}

function judge(rule: (typeof cautionRules)[number], facts: CautionFacts, at: CautionStage) {
  if (!rule.concerns(facts)) return []
  const parameters = Object.fromEntries(resolveParameters(rule, {}).map(({ key, value }) => [key, value]))
  return rule.judge(facts, parameters, at)
}

const worst = (levels: readonly CautionLevel[]) =>
  Math.min(...levels.map((one) => cautionLevels.indexOf(one)), 9)

describe('laws of the cautions', () => {
  it('whatever is known or not, every rule answers, inside its declared levels, with words for all of it', () => {
    fc.assert(
      fc.property(rawFacts, stage, (facts, at) => {
        const { cautions, conditions } = evaluateCautions({ facts, stage: at })
        for (const caution of cautions) {
          const rule = cautionRules.find(({ id }) => id === caution.ruleId)
          expect(rule?.levels).toContain(caution.level)
          expect(caution.resolvedBy.length).toBeGreaterThan(0)
          const { title, text, resolves } = sayCaution(caution, facts.zone)
          for (const words of [title, text, ...resolves]) {
            expect(words, caution.code).toMatch(/^[A-Z0-9−]/)
            expect(words, caution.code).not.toMatch(/undefined|\[object|R\d\d\b|\d{4}-\d{2}-\d{2}/)
          }
        }
        for (const condition of conditions)
          expect(sayCondition(condition, facts.zone)).toMatch(/^[A-Z].*[^.]$/)
      }),
      { numRuns: 120 },
    )
  })

  it('a rule looks at no fact that it does not name', () => {
    fc.assert(
      fc.property(anyFacts, anyFacts, stage, (facts, others, at) => {
        for (const rule of cautionRules) {
          let mixed = facts
          for (const path of allPaths(facts)) {
            // Whether a rule concerns an order may depend on more than what it judges by.
            if (!rule.uses.includes(path)) mixed = withFact(mixed, path, factAt(others, path))
          }
          if (rule.concerns(facts) !== rule.concerns(mixed)) continue
          expect(judge(rule, mixed, at), rule.id).toEqual(judge(rule, facts, at))
        }
      }),
      { numRuns: 40 },
    )
  })

  it('not knowing the water, the animals, life support, the lot, the volume or the history never softens a rule', () => {
    // R12 at design says nothing about a reading before a course has begun: nobody has to have read copper yet.
    const hardGroups = ['water', 'animals', 'volume', 'lifeSupport', 'lot', 'history']
    // Facts that only loosen: more said of them, fewer stops.
    const silent: Partial<Record<FactPath, string>> = {
      'lot.densityGPerMl': 'the usual density is taken where the lot does not say',
      'water.recentTemperaturesC': 'the newest reading is judged as well',
      'water.kind': 'what is not said of the kind of water is judged as both kinds, reading by reading',
      'water.alkalinityMgPerLCaCO3': 'R11 leaves an unknown alkalinity to R10, which stops',
    }
    fc.assert(
      fc.property(anyFacts, stage, (facts, at) => {
        for (const rule of cautionRules) {
          const before = judge(rule, facts, at)
          for (const path of rule.uses) {
            if (!hardGroups.includes(path.split('.')[0] ?? '') || silent[path] !== undefined) continue
            if (rule.id === 'R12' && at === 'design') continue
            if (factAt(facts, path).state !== 'known') continue
            // The newest temperature is one of the recent ones: not knowing it is knowing none of them.
            const blank = withFact(facts, path, unknown())
            const less =
              path === 'water.temperatureC' ? withFact(blank, 'water.recentTemperaturesC', unknown()) : blank
            const after = judge(rule, less, at)
            expect(worst(after.map(({ level }) => level)), `${rule.id} ${path}`).toBeLessThanOrEqual(
              worst(before.map(({ level }) => level)),
            )
          }
        }
      }),
      { numRuns: 80 },
    )
  })

  it('a tighter parameter never lets more through', () => {
    fc.assert(
      fc.property(anyFacts, stage, fc.double({ min: 0.05, max: 1, noNaN: true }), (facts, at, share) => {
        for (const rule of cautionRules) {
          const defaults = resolveParameters(rule, {})
          const values = Object.fromEntries(defaults.map(({ key, value }) => [key, value]))
          const before = rule.concerns(facts) ? rule.judge(facts, values, at) : []
          for (const { key, value, tighter } of defaults) {
            const tightened = { ...values, [key]: tighter === 'lower' ? value * share : value / share }
            const after = rule.concerns(facts) ? rule.judge(facts, tightened, at) : []
            expect(worst(after.map(({ level }) => level)), `${rule.id} ${key}`).toBeLessThanOrEqual(
              worst(before.map(({ level }) => level)),
            )
          }
        }
      }),
      { numRuns: 60 },
    )
  })

  it('no sentence writes a quantity in a way that is misread', () => {
    fc.assert(
      fc.property(anyFacts, stage, (facts, at) => {
        const { cautions, conditions } = evaluateCautions({ facts, stage: at })
        const said = [
          ...cautions.map((one) => sayCaution(one, facts.zone).text),
          ...conditions.map((one) => sayCondition(one, facts.zone)),
        ]
        for (const text of said) expect(findUnsafeWriting(text, 'prose'), text).toEqual([])
      }),
      { numRuns: 80 },
    )
  })
})
