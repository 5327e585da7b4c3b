import { createContext } from 'react'

/** The answer of the evaluator or the converter: a number in digits, or that there is none. */
export type WorkedOut = { ok: true; value: string } | { ok: false; says?: string }

/** Works out typed arithmetic in the field's unit. Given by the application; the heavy part loads on first use. */
export type Evaluate = (typed: string, unit: string) => Promise<WorkedOut>

/** Converts digits from one unit to another, by the one table of units. */
export type Convert = (value: string, from: string, to: string) => WorkedOut

/** What number fields need from outside: they know neither mathjs nor the table of units. */
export interface QuantityTools {
  evaluate?: Evaluate
  convert?: Convert
}

export const QuantityToolsContext = createContext<QuantityTools>({})
