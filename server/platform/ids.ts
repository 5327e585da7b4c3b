import { randomBytes } from 'node:crypto'
import type { Clock } from './clock.ts'

/** Makes record ids. */
export interface Ids {
  next(): string
}

/** UUIDv7 (RFC 9562): milliseconds since 1970 in the first 48 bits, so that ids sort by the time they were made. */
export function uuidV7(atMs: number, random: Uint8Array): string {
  const bytes = new Uint8Array(16)
  bytes.set(random.subarray(0, 16))
  for (let i = 0; i < 6; i++) bytes[i] = Math.floor(atMs / 2 ** (8 * (5 - i))) % 256
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x70
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80
  const hex = Buffer.from(bytes).toString('hex')
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}`
}

export function createIds(clock: Clock): Ids {
  return { next: () => uuidV7(clock.now().getTime(), randomBytes(16)) }
}
