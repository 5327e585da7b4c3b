/** A whole number as people read it: thousands by a comma, a true minus sign. */
export function sayNumber(value: number): string {
  return value.toLocaleString('en-GB').replace('-', '\u2212')
}
