import { spellUndrawable } from './typeface.ts'

/**
 * A record for paper: what people wrote in a script that the typeface lacks is spelled out ("[U+1F41F]"), so that it
 * always comes out and nothing vanishes from the page.
 */
export function drawable<T>(value: T): T {
  if (typeof value === 'string') return spellUndrawable(value) as T
  if (Array.isArray(value)) return value.map(drawable) as T
  if (value === null || typeof value !== 'object') return value
  return Object.fromEntries(Object.entries(value).map(([key, each]) => [key, drawable(each)])) as T
}
