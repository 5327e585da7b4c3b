/** A size of a file as people read it: `820 bytes`, `3.1 kB`, `12 MB`, by powers of 1000. */
export function sayBytes(bytes: number): string {
  if (bytes < 1000) return `${String(bytes)}\u00a0bytes`
  const [value, unit] = bytes < 1_000_000 ? [bytes / 1000, 'kB'] : [bytes / 1_000_000, 'MB']
  return `${value < 10 ? value.toFixed(1) : String(Math.round(value))}\u00a0${unit}`
}
