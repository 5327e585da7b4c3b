/** Made in `vite.config.ts` from the calculators of `shared/bench`. */
declare module 'virtual:bench' {
  import type { AnyCalculator } from '../shared/bench/definition.ts'
  import type { BenchGroup } from '../shared/bench/groups.ts'

  /** What a list of calculators says of each, in the order of the bench. */
  export const benchIndex: readonly {
    id: string
    group: BenchGroup
    weekly: boolean
    /** Which piece it is loaded with. */
    piece: string
    words: { readonly name: string; readonly purpose: string; readonly search: string }
  }[]

  /** Loads the calculators of a piece. */
  export const benchPieces: Readonly<
    Record<string, (() => Promise<{ calculators: readonly AnyCalculator[] }>) | undefined>
  >
}
