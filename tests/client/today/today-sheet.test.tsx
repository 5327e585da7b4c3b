import { QueryClientProvider } from '@tanstack/react-query'
import { act } from 'react'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { HandoverNote } from '../../../shared/contracts/handover.contract.ts'
import type { Me } from '../../../shared/contracts/sign-in.contract.ts'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { TodaySheet } from '../../../src/features/today/index.ts'
import { MeContext } from '../../../src/lib/me.ts'
import { createQueryClient } from '../../../src/lib/query-client.ts'
import { click, draw, drawsComponents, named, one, type } from '../../support/react.tsx'
import { aDose, at, someWork, zone } from './some-work.ts'

drawsComponents()

const me: Me = {
  id: '0197f000-0000-7000-8000-000000000001',
  email: 'vet@harrow-point.example',
  printedName: 'Dr Ilse Marrow',
  roles: ['veterinarian'],
  mustChangePassword: false,
  licences: [],
  mayPractise: true,
  signingLockedUntil: null,
  preferences: {},
  facility: { name: 'Harrow Point Sea Hall', zone, gallon: null, demo: false },
}

let items: TodayWork[] = []
let handover: HandoverNote[] = []
let fails = false
const sent: { call: string; body: unknown }[] = []

beforeEach(() => {
  items = []
  handover = []
  fails = false
  sent.length = 0
  vi.spyOn(globalThis, 'fetch').mockImplementation(async (address, init) => {
    const call = `${init?.method ?? 'GET'} ${String(address)}`
    if (call !== 'GET /api/today') {
      sent.push({ call, body: JSON.parse(String(init?.body)) as unknown })
      return new Response('{}', { status: 201 })
    }
    if (!fails) return new Response(JSON.stringify({ at, on: '2026-12-01', items, handover, log: [] }))
    const problem = { type: '/problems/server-error', title: 'Something failed here', code: 'server-error' }
    return new Response(JSON.stringify({ ...problem, status: 500, request_id: 'r-7' }), { status: 500 })
  })
})

async function opened() {
  const client = createQueryClient()
  const { place } = await draw(
    <QueryClientProvider client={client}>
      <MeContext value={me}>
        <TodaySheet />
      </MeContext>
    </QueryClientProvider>,
  )
  for (let wait = 0; wait < 50 && place.querySelector('[role="progressbar"]') !== null; wait++)
    await act(() => new Promise((resolve) => setTimeout(resolve, 20)))
  return { place, client }
}

