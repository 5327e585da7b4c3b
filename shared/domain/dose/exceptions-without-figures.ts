/** The exception whose sentence names amounts. */
export const amountDiffers = 'amount-differs'

/** What a record breaks, without the sentence that names its amounts: of a record that somebody changed none is shown. */
export function exceptionsWithoutFigures<T extends { code: string }>(exceptions: readonly T[]): T[] {
  return exceptions.filter(({ code }) => code !== amountDiffers)
}
