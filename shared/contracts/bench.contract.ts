import { z } from 'zod'
import { calculators } from '../bench/calculators.ts'
import type { AnyCalculator } from '../bench/definition.ts'
import { bodySchema } from '../bench/schema.ts'
import { say } from '../bench/words.ts'
import { contract } from './contract.ts'

export { printBenchSheet } from './bench-print.contract.ts'

const Shown = z.string().describe('The number with its unit, rounded, as screens show it')

export const BenchFigure = z.object({
  key: z.string().describe('Name of the figure within its calculator'),
  what: z.string().describe('What it is, in words'),
  value: z.number().describe('Unrounded'),
  unit: z.string().describe('Code of its unit'),
  significantFigures: z.int().describe('How many digits of the value mean something'),
  shown: Shown,
})

export const BenchSource = z.object({
  key: z.string().describe('Name of the work within this program'),
  citation: z.string().describe('The work, cited'),
  mark: z
    .enum(['V', 'V2', 'C', 'M', 'P'])
    .describe('V opened, V2 read in a restatement, C computed, M from memory, P project default'),
})

export const BenchWorkingLine = z.object({
  key: z.string().describe('Name of the line within this working'),
  what: z.string().describe('What the line works out'),
  expression: z.string().describe('The arithmetic with numbers and units put in, readable by a machine'),
  formula: z.string().describe('The same as people write it'),
  value: z.number().describe('Unrounded'),
  unit: z.string().describe('Code of its unit'),
  shown: Shown,
  rests: z.array(z.string()).describe('Keys of the earlier lines that it takes values from'),
})

const BenchCautionText = z.object({
  code: z.string().describe('Stable code'),
  level: z.enum(['note', 'warning']).describe('How much it matters'),
  text: z.string().describe('What to heed'),
})

/** What a calculator answers: the result, and everything needed to trust it. */
export const BenchReply = z.object({
  calculator: z.string().describe('Which calculator answered'),
  value: z.number().describe('The result, unrounded'),
  unit: z.string().describe('Code of its unit'),
  significantFigures: z.int().describe('How many digits of the result mean something'),
  shown: Shown,
  range: z
    .object({
      low: z.number().describe('Lower end, in the unit of the result'),
      high: z.number().describe('Upper end, in the unit of the result'),
      shown: z.string().describe('Both ends, rounded, as screens show them'),
    })
    .nullable()
    .describe('What the stated errors of the inputs make of the result; null when none moves it'),
  figures: z.array(BenchFigure).describe('The result and whatever else was worked out with it'),
  working: z.array(BenchWorkingLine).describe('Every step; each was evaluated a second, independent way'),
  schedule: z
    .object({
      columns: z
        .array(
          z.object({
            key: z.string().describe('Name of the column'),
            what: z.string().describe('What stands in it'),
            unit: z.string().describe('Code of its unit'),
          }),
        )
        .describe('The columns'),
      rows: z.array(z.array(z.number())).describe('One row for each step'),
    })
    .nullable()
    .describe('The steps of a plan, where the result is one'),
  sources: z.array(BenchSource).describe('The works that the figures rest on'),
  cautions: z.array(BenchCautionText).describe('What to heed before the figure is used'),
})
export type BenchReply = z.infer<typeof BenchReply>

const BenchCalculator = z.object({
  id: z.string().describe('Name of the calculator in its address'),
  address: z.string().describe('Where to ask it'),
  name: z.string().describe('Its name in words'),
  purpose: z.string().describe('What it is for'),
  group: z.string().describe('Where it stands on the bench'),
  weekly: z.boolean().describe('Among those that people use every week'),
  body: z.record(z.string(), z.unknown()).describe('JSON Schema of what it takes'),
  example: z.record(z.string(), z.unknown()).describe('A whole question'),
  sources: z.array(BenchSource).describe('The works that it rests on'),
})

export const listCalculators = contract({
  id: 'listCalculators',
  method: 'get',
  path: '/bench',
  action: 'collection.read',
  summary: 'Every calculator of the bench: what it is for, what it takes, and what it rests on',
  reply: { 200: z.object({ calculators: z.array(BenchCalculator).describe('The calculators') }) },
  problems: [],
})

/** The contract of one calculator, made from its description. */
export function calculatorContract(of: AnyCalculator) {
  return contract({
    id: `bench:${of.id}`,
    method: 'post',
    path: `/bench/${of.id}`,
    action: 'collection.read',
    summary: `${say(of, 'name')}: ${say(of, 'purpose')}`,
    // the calculator reads its own inputs, so that every refusal has its stable code and its sentence
    body: z.record(z.string(), z.unknown()).meta(bodySchema(of)),
    reply: { 200: BenchReply },
    problems: ['not-computable', 'working-disagrees'],
    idempotent: 'nothing-kept',
  })
}

/** Any other address of the bench: there is no calculator by that name. */
export const askUnknownCalculator = contract({
  id: 'askUnknownCalculator',
  method: 'post',
  path: '/bench/:calculator',
  action: 'collection.read',
  summary: 'Refuse a calculator that does not exist; the names are listed at /api/bench',
  params: z.strictObject({ calculator: z.string().describe('Name of a calculator') }),
  reply: { 200: BenchReply },
  problems: ['not-found'],
  idempotent: 'nothing-kept',
})

export const calculatorContracts = calculators.map((of) => ({ of, contract: calculatorContract(of) }))

/** The contracts of the calculators by name, as the list of all contracts gathers them. */
export const benchContracts = Object.fromEntries(
  calculatorContracts.map((each) => [each.contract.id, each.contract]),
)
