import { askInWords } from './ask-in-words.ts'
import { benchRoutes } from './bench.routes.ts'
import { createSheetPrinter } from './print-sheet.ts'
import type { SheetParts } from './print-sheet.ts'

/** The free-standing calculators. */
export const createBench = (parts: SheetParts) => ({
  routes: benchRoutes(createSheetPrinter(parts)),
  /** For a record that keeps what was asked: the answer is worked out anew. */
  ask: askInWords,
})
