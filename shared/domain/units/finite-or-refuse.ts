import { ok, refuse, type Result } from '../result.ts'

/**
 * What an engine worked out, refused where it is beyond any number: a divisor so near to nothing that the quotient overflows.
 *
 * @param field the input that made it so, most often the divisor
 * @refuses not-finite
 */
export function finiteOrRefuse(value: number, field: string): Result<number, 'not-finite'> {
  return Number.isFinite(value) ? ok(value) : refuse('not-finite', field)
}
