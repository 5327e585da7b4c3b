/** A typed whole number, with either minus sign; null for anything else. */
export function wholeNumber(typed: string): number | null {
  const text = typed.trim().replace('\u2212', '-').replace(/^\+/, '')
  return /^-?\d{1,8}$/.test(text) ? Number(text) : null
}
