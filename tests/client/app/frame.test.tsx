import { act } from 'react'
import { createMemoryRouter, RouterProvider } from 'react-router-dom'
import { createRoot } from 'react-dom/client'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { Me } from '../../../shared/contracts/sign-in.contract.ts'
import { setMessageLocale } from '../../../shared/messages/define-messages.ts'
import { Providers } from '../../../src/app/providers.tsx'
import { createRoutes } from '../../../src/app/router.tsx'
import { createQueryClient } from '../../../src/lib/query-client.ts'
import { click, drawsComponents, named, one, type } from '../../support/react.tsx'

drawsComponents()

const ilse: Me = {
  id: '0197f000-0000-7000-8000-000000000001',
  email: 'vet@harrow-point.example',
  printedName: 'Dr Ilse Marrow',
  roles: ['veterinarian'],
  mustChangePassword: false,
  licences: [],
  mayPractise: false,
  signingLockedUntil: null,
  preferences: {},
  facility: { name: 'Harrow Point Sea Hall', zone: 'America/Halifax', gallon: null, demo: false },
}

/** The network, faked at the contract: who is signed in, and what sign-in answers. */
let signedIn: Me | null = null
let refusal: { status: number; body: object } | null = null
let unmount: () => void = () => undefined

const answer = (status: number, body: unknown) => new Response(JSON.stringify(body), { status })
const problem = (status: number, code: string, title: string, detail?: string) => ({
  status,
  body: { type: `/problems/${code}`, title, status, code, request_id: 'r-1', ...(detail ? { detail } : {}) },
})

beforeEach(() => {
  signedIn = null
  refusal = null
  vi.spyOn(globalThis, 'fetch').mockImplementation(async (address, init) => {
    const call = `${init?.method ?? 'GET'} ${String(address)}`
    const notSignedIn = problem(401, 'not-signed-in', 'Sign in to go on')
    if (call === 'GET /api/me') return signedIn ? answer(200, signedIn) : answer(401, notSignedIn.body)
    if (call === 'POST /api/sign-in') {
      if (refusal) return answer(refusal.status, refusal.body)
      signedIn = ilse
      return answer(200, ilse)
    }
    if (call === 'POST /api/sign-out') {
      signedIn = null
      return new Response(null, { status: 204 })
    }
    if (call.startsWith('PUT /api/me/preferences/')) return answer(401, notSignedIn.body)
    return answer(404, problem(404, 'unknown-route', 'There is nothing at this address').body)
  })
})
afterEach(() => {
  unmount()
  setMessageLocale('en')
})

async function open(address: string) {
  const client = createQueryClient()
  const router = createMemoryRouter(createRoutes(client), { initialEntries: [address] })
  const place = document.createElement('div')
  document.body.append(place)
  const root = createRoot(place)
  await act(async () =>
    root.render(
      <Providers client={client}>
        <RouterProvider router={router} />
      </Providers>,
    ),
  )
  unmount = () => {
    act(() => root.unmount())
    client.clear()
  }
  // screens come over the network; inside act, so that what they draw is waited for
  const settled = async (selector: string) => {
    for (let wait = 0; wait < 150 && place.querySelector(selector) === null; wait++) {
      await act(() => new Promise((resolve) => setTimeout(resolve, 20)))
    }
    expect(place.querySelector(selector), selector).not.toBeNull()
  }
  return { place, router, client, settled }
}

async function fillIn(place: HTMLElement, password: string) {
  await type(one<HTMLInputElement>(place, 'input[name="email"]'), 'vet@harrow-point.example')
  await type(one<HTMLInputElement>(place, 'input[name="password"]'), password)
  await click(named(place, 'Sign in'))
}

describe('signing in', () => {
  it('is where everybody is led who is not signed in, and leads back', async () => {
    const { place, router, settled } = await open('/settings/own?x=1')
    await settled('form')
    expect(router.state.location.pathname).toBe('/sign-in')
    expect(router.state.location.search).toBe('?then=%2Fsettings%2Fown%3Fx%3D1')
    await fillIn(place, 'chart-paper-7')
    await settled('.bridge .menu-anchor')
    expect(router.state.location).toMatchObject({ pathname: '/settings/own', search: '?x=1' })
    expect(place.textContent).toContain('Dr Ilse Marrow')
  })

  it('points at what is missing before it asks the server', async () => {
    const { place, settled } = await open('/sign-in')
    await settled('form')
    await click(named(place, 'Sign in'))
    expect(place.textContent).toContain('Type your e-mail address')
    expect(place.textContent).toContain('Type your password.')
    expect(document.activeElement).toBe(one(place, 'input[name="email"]'))
    expect(vi.mocked(fetch).mock.calls.filter(([address]) => address === '/api/sign-in')).toEqual([])
  })

  it('says a refusal in its own words, empties the password, and keeps the e-mail', async () => {
    refusal = problem(401, 'sign-in-failed', 'E-mail or password is not right', 'Check both.')
    const { place, settled } = await open('/sign-in')
    await settled('form')
    await fillIn(place, 'wrong')
    await settled('[role="alert"]')
    expect(one(place, '[role="alert"]').textContent).toBe('E-mail or password is not right. Check both.')
    expect(one<HTMLInputElement>(place, 'input[name="password"]').value).toBe('')
    expect(one<HTMLInputElement>(place, 'input[name="email"]').value).toBe('vet@harrow-point.example')
  })

  it('says how long the account is locked', async () => {
    refusal = problem(429, 'sign-in-locked', 'Too many wrong tries', 'Wait 15 min, then try again.')
    const { place, settled } = await open('/sign-in')
    await settled('form')
    await fillIn(place, 'right-or-wrong')
    await settled('[role="alert"]')
    expect(one(place, '[role="alert"]').textContent).toBe(
      'Too many wrong tries. Wait 15 min, then try again.',
    )
  })

  it('keeps what was typed when nobody answers', async () => {
    const { place, settled } = await open('/sign-in')
    await settled('form')
    vi.mocked(fetch).mockRejectedValue(new TypeError('failed to fetch'))
    await fillIn(place, 'chart-paper-7')
    await settled('[role="alert"]')
    expect(one(place, '[role="alert"]').textContent).toContain('did not answer')
    expect(one<HTMLInputElement>(place, 'input[name="password"]').value).toBe('chart-paper-7')
  })
})

