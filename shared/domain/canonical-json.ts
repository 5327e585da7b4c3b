/** What canonical JSON can hold. */
export type Json = string | number | boolean | null | Json[] | { [key: string]: Json | undefined }

/**
 * One text for one content: keys sorted by code unit, no white space, absent values left out.
 * Signatures and the audit chain hash this text, and it is stored as text, since a database may reorder JSON.
 *
 * @refuses by throwing: a number that is not finite is a bug in the caller, and has no JSON form
 */
export function canonicalJson(value: Json): string {
  if (typeof value === 'number' && !Number.isFinite(value))
    throw new Error('A number that is not finite has no JSON form')
  if (value === null || typeof value !== 'object') return JSON.stringify(value)
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`
  const keys = Object.keys(value)
    .filter((key) => value[key] !== undefined)
    .sort()
  return `{${keys.map((key) => `${JSON.stringify(key)}:${canonicalJson(value[key] as Json)}`).join(',')}}`
}
