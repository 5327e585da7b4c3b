import { afterEach, describe, expect, it, vi } from 'vitest'
import { z } from 'zod'
import { contract } from '../../../shared/contracts/contract.ts'
import { personHeader } from '../../../shared/contracts/person-header.ts'
import { getMe, signIn, signOut } from '../../../shared/contracts/sign-in.contract.ts'
import { issueOneTimePassword, listPeople } from '../../../shared/contracts/people.contract.ts'
import { addressOf, api, apiFile } from '../../../src/lib/api-client.ts'
import { pagePerson } from '../../../src/lib/page-person.ts'
import { isProblem } from '../../../src/lib/problem-error.ts'
import type { ProblemError } from '../../../src/lib/problem-error.ts'

const answers = (status: number, body: unknown, headers: Record<string, string> = {}) => {
  const text = typeof body === 'string' ? body : JSON.stringify(body)
  const spy = vi.spyOn(globalThis, 'fetch')
  spy.mockImplementation(async () => new Response(status === 204 ? null : text, { status, headers }))
  return spy
}
const problem = async (call: Promise<unknown>): Promise<ProblemError> => {
  const error: unknown = await call.then(
    () => new Error('was not refused'),
    (reason: unknown) => reason,
  )
  if (!isProblem(error)) throw error
  return error
}

afterEach(() => vi.restoreAllMocks())

describe('a call', () => {
  it('goes to the address of its contract, with its method and JSON', async () => {
    const fetching = answers(200, { id: '1' })
    await api(signIn, { body: { email: 'vet@harrow-point.example', password: 'x' } })
    const [address, init] = fetching.mock.calls[0] ?? []
    expect(address).toBe('/api/sign-in')
    expect(init).toMatchObject({
      method: 'POST',
      credentials: 'same-origin',
      body: '{"email":"vet@harrow-point.example","password":"x"}',
    })
    expect(init?.headers).toMatchObject({ 'content-type': 'application/json' })
  })

  it('puts parameters and query in, encoded, and leaves empty parts out', () => {
    expect(addressOf({ path: '/people/:id/licences/:licenceId' }, { id: 'a/b', licenceId: 'c d' })).toBe(
      '/api/people/a%2Fb/licences/c%20d',
    )
    expect(addressOf({ path: '/people' }, {}, { q: 'Ås', sort: undefined, cursor: '', limit: 50 })).toBe(
      '/api/people?q=%C3%85s&limit=50',
    )
    expect(() => addressOf({ path: '/people/:id' }, {})).toThrow('needs id')
  })

  it('sends the key of a command, and refuses to send a command without one', async () => {
    const fetching = answers(200, { oneTimePassword: null })
    const params = { id: '0197f000-0000-7000-8000-000000000000' }
    await api(issueOneTimePassword, { params, key: 'k-1' })
    expect(fetching.mock.calls[0]?.[1]?.headers).toMatchObject({ 'idempotency-key': 'k-1' })
    await expect(api(issueOneTimePassword, { params })).rejects.toThrow('needs a key')
  })

  it('says for whom it writes, and notices when somebody else, or nobody, is signed in by then', async () => {
    const fetching = answers(200, {})
    pagePerson.drawnFor('p-1')
    await api(signOut, {})
    await api(signOut, { writtenBy: 'p-0' })
    await api(getMe, {})
    const said = fetching.mock.calls.map(([, init]) => new Headers(init?.headers).get(personHeader))
    expect(said).toEqual(['p-1', 'p-0', null])
    expect(pagePerson.now().other).toBeNull()
    vi.restoreAllMocks()
    answers(409, { code: 'different-person', title: 'Somebody else', signed_in: 'Ilse Test' })
    expect(await problem(api(signOut, {}))).toMatchObject({ code: 'different-person' })
    expect(pagePerson.now()).toEqual({ id: 'p-1', other: 'Ilse Test', ended: false })
    answers(401, { code: 'not-signed-in', title: 'Sign in to go on', status: 401 })
    expect(await problem(api(signOut, {}))).toMatchObject({ code: 'not-signed-in' })
    expect(pagePerson.now()).toEqual({ id: 'p-1', other: null, ended: true })
    pagePerson.drawnFor(null)
    await problem(api(signOut, {}))
    expect(pagePerson.now()).toEqual({ id: null, other: null, ended: false })
  })

  it('answers nothing for 204', async () => {
    answers(204, null)
    const gone = contract({
      id: 'gone',
      method: 'delete',
      path: '/gone',
      action: 'signed-in',
      summary: '',
      reply: { 204: z.null() },
      problems: [],
    })
    expect(await api(gone, {})).toBeNull()
  })

  it('sends a form with files as it is', async () => {
    const fetching = answers(200, {})
    const form = new FormData()
    form.set('a', 'b')
    await api(signIn, { body: form })
    const init = fetching.mock.calls[0]?.[1]
    expect(init?.body).toBe(form)
    expect(init?.headers).not.toHaveProperty('content-type')
  })

  it('gives a file with the name that the server chose', async () => {
    answers(200, 'a,b', {
      'content-disposition': 'attachment; filename="people.csv"',
      'content-type': 'text/csv',
    })
    const file = await apiFile(listPeople, {})
    expect(file.name).toBe('people.csv')
    expect(await file.blob.text()).toBe('a,b')
  })
})

describe('a refusal', () => {
  it('is the problem as it came: code, words, fields, request number', async () => {
    answers(422, {
      type: '/problems/bad-input',
      title: 'Some of what was entered cannot be used',
      status: 422,
      code: 'bad-input',
      detail: 'Use at least 10 characters',
      request_id: 'r-1',
      errors: [{ pointer: '/newPassword', detail: 'Use at least 10 characters' }],
    })
    const error = await problem(api(getMe, {}))
    expect(error).toMatchObject({ status: 422, code: 'bad-input', requestId: 'r-1' })
    expect(error.errors).toEqual([{ pointer: '/newPassword', detail: 'Use at least 10 characters' }])
    expect(error.says).toBe('Some of what was entered cannot be used. Use at least 10 characters')
    expect(isProblem(error, 'bad-input')).toBe(true)
    expect(isProblem(error, 'may-not')).toBe(false)
  })

  it('is said when nobody answers, and can be tried again', async () => {
    vi.spyOn(globalThis, 'fetch').mockRejectedValue(new TypeError('failed to fetch'))
    const error = await problem(api(getMe, {}))
    expect(error.noAnswer).toBe(true)
    expect(error.says).toContain('did not answer')
  })

  it('is said when the answer takes too long', async () => {
    vi.spyOn(globalThis, 'fetch').mockImplementation(
      (_address, init) =>
        new Promise((_resolve, reject) =>
          init?.signal?.addEventListener('abort', () => reject(init.signal?.reason)),
        ),
    )
    const error = await problem(api(getMe, { patienceMs: 5 }))
    expect(error.title).toBe('The server did not answer in time')
  })

  it('is no failure when the caller has gone away', async () => {
    const going = new AbortController()
    vi.spyOn(globalThis, 'fetch').mockImplementation(async () => {
      going.abort()
      throw going.signal.reason
    })
    const error: unknown = await api(getMe, { signal: going.signal }).catch((reason: unknown) => reason)
    expect(isProblem(error)).toBe(false)
  })

  it('is said when the answer is in no form we know', async () => {
    answers(502, '<html>bad gateway</html>')
    expect(await problem(api(getMe, {}))).toMatchObject({ status: 502, code: 'not-understood' })
    answers(200, '<html>a page</html>')
    expect(await problem(api(getMe, {}))).toMatchObject({ status: 200, code: 'not-understood' })
  })
})
