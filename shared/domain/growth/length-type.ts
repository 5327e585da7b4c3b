import { refuse, type Result } from '../result.ts'

/** What a length was measured to: the tail's end, its fork, the end of the spine; of a ray, across its disc. */
export const lengthTypes = ['total', 'fork', 'standard', 'disc-width'] as const

export type LengthType = (typeof lengthTypes)[number]

const isLengthType = (value: LengthType): boolean => lengthTypes.includes(value)

/**
 * Coefficients belong to the length they were fitted on.
 *
 * @returns nothing where the two are the same
 * @refuses length-type-not-stated (lengthType, coefficientsLengthType) · length-type-differs (lengthType)
 */
export function checkLengthType(
  lengthType: LengthType,
  coefficientsLengthType: LengthType,
): Extract<Result<never, 'length-type-not-stated' | 'length-type-differs'>, { ok: false }> | undefined {
  if (!isLengthType(lengthType)) return refuse('length-type-not-stated', 'lengthType')
  if (!isLengthType(coefficientsLengthType)) return refuse('length-type-not-stated', 'coefficientsLengthType')
  return lengthType === coefficientsLengthType ? undefined : refuse('length-type-differs', 'lengthType')
}
