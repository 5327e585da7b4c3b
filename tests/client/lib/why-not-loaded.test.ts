import { afterEach, describe, expect, it, vi } from 'vitest'
import { isNotLoaded, whyNotLoaded } from '../../../src/lib/why-not-loaded.ts'

const page = (script: string) =>
  `<!doctype html><html><head><script type="module" crossorigin src="${script}"></script></head><body></body></html>`

afterEach(() => vi.restoreAllMocks())

describe('a script that did not come', () => {
  it.each([
    'Failed to fetch dynamically imported module: https://pratique.example/assets/x.js',
    'error loading dynamically imported module: https://pratique.example/assets/x.js',
    'Importing a module script failed.',
    'Unable to preload CSS for /assets/x.css',
  ])('is known by what browsers say: %s', (message) => {
    expect(isNotLoaded(new TypeError(message))).toBe(true)
  })

  it('is not taken for a fault of the sheet', () => {
    expect(isNotLoaded(new TypeError('x is not a function'))).toBe(false)
    expect(isNotLoaded('Importing a module script failed.')).toBe(false)
  })

  const because = (answer: () => Promise<Response>) => {
    vi.spyOn(globalThis, 'fetch').mockImplementation(answer)
    return whyNotLoaded(new DOMParser().parseFromString(page('/assets/index-A.js'), 'text/html'))
  }

  it('says that there is no signal when nobody answers', async () => {
    expect(await because(() => Promise.reject(new TypeError('Failed to fetch')))).toBe('no-signal')
    expect(await because(async () => new Response('bad gateway', { status: 502 }))).toBe('no-signal')
  })

  it('says that there is a new version only when the server has another one', async () => {
    expect(await because(async () => new Response(page('/assets/index-B.js')))).toBe('new-version')
    expect(await because(async () => new Response(page('/assets/index-A.js')))).toBe('unknown')
  })
})
