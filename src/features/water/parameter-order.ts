import { readingParameters } from '../../../shared/domain/readings/parameters.ts'
import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import type { Range, ReadingRow } from '../../../shared/contracts/water-facts.ts'

/** The parameters that matter in a water: those with a range and those ever measured, in the order of the table. */
export function parametersOf(
  ranges: readonly Pick<Range, 'parameter'>[],
  rows: readonly Pick<ReadingRow, 'parameter'>[],
): ReadingParameter[] {
  const here = new Set([...ranges, ...rows].map((one) => one.parameter))
  return readingParameters.filter((parameter) => here.has(parameter))
}