describe('Today', () => {
  it('says a clear day as one', async () => {
    const { place, client } = await opened()
    expect(place.textContent).toContain('Nothing waits for you now')
    expect(place.textContent).toContain('A clear day')
    client.clear()
  })

  it('says that it cannot be read, why, and the code for whoever helps', async () => {
    fails = true
    const { place, client } = await opened()
    const alert = one(place, '[role="alert"]')
    expect(alert.textContent).toContain('The work of today can’t be read')
    expect(alert.textContent).toContain('r-7')
    fails = false
    items = [aDose()]
    await click(named(place, 'Try again'))
    await act(() => new Promise((resolve) => setTimeout(resolve, 50)))
    expect(place.textContent).toContain('Praziquantel bath, QT-3')
    client.clear()
  })

  it('says an overdue dose by a word and how late, and marks its amount as a dose', async () => {
    items = [aDose({ state: 'late', latestAt: '2026-12-01T13:20:00Z' })]
    const { place, client } = await opened()
    expect(one(place, '.today-band-late h2').textContent).toBe('Overdue')
    expect(one(place, '.today-item').textContent).toContain('overdue')
    expect(one(place, '.today-late').textContent).toBe('5 h late')
    expect(one(place, '[data-quantity="dose"]').textContent).toBe('4.36\u00a0g')
    expect(named(place, 'Praziquantel bath, QT-3').getAttribute('href')).toBe('/orders/TO-0734/sheet?dose=2')
    client.clear()
  })

  it('marks an urgent call as seen with one touch, under one id however often it is sent', async () => {
    items = [
      someWork('urgent-call', {
        state: 'late',
        at,
        latestAt: at,
        params: {
          noticeId: 'n-1',
          enclosure: 'QT-6',
          words: 'Two lie down.',
          by: 'T. Keeper',
          fate: 'not-sent',
        },
        acts: ['mark-seen'],
      }),
    ]
    const { place, client } = await opened()
    expect(place.textContent).toContain('NOT SENT')
    await click(named(place, 'I have seen it and see to it'))
    await click(named(place, 'I have seen it and see to it'))
    expect(sent.map(({ call }) => call)).toEqual(['POST /api/notices/n-1/seen', 'POST /api/notices/n-1/seen'])
    expect(sent[0]?.body).toEqual(sent[1]?.body)
    client.clear()
  })

  it('stops a bath without password or reason, at the minute of the touch', async () => {
    items = [
      someWork('bath-running', {
        state: 'running',
        at,
        dueAt: '2026-12-01T19:05:00Z',
        latestAt: '2026-12-01T19:05:00Z',
        params: {
          number: 'TO-1',
          key: '1',
          enclosure: 'QT-3',
          agent: 'formalin',
          by: 'S. Brandt',
          doseId: 'd-1',
        },
        acts: ['stop-bath'],
      }),
    ]
    const { place, client } = await opened()
    expect(place.textContent).toContain('ends 15:05')
    await click(named(place, 'Stop the bath'))
    const dialog = one<HTMLDialogElement>(place, 'dialog')
    expect(dialog.textContent).toContain('Stop the bath at QT-3 now?')
    await type(one(dialog, 'textarea'), 'two on their side')
    await click(named(dialog, 'Stop the bath'))
    expect(sent).toMatchObject([
      { call: 'POST /api/doses/d-1/stop', body: { cause: 'stopped', seen: 'two on their side' } },
    ])
    const { happenedAt } = sent[0]?.body as { happenedAt: string }
    expect(Math.abs(Date.now() - Date.parse(happenedAt))).toBeLessThan(60_000)
    client.clear()
  })

  it('lifts a hold only with a reason', async () => {
    items = [
      someWork('order-held', {
        at,
        params: { number: 'TO-2', enclosure: 'QT-1', by: 'T. Keeper', reason: 'breathes fast' },
        acts: ['lift-order'],
      }),
    ]
    const { place, client } = await opened()
    expect(place.textContent).toContain('“breathes fast”, T. Keeper')
    await click(named(place, 'Lift the hold'))
    const dialog = one<HTMLDialogElement>(place, 'dialog')
    await click(named(dialog, 'Lift the hold'))
    expect(sent).toEqual([])
    await type(one(dialog, 'textarea'), 'oxygen is back')
    await click(named(dialog, 'Lift the hold'))
    expect(sent).toEqual([{ call: 'POST /api/orders/TO-2/hold-lift', body: { reason: 'oxygen is back' } }])
    client.clear()
  })

  it('shows notes of the watch before with who has read them, and keeps what is typed until it went through', async () => {
    handover = [
      {
        id: 'h-1',
        about: 'Quarantine wing',
        words: 'Two low by the pump.',
        at: '2026-12-01T17:30:00Z',
        by: 'L. Haas',
        readBy: [{ by: 'S. Brandt', at: '2026-12-01T17:44:00Z' }],
        mine: false,
        readByMe: false,
      },
    ]
    const { place, client } = await opened()
    // on a narrow screen what nobody here has read stands before the work, and the log is a drawer
    const note = one(place, '.handover')
    expect(note.textContent).toContain('Handover, Quarantine wing')
    expect(note.textContent).toContain('Read by S. Brandt 13:44.')
    await click(named(note, 'I have read it'))
    expect(sent[0]?.call).toBe('POST /api/handover-notes/h-1/reads')
    await click(named(place, /Ship’s log/))
    await click(named(place, 'Leave the note'))
    expect(place.textContent).toContain('Fill this in.')
    await type(one(place, '.log-foot textarea'), 'UV off before the copper.')
    await click(named(place, 'Leave the note'))
    expect(sent[1]).toMatchObject({
      call: 'POST /api/handover-notes',
      body: { words: 'UV off before the copper.' },
    })
    expect(one<HTMLTextAreaElement>(place, '.log-foot textarea').value).toBe('')
    client.clear()
  })

  it('folds away what was done today', async () => {
    items = [aDose({ state: 'done', dueAt: null, at: '2026-12-01T13:00:00Z' })]
    const { place, client } = await opened()
    expect(place.textContent).not.toContain('Praziquantel bath')
    await click(named(place, 'Show what was done today'))
    expect(place.textContent).toContain('Praziquantel bath')
    client.clear()
  })
})
