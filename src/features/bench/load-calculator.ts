import { benchIndex, benchPieces } from 'virtual:bench'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'

/** What the list says of a calculator. */
export type ListedCalculator = (typeof benchIndex)[number]

/** Every calculator, as the list shows it. */
export const listedCalculators: readonly ListedCalculator[] = benchIndex

/** Loads the calculator at an address, with the others of its piece; undefined for an address that has none. */
export async function loadCalculator(id: string): Promise<AnyCalculator | undefined> {
  const listed = benchIndex.find((each) => each.id === id)
  const piece = await (listed && benchPieces[listed.piece]?.())
  return piece?.calculators.find((each) => each.id === id)
}
