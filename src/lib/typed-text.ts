/** Text as typed, without the space around it; undefined when it says nothing. */
export function typedText(text: string): string | undefined {
  const tidy = text.trim()
  return tidy === '' ? undefined : tidy
}

/** A number as typed; undefined when nothing was, NaN for what is none, so that a schema asks for a number. */
export function typedNumber(text: string): number | undefined {
  const tidy = text.trim().replace(/^−/, '-')
  if (tidy === '') return undefined
  return /^-?\d+(\.\d+)?$/.test(tidy) ? Number(tidy) : Number.NaN
}
