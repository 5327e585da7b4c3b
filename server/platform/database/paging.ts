import { Problem } from '../http/problem.ts'

/** Where a page of a list begins and how long it is. Cursors are opaque to callers. */
export function pageOf(query: { cursor?: string; limit?: number }): { offset: number; limit: number } {
  const limit = query.limit ?? 50
  if (query.cursor === undefined) return { offset: 0, limit }
  const text = Buffer.from(query.cursor, 'base64url').toString('utf8')
  const offset = Number(text)
  if (!/^\d{1,9}$/.test(text))
    throw new Problem('bad-input', {
      errors: [{ pointer: '/query/cursor', detail: 'Begin again at the first page.' }],
    })
  return { offset, limit }
}

/** The cursor of the page after this one; null when there is none. */
export function nextCursorOf(page: { offset: number; limit: number }, total: number): string | null {
  const next = page.offset + page.limit
  return next < total ? Buffer.from(String(next)).toString('base64url') : null
}
