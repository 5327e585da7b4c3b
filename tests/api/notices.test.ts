import type { AddressInfo } from 'node:net'
import { text } from 'node:stream/consumers'
import { SMTPServer } from 'smtp-server'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aCase } from '../builders/a-case.ts'
import { anObservation } from '../builders/an-observation.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let server: SMTPServer
let refuse = true
const letters: { to: string; message: string }[] = []

beforeAll(async () => {
  server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    logger: false,
    onRcptTo: (_address, _session, done) => done(refuse ? new Error('mailbox closed') : undefined),
    onData: (stream, session, done) => {
      void text(stream).then((message) => {
        for (const { address } of session.envelope.rcptTo) letters.push({ to: address, message })
        done()
      }, done)
    },
  })
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const { port } = server.server.address() as AddressInfo
  api = await startApi({ smtpUrl: `smtp://127.0.0.1:${String(port)}`, jobs: true })
  await api.setSetting(
    'notices.on-call',
    'Dr I. Marrow | 555 0141 | marrow@harrow-point.example, Dr P. Oduya-Kemp | 555 0147 | kemp@harrow-point.example, Duty desk | ext. 41',
  )
})
afterAll(async () => {
  await api.stop()
  await new Promise<void>((resolve) => server.close(() => resolve()))
})

async function until<T>(read: () => Promise<T>, holds: (value: T) => boolean): Promise<T> {
  for (let i = 0; i < 100; i++) {
    const value = await read()
    if (holds(value)) return value
    await new Promise((resolve) => setTimeout(resolve, 200))
  }
  throw new Error('waited in vain')
}

describe('an urgent call', () => {
  it('says that it was not sent, is sent when the mail server answers again, and then who has seen it', async () => {
    const one = await aCase(api)
    const { agent } = await api.as('keeper')
    const noticeId = api.nextId()
    const reply = await agent.post('/api/observations').send(
      anObservation(api, one.enclosure.code, {
        noticeId,
        urgent: true,
        breathing: 'fast',
        words: 'Two lie on the floor, one tail slack.',
      }),
    )
    expect(reply.status).toBe(201)
    expect(reply.body.notice).toMatchObject({ id: noticeId, state: 'sending' })
    const read = async () => (await agent.get(`/api/notices/${noticeId}`).expect(200)).body
    const failed = await until(read, ({ failed }) => failed.length === 2)
    expect(failed.state).toBe('not-sent')
    expect(failed.failed).toMatchObject([
      { name: 'Dr I. Marrow', error: expect.stringContaining('mailbox closed') as string },
      { name: 'Dr P. Oduya-Kemp' },
    ])
    expect(letters).toEqual([])

    refuse = false
    const sent = await until(read, ({ sentTo }) => sentTo.length === 2)
    expect(sent.state).toBe('sent')
    expect(sent.failed).toEqual([])
    expect(sent.sentTo.map(({ name }: { name: string }) => name)).toEqual([
      'Dr I. Marrow',
      'Dr P. Oduya-Kemp',
    ])
    expect(letters.map(({ to }) => to)).toEqual(['marrow@harrow-point.example', 'kemp@harrow-point.example'])
    const [letter] = letters
    expect(letter?.message).toContain(`Subject: URGENT: ${one.enclosure.code}`)
    const unfolded = letter?.message.replaceAll('=\r\n', '')
    expect(unfolded).toContain('Two lie on the floor, one tail slack.')
    expect(unfolded).toContain(`https://pratique.example/urgent/${noticeId}`)

    const called = { id: api.nextId(), whom: 'Duty desk', happenedAt: '2026-12-01T18:15:00Z' }
    await agent.post(`/api/notices/${noticeId}/telephoned`).send(called).expect(201)
    const again = await agent.post(`/api/notices/${noticeId}/telephoned`).send(called).expect(201)
    expect(again.body.telephoned).toMatchObject([{ by: 'Test keeper', whom: 'Duty desk' }])
    expect(again.body.state).toBe('sent')
    const open = await agent.get('/api/notices').expect(200)
    expect(open.body.rows.map(({ id }: { id: string }) => id)).toContain(noticeId)

    // whoever raised it has not been told of it by anybody; neither does another keeper answer it
    expect((await agent.post(`/api/notices/${noticeId}/seen`).send({ id: api.nextId() })).body.code).toBe(
      'may-not',
    )
    const vet = await api.as('veterinarian')
    const seen = await vet.agent.post(`/api/notices/${noticeId}/seen`).send({ id: api.nextId() }).expect(201)
    expect(seen.body).toMatchObject({ state: 'seen', seen: [{ by: 'Test veterinarian' }] })
    expect((await agent.get('/api/notices')).body.rows).toEqual([])
  })

  it('is seen by another person than whoever raised it', async () => {
    const one = await aCase(api)
    const vet = await api.as('veterinarian')
    const noticeId = api.nextId()
    await vet.agent
      .post('/api/observations')
      .send(anObservation(api, one.enclosure.code, { noticeId, urgent: true, words: 'Gasping.' }))
      .expect(201)
    const see = (agent: typeof vet.agent) =>
      agent.post(`/api/notices/${noticeId}/seen`).send({ id: api.nextId() })
    const own = await see(vet.agent)
    expect(own.status).toBe(403)
    expect(own.body.code).toBe('another-person-needed')
    expect(own.body.detail).toMatch(/Another veterinarian or technician/)
    const acts = async (agent: typeof vet.agent) =>
      (await agent.get('/api/today').expect(200)).body.items.find(
        ({ id }: { id: string }) => id === `urgent-call:${noticeId}`,
      ).acts
    const technician = await api.as('technician')
    expect(await acts(vet.agent)).toEqual([])
    expect(await acts(technician.agent)).toEqual(['mark-seen'])
    expect((await see(technician.agent).expect(201)).body).toMatchObject({
      state: 'seen',
      seen: [{ by: 'Test technician' }],
    })
  })

  it('reaches nobody, and says so, when nobody with an address is on the list', async () => {
    await api.setSetting('notices.on-call', 'Duty desk | ext. 41')
    const one = await aCase(api)
    const { agent } = await api.as('keeper')
    const reply = await agent
      .post('/api/observations')
      .send(anObservation(api, one.enclosure.code, { urgent: true, signs: ['gasping'] }))
    const read = async () => (await agent.get(`/api/notices/${String(reply.body.notice.id)}`)).body
    const failed = await until(read, ({ state }) => state === 'not-sent')
    expect(failed.failed[0].error).toContain('on-call list')
    const list = await agent.get('/api/on-call').expect(200)
    expect(list.body.people).toEqual([{ name: 'Duty desk', phone: 'ext. 41', email: null }])
  })

  it('is raised with its observation or not at all', async () => {
    const { agent } = await api.as('keeper')
    const noticeId = api.nextId()
    const reply = await agent
      .post('/api/observations')
      .send(anObservation(api, 'NOWHERE', { noticeId, urgent: true, words: 'help' }))
    expect(reply.status).toBe(422)
    expect((await agent.get(`/api/notices/${noticeId}`)).status).toBe(404)
    const vet = await api.as('veterinarian')
    const nothing = await vet.agent.post(`/api/notices/${noticeId}/seen`).send({ id: api.nextId() })
    expect(nothing.status).toBe(404)
  })
})