describe('somebody who is signed in', () => {
  it('is led to a password of their own while they have a one-time password', async () => {
    signedIn = { ...ilse, mustChangePassword: true }
    const { router, settled } = await open('/settings/own')
    await settled('input[autocomplete="new-password"]')
    expect(router.state.location.pathname).toBe('/new-password')
  })

  /** Somebody on a sheet whose session ended elsewhere; the next call finds it out. */
  async function endedSession() {
    signedIn = ilse
    const opened = await open('/settings/own')
    await opened.settled('h1')
    signedIn = null
    await click(opened.place.querySelector('[role="radio"][aria-checked="false"]')!)
    await opened.settled('dialog[open] input[type="password"]')
    return opened
  }

  it('is asked for the password in place when any call finds the session ended, and goes on on the same sheet', async () => {
    const { place, router } = await endedSession()
    const sheet = one(place, 'h1')
    expect(router.state.location.pathname).toBe('/settings/own')
    expect(one(place, 'dialog').textContent).toContain('Dr Ilse Marrow, you are signed out')
    await click(named(place, 'Sign in and go on'))
    expect(place.textContent).toContain('Type your password.')
    refusal = problem(401, 'sign-in-failed', 'E-mail or password is not right', 'Check both.')
    await type(one<HTMLInputElement>(place, 'dialog input[type="password"]'), 'wrong')
    await click(named(place, 'Sign in and go on'))
    expect(one(place, 'dialog').textContent).toContain('E-mail or password is not right')
    refusal = null
    await type(one<HTMLInputElement>(place, 'dialog input[type="password"]'), 'chart-paper-7')
    await click(named(place, 'Sign in and go on'))
    expect(place.querySelector('dialog')).toBeNull()
    expect(one(place, 'h1')).toBe(sheet)
    const [, sent] = vi
      .mocked(fetch)
      .mock.calls.filter(([address]) => address === '/api/sign-in')
      .at(-1)!
    expect(sent?.body).toBe('{"email":"vet@harrow-point.example","password":"chart-paper-7"}')
  })

  it('may leave such a sheet and sign in anew, and comes back to where they were', async () => {
    const { place, router, settled } = await endedSession()
    await click(named(place, 'Leave this page and sign in anew'))
    await settled('form.sign-in')
    expect(router.state.location.search).toBe('?then=%2Fsettings%2Fown')
    await fillIn(place, 'chart-paper-7')
    await settled('.bridge .menu-anchor')
  })

  it('leaves nothing behind that was read under them', async () => {
    signedIn = ilse
    const { place, client, settled } = await open('/settings/own')
    await settled('.bridge .menu-anchor')
    client.setQueryData(['animals'], ['HP-0412'])
    await click(named(place, 'Dr Ilse Marrow, menu'))
    await click(named(place, 'Sign out'))
    await settled('form.sign-in')
    expect(client.getQueryData(['animals'])).toBeUndefined()
    expect(client.getQueryData(['me'])).toBeNull()
  })
})

it('says that the server can’t be reached, and does not stay blank', async () => {
  vi.mocked(fetch).mockRejectedValue(new TypeError('failed to fetch'))
  vi.useFakeTimers({ toFake: ['setTimeout'] })
  try {
    const { place } = await open('/settings/own')
    for (let wait = 0; wait < 8; wait++) await act(async () => vi.advanceTimersByTimeAsync(1000))
    expect(place.textContent).toContain('The server can’t be reached')
  } finally {
    vi.useRealTimers()
  }
})

it('draws every word of the frame from a catalogue', async () => {
  setMessageLocale('pseudo')
  signedIn = ilse
  const { place, settled } = await open('/not-in-this-version/bench')
  await settled('h1')
  const texts: string[] = []
  const walker = document.createTreeWalker(place, NodeFilter.SHOW_TEXT)
  while (walker.nextNode()) texts.push(walker.currentNode.textContent ?? '')
  const plain = texts.filter(
    (text) => /[A-Za-z]{2}/.test(text) && !text.includes('[') && !/^Dr Ilse Marrow$/.test(text),
  )
  expect(plain).toEqual([])
  expect(texts.some((text) => text.includes('['))).toBe(true)
})
