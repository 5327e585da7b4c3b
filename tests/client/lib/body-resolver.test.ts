import type { FieldErrors, Resolver, ResolverOptions } from 'react-hook-form'
import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { bodyResolver } from '../../../src/lib/body-resolver.ts'
import { listFaults } from '../../../src/lib/form-faults.ts'
import { typedNumber, typedText } from '../../../src/lib/typed-text.ts'

interface Values {
  name: string
  lines: { count: string }[]
}
const body = z.strictObject({
  name: z.string().min(1).max(5),
  lines: z.array(z.strictObject({ count: z.int().min(1, 'At least 1') })),
})
const resolver = bodyResolver<Values>(
  body,
  (values) => ({
    name: typedText(values.name),
    lines: values.lines.map((line) => ({ count: typedNumber(line.count) })),
  }),
  (values) => (values.name === 'alias' ? ['lines.0.count'] : []),
)
const ask = async (values: Values) => {
  const options = {} as ResolverOptions<Values>
  const { errors } = await (resolver as Resolver<Values>)(values, undefined, options)
  return listFaults(errors as FieldErrors<Values>, (name) => `label of ${name}`)
}

describe('a form checked by the body it sends', () => {
  it('finds nothing where the body is right', async () => {
    expect(await ask({ name: 'ok', lines: [{ count: '3' }] })).toEqual([])
  })
  it('says of each field what to do, at the name that the server uses', async () => {
    expect(
      await ask({ name: ' ', lines: [{ count: '' }, { count: 'many' }, { count: '1.5' }, { count: '0' }] }),
    ).toEqual([
      { id: 'name', label: 'label of name', says: 'Fill this in.' },
      { id: 'lines.0.count', label: 'label of lines.0.count', says: 'Fill this in.' },
      { id: 'lines.1.count', label: 'label of lines.1.count', says: 'Type a number, for example 44.62.' },
      { id: 'lines.2.count', label: 'label of lines.2.count', says: 'Type a whole number.' },
      { id: 'lines.3.count', label: 'label of lines.3.count', says: 'At least 1' },
    ])
    expect(await ask({ name: 'too long', lines: [] })).toMatchObject([
      { says: 'Use at most 5\u00a0characters.' },
    ])
  })
  it('asks for what the form needs though the schema would let it pass', async () => {
    expect(await ask({ name: 'alias', lines: [{ count: '3' }] })).toMatchObject([
      { id: 'lines.0.count', says: 'Fill this in.' },
    ])
  })
})

describe('text as typed', () => {
  it('is nothing when it says nothing', () => {
    expect([typedText('  '), typedText(' a '), typedNumber(' ')]).toEqual([undefined, 'a', undefined])
    expect([typedNumber('−3'), typedNumber('44.62'), typedNumber('1,5'), typedNumber('1e3')]).toEqual([
      -3,
      44.62,
      Number.NaN,
      Number.NaN,
    ])
  })
})
