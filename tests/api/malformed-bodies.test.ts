import { afterAll, beforeAll, expect, it } from 'vitest'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => (api = await startApi()))
afterAll(() => api.stop())

const unreadable = /not JSON.*brackets, commas and quotation marks/
const encoding = /encod.*UTF-8/

it.each([
  ['cut short', 'application/json', Buffer.from('{"id":'), unreadable],
  ['no object', 'application/json', Buffer.from('velvet'), unreadable],
  [
    'cut short and written in UTF-8',
    'application/json; charset=utf-8',
    Buffer.from('{"note":"µ'),
    unreadable,
  ],
  ['of bytes that are not UTF-8', 'application/json', Buffer.from('{"note":"5 µg"}', 'latin1'), encoding],
  ['said to be in another encoding', 'application/json; charset=latin1', Buffer.from('{}'), encoding],
])('says what is wrong with a body %s', async (_what, type, body, said) => {
  const { agent } = await api.as('technician')
  const reply = await agent
    .post('/api/orders')
    .set('content-type', type)
    .serialize((given) => given as unknown as string)
    .send(body)
  expect([reply.status, reply.body.code]).toEqual([400, 'malformed-json'])
  expect(reply.body.detail).toMatch(said)
  expect(reply.body.detail).not.toMatch(said === encoding ? unreadable : encoding)
})

it('says what is wrong with a body that is packed in a way nobody here unpacks', async () => {
  const { agent } = await api.as('technician')
  const reply = await agent
    .post('/api/orders')
    .set('content-type', 'application/json')
    .set('content-encoding', 'zstd')
    .send('{}')
  expect([reply.status, reply.body.code]).toEqual([400, 'malformed-json'])
  expect(reply.body.detail).toMatch(encoding)
})
