import type { UnitCode } from '../domain/units/unit-table.ts'
import type { BenchLine } from './definition.ts'

/**
 * A line of working of a calculator of the bench.
 *
 * @param key        names the line within its working, and its words `line.<key>` unless `more.code` says another
 * @param expression as WorkingLine.expression
 * @param value      unrounded, in `unit`
 * @param rests      keys of the earlier lines whose values stand in the expression as valueTerm writes them
 */
export function line(
  key: string,
  expression: string,
  value: number,
  unit: UnitCode,
  rests: readonly string[] = [],
  more: { code?: string; params?: BenchLine['params'] } = {},
): BenchLine {
  return { key, code: more.code ?? key, params: more.params ?? {}, expression, value, unit, rests }
}
