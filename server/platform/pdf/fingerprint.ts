import { createHash } from 'node:crypto'

/**
 * The fingerprint of a record: SHA-256 of its canonical text in UTF-8, 64 lower-case hexadecimal digits.
 * Shown with `formatFingerprint`. The text is hashed as stored, never normalised or parsed again.
 */
export function fingerprintOf(canonicalText: string): string {
  return createHash('sha256').update(canonicalText, 'utf8').digest('hex')
}
