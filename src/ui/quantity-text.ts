/** What a person typed into a number field, judged before anything is made of it. */
export type QuantityText =
  | { kind: 'empty' }
  /** A plain number: `value` has a point, no thousands mark, and the digits as typed. */
  | { kind: 'number'; value: string }
  /** Something to be worked out, such as `2.4 * 1.2` or `38 gal + 12 L`. */
  | { kind: 'arithmetic' }
  | { kind: 'refused'; why: 'two-separators' | 'comma-unclear' | 'not-a-number' }

const signs = /[\u2212\u2013]/g
const spaces = /[\s\u00a0\u202f]/g

/**
 * Reads typed text as a number, as arithmetic, or refuses it.
 *
 * A comma is refused because it can mean thousands or a decimal sign, and the two differ by a thousand;
 * so are two separators. A number keeps its digits (`0.10` stays `0.10`).
 */
export function readQuantityText(typed: string): QuantityText {
  const text = typed.replace(signs, '-').trim()
  if (text === '') return { kind: 'empty' }
  const bare = text.replace(spaces, '')
  if (/^[-+]?[\d.,']+$/.test(bare)) {
    const separators = bare.match(/[.,']/g) ?? []
    if (separators.length > 1) return { kind: 'refused', why: 'two-separators' }
    if (bare.includes(',') || bare.includes("'")) return { kind: 'refused', why: 'comma-unclear' }
    // a gap between digits is not a thousands mark that everybody reads alike
    if (/\d[\s\u00a0\u202f]+\d/.test(text)) return { kind: 'refused', why: 'not-a-number' }
    if (!/\d/.test(bare)) return { kind: 'refused', why: 'not-a-number' }
    return { kind: 'number', value: completed(bare.replace(/^\+/, '')) }
  }
  if (text.includes(',')) return { kind: 'refused', why: 'comma-unclear' }
  if (/\d/.test(text) && /[-+*/×÷()a-zµμ]/i.test(text)) return { kind: 'arithmetic' }
  return { kind: 'refused', why: 'not-a-number' }
}

/** `.5` becomes `0.5` and `5.` becomes `5`: a bare point is misread. */
function completed(number: string): string {
  return number.replace(/^(-?)\./, '$10.').replace(/\.$/, '')
}
