/** What may be kept, by its content type. */
export const keptTypes = [
  'application/pdf',
  'image/png',
  'image/jpeg',
  'image/webp',
  'text/csv',
  'text/plain',
] as const
export type KeptType = (typeof keptTypes)[number]

/**
 * The type of a file by what is in it; its name decides only whether a text is a table. Undefined for everything else:
 * programs, archives, office files, and texts that a browser would run (HTML, SVG, XML).
 *
 * @source magic numbers: ISO 32000-1 §7.5.2 (%PDF-), PNG 3rd ed. §5.2, JPEG ITU-T T.81 B.1.1 (FFD8 FF), WebP container
 *         specification (RIFF, size, WEBP)
 */
export function sniffType(bytes: Uint8Array, name: string): KeptType | undefined {
  const data = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  const begins = (hex: string, at = 0) => data.subarray(at, at + hex.length / 2).toString('hex') === hex
  if (begins('255044462d')) return 'application/pdf'
  if (begins('89504e470d0a1a0a') && data.subarray(12, 16).toString('latin1') === 'IHDR') return 'image/png'
  if (begins('ffd8ff')) return 'image/jpeg'
  if (begins('52494646') && begins('57454250', 8)) return 'image/webp'
  if (!isPlainText(data)) return undefined
  return /\.csv$/i.test(name) ? 'text/csv' : 'text/plain'
}

/** UTF-8 without control characters other than tab, line feed and carriage return, and nothing that begins as markup. */
function isPlainText(data: Buffer): boolean {
  if (data.length === 0) return false
  let text: string
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(data)
  } catch {
    return false
  }
  if ([...text].some((character) => isControl(character.codePointAt(0) ?? 0))) return false
  return !/^\s*<(?:[a-z!?/])/i.test(text)
}

function isControl(code: number): boolean {
  return (code < 0x20 && code !== 0x09 && code !== 0x0a && code !== 0x0d) || (code >= 0x7f && code < 0xa0)
}
