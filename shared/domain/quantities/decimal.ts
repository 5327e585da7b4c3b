/**
 * Exact decimals, for the places where a person counts in decimals and binary numbers would answer otherwise:
 * rounding halves, comparing two weighed amounts, digits of a balance. `digits × 10^-scale`.
 */
export interface Decimal {
  digits: bigint
  scale: number
}

const noiseFreeDigits = 12

/**
 * A number or its text as an exact decimal.
 *
 * A number is first brought to 12 significant digits, so that 1.15 × 100 = 114.99999999999999 counts as 115: noise of
 * binary arithmetic lies beyond the 15th digit, and no balance shows twelve.
 *
 * @param value a finite number, or text of the form -12.340; undefined for anything else
 */
export function decimalOf(value: number | string): Decimal | undefined {
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) return undefined
    return fromExponent(value.toPrecision(noiseFreeDigits))
  }
  return typeof value === 'string' ? fromExponent(value) : undefined
}

function fromExponent(text: string): Decimal | undefined {
  const match = /^(-?)(\d+)(?:\.(\d+))?(?:e([+-]?\d{1,3}))?$/.exec(text)
  if (!match) return undefined
  const fraction = match[3] ?? ''
  const scale = fraction.length - Number(match[4] ?? 0)
  const digits = BigInt(`${match[1]}${match[2]}${fraction}`)
  return scale >= 0 ? { digits, scale } : { digits: digits * 10n ** BigInt(-scale), scale: 0 }
}

/** Two decimals over one scale, for adding and comparing. */
export function aligned(a: Decimal, b: Decimal): { a: bigint; b: bigint; scale: number } {
  const scale = Math.max(a.scale, b.scale)
  return {
    a: a.digits * 10n ** BigInt(scale - a.scale),
    b: b.digits * 10n ** BigInt(scale - b.scale),
    scale,
  }
}

/** Plain digits, all decimal places kept: { digits: 440n, scale: 3 } is "0.440". */
export function decimalText({ digits, scale }: Decimal): string {
  const negative = digits < 0n
  const text = (negative ? -digits : digits).toString().padStart(scale + 1, '0')
  const whole = text.slice(0, text.length - scale)
  return `${negative ? '-' : ''}${whole}${scale > 0 ? `.${text.slice(-scale)}` : ''}`
}
