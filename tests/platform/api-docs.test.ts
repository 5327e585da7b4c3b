import { describe, expect, it } from 'vitest'
import { apiDocsPage } from '../../server/platform/api-docs/api-docs-page.ts'
import { listFields } from '../../server/platform/api-docs/list-fields.ts'
import { allContracts } from '../../shared/contracts/index.ts'

describe('the page of the API', () => {
  const page = apiDocsPage()
  it('has every address once, with who may ask and its refusals', () => {
    for (const { id, method, path } of allContracts) {
      expect(page.split(`<details id="${id}">`), id).toHaveLength(2)
      expect(page).toContain(`${method.toUpperCase()} /api${path}`)
    }
    expect(page).toContain('veterinarian (valid licence)')
    expect(page).toContain('<code>not-computable</code>')
  })
  it('has no script and no style of its own, which the headers would refuse', () => {
    expect(page.match(/<script|style=|<style|\son[a-z]+=/)).toBeNull()
  })
  it('shows text as text', () => {
    expect(page.match(/undefined|\[object Object\]|NaN|<td><\/td>/g)).toBeNull()
    expect(page.match(/&(?!#\d+;)/g)).toBeNull()
  })
})

describe('the fields of a schema', () => {
  it('are named by their path, with type, limits and meaning', () => {
    const schema = {
      type: 'object',
      required: ['rows'],
      properties: {
        rows: {
          type: 'array',
          description: 'The rows',
          items: {
            type: 'object',
            required: ['count'],
            properties: { count: { type: 'integer', minimum: 0, description: 'How many' } },
          },
        },
        note: { anyOf: [{ type: 'string', maxLength: 20 }, { type: 'null' }], description: 'In words' },
      },
    }
    expect(listFields(schema)).toEqual([
      { path: 'rows', type: 'list', meaning: 'The rows', optional: false },
      { path: 'rows[].count', type: 'whole number, 0 or more', meaning: 'How many', optional: false },
      { path: 'note', type: 'string, 20 characters at most or null', meaning: 'In words', optional: true },
    ])
  })
  it('tell variants apart by their fixed word', () => {
    const event = (kind: string, extra: string) => ({
      type: 'object',
      required: ['kind'],
      properties: { kind: { type: 'string', const: kind }, [extra]: { type: 'number' } },
    })
    const lines = listFields({ oneOf: [event('death', 'count'), event('closed', 'by')] }, 'event')
    expect(lines.map(({ path }) => path)).toEqual([
      'event',
      'event(death).kind',
      'event(death).count',
      'event(closed).kind',
      'event(closed).by',
    ])
  })
})
