import type { QuantityKind } from './formatted-quantity.ts'

/** A form that must not stand on a screen, a label or a print, with the place where it was found. */
export interface UnsafeWriting {
  code: UnsafeCode
  found: string
  at: number
}

export type UnsafeCode =
  | 'trailing-zero'
  | 'naked-point'
  | 'ungrouped-thousands'
  | 'no-space-before-unit'
  | 'breaking-space-before-unit'
  | 'hyphen-for-minus'
  | 'bare-ppm'
  | 'microgram-sign'
  | 'unit-letter'
  | 'cubic-centimetre'
  | 'latin-frequency'
  | 'route-letters'
  | 'comparison-sign'
  | 'joining-sign'
  | 'slashed-date'
  | 'drug-abbreviation'
  | 'not-a-number'

/** A marked quantity, or running text in which quantities of every kind stand. */
export type Writing = QuantityKind | 'prose'

const unit = String.raw`(?:mg|g|kg|mL|L|m³|micrograms?|microlitres?|units?|µL|μL|mm|cm|m|°C|°F|min|h|days?|US gal)(?![\w-])`
const quantities: readonly Writing[] = ['dose', 'reading', 'volume']
const everywhere: readonly Writing[] = [...quantities, 'prose']

interface Rule {
  code: UnsafeCode
  in: readonly Writing[]
  pattern: RegExp
}

const rule = (code: UnsafeCode, where: readonly Writing[], pattern: string, flags = 'g'): Rule => ({
  code,
  in: where,
  pattern: new RegExp(pattern, flags),
})

const rules: readonly Rule[] = [
  rule('trailing-zero', ['dose'], String.raw`\d\.\d*0(?!\d)`),
  rule('naked-point', everywhere, String.raw`(?<![\d.])\.\d+`),
  rule('ungrouped-thousands', quantities, String.raw`(?<![\d.,])\d{4,}`),
  rule('ungrouped-thousands', ['prose'], String.raw`(?<![\d.,\w-])\d{4,}(?:\.\d+)?\s${unit}`),
  rule('no-space-before-unit', everywhere, String.raw`(?<![\w-])[\d.,]*\d${unit}`),
  rule('breaking-space-before-unit', quantities, String.raw`\d (?=\S)`),
  rule('hyphen-for-minus', quantities, String.raw`(?<!\w)-\s?\.?\d`),
  rule('bare-ppm', everywhere, String.raw`\d\s*pp[mbt]\b`, 'gi'),
  rule('microgram-sign', everywhere, String.raw`(?<![A-Za-z])[µμ]g(?![A-Za-z])|\d\s*ug\b`),
  rule('unit-letter', everywhere, String.raw`\d\s*(?:IU|iu|U|u)(?![\w/-])`),
  rule('cubic-centimetre', everywhere, String.raw`\d\s*cc\b`, 'gi'),
  rule(
    'latin-frequency',
    everywhere,
    String.raw`(?<![\w-])(?:QD|QOD|HS|q\.?d\.?|q\.?o\.?d\.?|h\.s\.)(?![\w-])`,
  ),
  rule('route-letters', everywhere, String.raw`(?<![\w-])(?:SQ|SubQ|sub q)(?![\w-])`),
  rule('comparison-sign', ['dose'], String.raw`[<>≤≥]`),
  rule('comparison-sign', ['prose'], String.raw`[<>≥]\s*[\d.,]*\d\s?${unit}`),
  rule('joining-sign', ['dose'], String.raw`[@&+]`),
  rule('joining-sign', ['prose'], String.raw`@\s?\d`),
  rule('slashed-date', everywhere, String.raw`(?<!\d)\d{1,2}/\d{1,2}/\d{2,4}(?!\d)`),
  rule('drug-abbreviation', everywhere, String.raw`\b(?:CuSO[4₄]|KMnO[4₄]|MS-?222|PZQ|H2O2)\b`),
  rule('not-a-number', everywhere, String.raw`\b(?:NaN|Infinity|undefined|null)\b`),
]

/**
 * The forms in a text that people misread, for tests over screens, documents and labels.
 *
 * A trailing zero is a fault in a dose and not in a reading, so marked quantities are scanned by their own kind;
 * `prose` is for the text of a whole page, where nothing tells the two apart.
 *
 * @returns every finding with its place; empty when the writing is safe
 * @source ismp-dose-designations · joint-commission-do-not-use · the thousands, space and symbol rules of the same lists
 */
export function findUnsafeWriting(text: string, writing: Writing): UnsafeWriting[] {
  return rules
    .filter((each) => each.in.includes(writing))
    .flatMap(({ code, pattern }) =>
      [...text.matchAll(pattern)].map((match) => ({ code, found: match[0], at: match.index })),
    )
    .sort((a, b) => a.at - b.at)
}
