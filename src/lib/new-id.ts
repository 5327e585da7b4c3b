/**
 * A new record id, UUIDv7: made here, so that what is recorded without a signal has its id for ever. It is also the key
 * under which a command is repeated.
 */
export function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16))
  let at = Date.now()
  for (let i = 5; i >= 0; i--) {
    bytes[i] = at % 256
    at = Math.floor(at / 256)
  }
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x70
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80
  const hex = [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('')
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}`
}
