import fontkit from '@pdf-lib/fontkit'
import type { PDFDocument, PDFFont } from 'pdf-lib'
import type { Typeface } from './typeface.ts'

/** The font as it stands in one file: glyph codes are handed out as characters are first drawn. */
export interface EmbeddedFont {
  font: PDFFont
  /** Hexadecimal glyph codes for a line's text; no-break spaces become plain ones, so that search and copy find them. */
  encode(text: string): string
}

/**
 * Embeds the subset. Features are off and every character is encoded by itself, so that advances are exactly the
 * measured ones and no ligature stands between a reader and the extracted text.
 */
export async function embedFont(document: PDFDocument, face: Typeface): Promise<EmbeddedFont> {
  document.registerFontkit(fontkit)
  const font = await document.embedFont(face.bytes, { subset: true, features: { liga: false, kern: false } })
  const codes = new Map<string, string>()
  const codeOf = (character: string): string => {
    const known = codes.get(character)
    if (known !== undefined) return known
    const code = font.encodeText(character).asString()
    codes.set(character, code)
    return code
  }
  return { font, encode: (text) => [...text.replaceAll('\u00a0', ' ')].map(codeOf).join('') }
}
