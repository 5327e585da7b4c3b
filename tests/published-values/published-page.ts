import { calculators } from '../../shared/bench/calculators.ts'
import type { AnyCalculator } from '../../shared/bench/definition.ts'
import { say } from '../../shared/bench/words.ts'
import { sources } from '../../shared/domain/sources.ts'
import { groups, runners } from './groups.ts'
import type { PublishedCase } from './published-case.ts'

const cases: readonly PublishedCase[] = Object.values(groups).flat()

const marks = {
  published: 'published',
  computed: 'computed a second way',
  practice: 'common practice',
  memory: 'from memory',
} as const

/** A figure of the page: as many digits as it has, seven at the most. */
const shown = (value: number): string => String(Number(value.toPrecision(7)))
const listed = (value: number | readonly number[]): string => [value].flat().map(Number).map(shown).join(', ')
const cell = (text: string): string => text.replaceAll('|', '\\|').replaceAll('\n', ' ')

/** What a case came to: how far off in its unit, and as a share of what it allows. */
interface Outcome {
  each: PublishedCase
  found: string
  deviation: number | null
}

function outcomeOf(each: PublishedCase): Outcome {
  const answer = runners.get(each.calculator)?.(each.inputs, 'unit' in each ? each.unit : '')
  if (!answer) throw new Error(`nothing computes ${each.calculator}`)
  if (!answer.ok) return { each, found: `refused: ${answer.refusal.field ?? ''}`, deviation: null }
  if ('refuses' in each) throw new Error(`${each.id} should have been refused`)
  const [found, expected] = [answer.value.value, each.expected].map((value) => [value].flat().map(Number))
  const apart = (expected ?? []).map((value, at) => Math.abs((found?.[at] ?? NaN) - value))
  return { each, found: listed(answer.value.value), deviation: Math.max(...apart) }
}

/** Two digits are enough to see how near it is; below what a double can hold it is nothing. */
function sayDeviation({ each, deviation }: Outcome): string {
  if (deviation === null || 'refuses' in each) return ''
  const size = Math.max(...[each.expected].flat().map(Math.abs))
  return deviation <= 1e-12 * size ? '0' : deviation.toPrecision(2)
}

function tableOf(outcomes: readonly Outcome[]): string[] {
  return [
    '| case | asked | expected | allowed | found | apart | source | how known |',
    '| --- | --- | --- | --- | --- | --- | --- | --- |',
    ...outcomes.map((one) => {
      const { each, found } = one
      const asked = Object.entries(each.inputs).map(([name, value]) => `${name} ${String(value)}`)
      const expected =
        'refuses' in each
          ? [`refused: ${each.refuses}`, '']
          : [`${listed(each.expected)} ${each.unit}`, shown(each.tolerance)]
      const cells = [
        each.id,
        asked.join('; '),
        ...expected,
        found,
        sayDeviation(one),
        each.source,
        marks[each.mark],
      ]
      return `| ${cells.map(cell).join(' | ')} |`
    }),
  ]
}

/** The case that came nearest to what it allows. */
function nearest(outcomes: readonly Outcome[]): string[] {
  const share = (one: Outcome) => {
    const { each, deviation } = one
    const none = deviation === null || 'refuses' in each || each.tolerance === 0 || sayDeviation(one) === '0'
    return none ? 0 : deviation / each.tolerance
  }
  const [worst] = [...outcomes].sort((a, b) => share(b) - share(a))
  if (!worst || share(worst) === 0) return []
  const unit = 'unit' in worst.each ? worst.each.unit : ''
  return [
    `Largest deviation: ${sayDeviation(worst)} ${unit} in ${worst.each.id}, ${(share(worst) * 100).toPrecision(2)} % of what is allowed.`,
    '',
  ]
}

function sectionOf(of: AnyCalculator): string[] {
  const outcomes = cases.filter((each) => of.published?.includes(each.calculator)).map(outcomeOf)
  return [
    `## ${say(of, 'name')}`,
    '',
    `${say(of, 'purpose')} Formula: ${say(of, 'formula')}.`,
    '',
    ...of.sources.map((key) => `- ${sources[key].citation} (${sources[key].mark})`),
    '',
    ...(outcomes.length === 0
      ? [
          'No published value of its own; its laws and its examples by hand stand in `tests/domain/bench`.',
          '',
        ]
      : [...nearest(outcomes), ...tableOf(outcomes), '']),
  ]
}

/** Cases that no calculator of the bench answers for: labels, orders, and what the library computes for itself. */
export function offTheBench(): readonly PublishedCase[] {
  const claimed = new Set(calculators.flatMap((of) => of.published ?? []))
  return cases.filter((each) => !claimed.has(each.calculator))
}

/** The page of published values: each calculator with its formula, its sources, its cases and how far off they are. */
export function publishedPage(): string {
  const rest = offTheBench().map(outcomeOf)
  const refusals = cases.filter((each) => 'refuses' in each).length
  return [
    '# Published values',
    '',
    `Made by a test from \`tests/published-values\` and the calculators of the bench: ${String(cases.length)} cases from outside the program, ${String(refusals)} of them refusals,`,
    `held by ${String(calculators.length)} calculators and the engines below them. Every case runs in \`npm test\`; a case outside what it allows stops the build.`,
    '',
    'A case is asked of the engine below its calculator. Where a calculator fixes an input of the engine (pressure at the surface, clean inflow) or',
    'chooses between two (fresh water below salinity 0.5), some cases test the engine further than the calculator goes.',
    '',
    'Marks of sources: V opened and read, V2 read in a restatement, C computed, M from memory, P project default. Inputs carry their unit',
    'in their name. "Allowed" and "apart" are in the unit of the result.',
    '',
    ...calculators.flatMap(sectionOf),
    '## Not on the bench',
    '',
    'Engines that orders, labels and the library use without a calculator of their own.',
    '',
    ...nearest(rest),
    ...tableOf(rest),
    '',
  ].join('\n')
}
