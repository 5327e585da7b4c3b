export type PdfRenderErrorCode = 'missing-glyph' | 'does-not-fit' | 'bad-model'

/**
 * A document that must not be printed as it stands: a character the font cannot draw (it would vanish from the page)
 * or a number that cannot be kept on one line with its unit. It names the block, so that the text can be found.
 */
export class PdfRenderError extends Error {
  readonly code: PdfRenderErrorCode
  readonly params: Readonly<Record<string, string>>

  constructor(code: PdfRenderErrorCode, params: Record<string, string>) {
    super(
      `PDF refused, ${code}: ${Object.entries(params)
        .map(([name, value]) => `${name} ${value}`)
        .join(', ')}`,
    )
    this.name = 'PdfRenderError'
    this.code = code
    this.params = params
  }
}
