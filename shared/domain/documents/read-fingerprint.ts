import { ok, refuse, type Result } from '../result.ts'

/**
 * A fingerprint as somebody typed it from paper, as the beginning of a SHA-256 to look up: spaces, dashes and case
 * do not matter.
 *
 * @param typed at least the 16 digits printed on the page, at most all 64
 * @returns 16…64 lower-case hexadecimal digits
 * @refuses not-a-fingerprint (other characters than 0–9 and A–F) | fingerprint-too-short (fewer than 16 digits, which
 *          could name several records), both on field typed
 */
export function readFingerprint(
  typed: string,
): Result<string, 'not-a-fingerprint' | 'fingerprint-too-short'> {
  const digits = typed.replace(/[\s\u00a0\-–.:]/g, '').toLowerCase()
  if (digits.length === 0 || digits.length > 64 || !/^[0-9a-f]+$/.test(digits))
    return refuse('not-a-fingerprint', 'typed')
  return digits.length < 16 ? refuse('fingerprint-too-short', 'typed', { digits: digits.length }) : ok(digits)
}
