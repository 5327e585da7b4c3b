import { ok, refuse, type Result } from '../result.ts'

/** Digits of a SHA-256 in hexadecimal. */
const fullLength = 64

/**
 * The fingerprint of a record as people read it aloud: capitals in groups of four, with no-break spaces.
 *
 * @param sha256Hex 64 hexadecimal digits, either case
 * @param groups    how many groups of four to show, 1…16; the short form on prints has 4 (16 digits), the full form 16
 * @returns "7C1E 40AF 92D3 0B15"
 * @refuses not-a-fingerprint (field sha256Hex) | groups-outside-range (field groups)
 * @source  project-default: 16 digits tell 2^64 records apart, and are still read out in one breath
 */
export function formatFingerprint(
  sha256Hex: string,
  groups = 4,
): Result<string, 'not-a-fingerprint' | 'groups-outside-range'> {
  if (sha256Hex.length !== fullLength || !/^[0-9a-f]+$/i.test(sha256Hex))
    return refuse('not-a-fingerprint', 'sha256Hex')
  if (!Number.isInteger(groups) || groups < 1 || groups > 16) return refuse('groups-outside-range', 'groups')
  const shown = sha256Hex.slice(0, groups * 4).toUpperCase()
  return ok((shown.match(/.{4}/g) ?? []).join('\u00a0'))
}
