import pg from 'pg'
import { expect, it } from 'vitest'
import { sayError } from '../../server/platform/log.ts'

it('a lost connection is logged with its code and words, and without the whole client that it brings', async () => {
  const client = new pg.Client({ host: '127.0.0.1', port: 1, password: 'not-for-the-log' })
  const error: unknown = await client.connect().catch((reason: unknown) => reason)
  const said = sayError(Object.assign(error as Error, { client }))
  expect(said).toMatchObject({ type: 'Error', code: 'ECONNREFUSED' })
  expect(JSON.stringify(said)).not.toContain('not-for-the-log')
  expect(JSON.stringify(said).length).toBeLessThan(2000)
})
