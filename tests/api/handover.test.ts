import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { HandoverNote } from '../../shared/contracts/handover.contract.ts'
import type { Role } from '../../shared/domain/permissions/roles.ts'
import { startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import { worklistOf } from '../support/worklist.ts'

let api: TestApi
let worklist: ReturnType<typeof worklistOf>
beforeAll(async () => {
  api = await startApi()
  worklist = worklistOf(api)
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

const post = async (role: Role, path: string, body: object) =>
  (await api.as(role)).agent.post(`/api/handover-notes${path}`).send(body)
const notesOf = async (role: Role) => (await worklist.todayOf(role)).handover

describe('a handover note', () => {
  it('stands on Today of whoever works at the tanks, with who has read it', async () => {
    const body = {
      id: api.nextId(),
      about: 'Quarantine wing',
      words: 'QT-5: two low by the pump, watch every hour.',
    }
    const written = await post('keeper', '', body)
    expect(written.status).toBe(201)
    expect(written.body).toMatchObject({ by: 'Test keeper', mine: true, readByMe: false, readBy: [] })
    expect((await post('keeper', '', body)).body).toEqual(written.body)
    expect(await notesOf('keeper')).toHaveLength(1)

    const id = api.nextId()
    api.clock.set(new Date('2026-12-01T18:41:00Z'))
    const read = await post('technician', `/${body.id}/reads`, { id })
    expect(read.body).toMatchObject({
      mine: false,
      readByMe: true,
      readBy: [{ by: 'Test technician', at: '2026-12-01T18:41:00.000Z' }],
    })
    await post('technician', `/${body.id}/reads`, { id })
    // reading it again on another day changes nothing of when it was read first
    api.clock.set(new Date('2026-12-01T19:00:00Z'))
    await post('technician', `/${body.id}/reads`, { id: api.nextId() })
    const [note] = await notesOf('veterinarian')
    expect(note).toMatchObject({
      about: 'Quarantine wing',
      mine: false,
      readByMe: false,
      readBy: [{ by: 'Test technician', at: '2026-12-01T18:41:00.000Z' }],
    } satisfies Partial<HandoverNote>)
  })

  it('is in the audit trail with its words, withheld from who may not read charts, and each reading of it once', async () => {
    const trail = async (role: Role, action: string) => {
      const { agent } = await api.as(role)
      return (await agent.get(`/api/audit?q=${action}&limit=50`).expect(200)).body.rows as {
        after: { words?: string } | null
        withheld: boolean
      }[]
    }
    const readings = (await trail('administrator', 'handover.read')).length
    const words = 'UV on QS-B must be off before the copper at 15:00.'
    const id = api.nextId()
    await post('technician', '', { id, words })
    const reading = { id: api.nextId() }
    await post('keeper', `/${id}/reads`, reading)
    await post('keeper', `/${id}/reads`, reading)
    expect((await trail('veterinarian', 'handover.write'))[0]?.after).toMatchObject({ words })
    expect((await trail('administrator', 'handover.write'))[0]).toMatchObject({ withheld: true })
    expect(JSON.stringify(await trail('administrator', 'handover.write'))).not.toContain('copper')
    expect(await trail('administrator', 'handover.read')).toHaveLength(readings + 1)
  })

  it('is for whoever records observations, and for nobody else', async () => {
    for (const role of ['registrar', 'administrator'] as const) {
      expect((await post(role, '', { id: api.nextId(), words: 'hello' })).status).toBe(403)
      expect(await notesOf(role)).toEqual([])
    }
  })

  it('leaves the list after two days and stays in the database', async () => {
    const id = api.nextId()
    await post('keeper', '', { id, words: 'An old one.' })
    api.clock.set(new Date('2026-12-03T18:20:01Z'))
    expect(await notesOf('keeper')).toEqual([])
    expect((await post('veterinarian', `/${id}/reads`, { id: api.nextId() })).body.words).toBe('An old one.')
  })

  it('refuses one without words, an unknown one, and another text under the same id', async () => {
    expect((await post('keeper', '', { id: api.nextId(), words: '  ' })).status).toBe(422)
    expect((await post('keeper', `/${api.nextId()}/reads`, { id: api.nextId() })).status).toBe(404)
    const id = api.nextId()
    await post('keeper', '', { id, words: 'One.' })
    expect((await post('keeper', '', { id, words: 'Another.' })).body.code).toBe('id-already-used')
    expect((await notesOf('keeper')).filter((note) => note.id === id)).toMatchObject([{ words: 'One.' }])
  })
})
