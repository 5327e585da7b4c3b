import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { successStatus } from '../../shared/contracts/contract.ts'
import { allContracts } from '../../shared/contracts/index.ts'
import { problemStatus } from '../../shared/contracts/problems.ts'
import { actions } from '../../shared/domain/permissions/table.ts'
import { problemTitles } from '../../shared/messages/problems.ts'
import { apiDocument } from '../../server/platform/http/api-document.ts'
import { openApiDocument } from '../../server/platform/http/openapi.ts'

interface Schema {
  description?: string
  type?: string
  format?: string
  enum?: unknown[]
  uniqueItems?: boolean
  properties?: Record<string, Schema>
  items?: Schema
  anyOf?: Schema[]
  oneOf?: Schema[]
}

/** Lists of records, ids or fixed words in which one may stand twice. */
function listsThatTakeTwice(schema: Schema, at: string): string[] {
  const forms = (one: Schema | undefined) => (one ? [one, ...(one.anyOf ?? []), ...(one.oneOf ?? [])] : [])
  return forms(schema).flatMap((form) => {
    const items = forms(form.items)
    const tells = items.some((one) => one.properties?.['id'] ?? one.enum ?? one.format === 'uuid')
    return [
      ...(tells && form.uniqueItems !== true ? [at] : []),
      ...items.flatMap((one) => listsThatTakeTwice(one, `${at}[]`)),
      ...Object.entries(form.properties ?? {}).flatMap(([name, one]) =>
        listsThatTakeTwice(one, `${at}.${name}`),
      ),
    ]
  })
}

/** Places in a schema that say nothing about what they mean. */
function undescribed(schema: Schema, at: string): string[] {
  return Object.entries(schema.properties ?? {}).flatMap(([name, property]) => {
    const here = `${at}.${name}`
    const inside = [property, property.items, ...(property.anyOf ?? [])].flatMap((s) =>
      s ? undescribed(s, here) : [],
    )
    return property.description ? inside : [here, ...inside]
  })
}

describe('contracts', () => {
  it('have ids and addresses of their own', () => {
    const ids = allContracts.map((one) => one.id)
    const addresses = allContracts.map((one) => `${one.method} ${one.path.replace(/:\w+/g, ':')}`)
    expect(new Set(ids).size).toBe(ids.length)
    expect(new Set(addresses).size).toBe(addresses.length)
  })

  it.each(allContracts.map((one) => [one.id, one] as const))('%s says all that it has to', (_id, of) => {
    expect(of.summary.length).toBeGreaterThan(5)
    expect(['public', 'signed-in', ...actions]).toContain(of.action)
    expect(Object.keys(of.reply)).toHaveLength(1)
    expect(successStatus(of)).toBeGreaterThanOrEqual(200)
    for (const code of of.problems) expect(Object.keys(problemStatus)).toContain(code)
    if (of.method === 'post' && of.action !== 'public' && of.id !== 'signOut' && of.id !== 'changePassword')
      expect(of.idempotent, 'a writing contract says how a retry is recognised').toBeDefined()
    for (const schema of [of.params, of.query, of.body, ...Object.values(of.reply)]) {
      if (!schema) continue
      const json = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }) as Schema
      expect(undescribed(json, of.id)).toEqual([])
    }
  })

  it('take no record, id or fixed word twice in one list', () => {
    const open = allContracts.flatMap(({ id, body }) =>
      body
        ? listsThatTakeTwice(z.toJSONSchema(body, { io: 'input', unrepresentable: 'any' }) as Schema, id)
        : [],
    )
    expect(open).toEqual([])
  })

  it('answer unknown fields with an error, not with silence', () => {
    for (const of of allContracts) {
      if (!(of.body instanceof z.ZodObject)) continue
      const parsed = of.body.safeParse({ surprise: 1 })
      const keys =
        parsed.error?.issues.flatMap((issue) => (issue.code === 'unrecognized_keys' ? issue.keys : [])) ?? []
      expect(keys, of.id).toContain('surprise')
    }
  })

  // what people and programs send by mistake; every field of every contract gets all of them
  const mistakes = [
    undefined,
    null,
    '',
    'x',
    'x'.repeat(100_000),
    '\u0000',
    0,
    -1,
    1.5,
    1e20,
    Number.NaN,
    true,
    {},
    { surprise: 1 },
    [],
    [1, 'x', {}],
    new Date(0),
  ]
  const english = z.locales.en().localeError

  it.each(allContracts.map((one) => [one.id, one] as const))(
    '%s says what is wrong in plain words',
    (_id, of) => {
      for (const schema of [of.params, of.query, of.body]) {
        if (!schema) continue
        const fields = schema instanceof z.ZodObject ? Object.keys(schema.shape) : []
        const given = [
          ...mistakes,
          ...fields.flatMap((field) => mistakes.map((value) => ({ [field]: value }))),
        ]
        for (const value of given)
          for (const issue of schema.safeParse(value, { reportInput: true }).error?.issues ?? []) {
            const own = english(issue as Parameters<typeof english>[0])
            const sentence = typeof own === 'string' ? own : own?.message
            expect(issue.message, `${issue.path.join('.')} ${issue.code}`).not.toBe(sentence)
            expect(issue.message).not.toMatch(/\bInvalid\b|\bexpected\b|undefined|NaN/)
            expect(issue.message.length).toBeGreaterThan(5)
          }
      }
    },
  )

  it('give every problem a title', () => {
    expect(Object.keys(problemTitles).sort()).toEqual(Object.keys(problemStatus).sort())
  })

  it('are what docs/api.md says', async () => {
    await expect(apiDocument()).toMatchFileSnapshot('../../docs/api.md')
  })

  it('make an OpenAPI 3.1 document with every operation', () => {
    const document = openApiDocument() as { openapi: string; paths: Record<string, Record<string, unknown>> }
    expect(document.openapi).toBe('3.1.0')
    const operations = Object.values(document.paths).flatMap((path) => Object.values(path))
    expect(operations).toHaveLength(allContracts.length)
    expect(JSON.stringify(document)).not.toContain('$schema')
  })
})
