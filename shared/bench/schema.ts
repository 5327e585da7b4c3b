import { unitOf } from '../domain/units/unit-of.ts'
import { canonicalUnit, type UnitCode } from '../domain/units/unit-table.ts'
import type { AnyCalculator } from './definition.ts'
import type { Input } from './inputs.ts'
import { say, sayOption, wordOf } from './words.ts'

type Schema = Record<string, unknown>

/** The body that a calculator takes, as JSON Schema: for the API documents. What is asked depends on the choices. */
export function bodySchema(of: AnyCalculator): Schema {
  const entries = Object.entries(of.inputs)
  return {
    type: 'object',
    additionalProperties: false,
    properties: Object.fromEntries(entries.map(([name, input]) => [name, inputSchema(of, name, input)])),
    required: entries.filter(([, input]) => !input.optional && !input.when).map(([name]) => name),
    examples: [of.example],
  }
}

function inputSchema(of: AnyCalculator, name: string, input: Input): Schema {
  const help = wordOf(of, `help.${name}`)
  const sentences = [say(of, `input.${name}`), ...(help ? [help.replace(/\.$/, '')] : []), ...asked(input)]
  const description = sentences.join('. ')
  if (input.kind === 'choice')
    return {
      type: 'string',
      enum: input.options,
      description,
      'x-options': optionWords(of, name, input.options),
    }
  const { above, min, max } = input.limits ?? {}
  return {
    type: 'object',
    description,
    additionalProperties: false,
    required: ['value', 'unit'],
    properties: {
      value: {
        anyOf: [{ type: 'string' }, { type: 'number' }],
        description: 'Digits with at most one decimal point; as text they keep their trailing zeros',
      },
      unit: { type: 'string', enum: input.units, description: 'Code of the unit' },
    },
    ...(input.limits ? { 'x-limits': { above, min, max, unit: canonical(input.units) } } : {}),
  }
}

function asked(input: Input): string[] {
  const when = Object.entries(input.when ?? {}).map(([name, answers]) => `${name} is ${answers.join(', ')}`)
  return [
    ...(when.length > 0 ? [`Asked when ${when.join(' and ')}`] : []),
    ...(input.optional ? ['May be left out'] : []),
  ]
}

const optionWords = (of: AnyCalculator, name: string, options: readonly string[]): Schema =>
  Object.fromEntries(options.map((option) => [option, sayOption(of, name, option)]))

const canonical = (units: readonly UnitCode[]) =>
  units[0] === undefined ? '' : canonicalUnit[unitOf(units[0]).dimension]
