import type { UnitCode } from '../units/unit-table.ts'
import type { WorkingCode } from './working-code.ts'

/**
 * One line of shown arithmetic, which a person can redo by hand and the server evaluates a second, independent way.
 */
export interface WorkingLine {
  /** Names the line within its working: "tank", "sump-2", "net-volume". */
  key: string
  /** What the line works out; the words are in shared/messages/working.ts. */
  code: WorkingCode
  params: Record<string, string | number>
  /**
   * The arithmetic with its numbers and units put in, readable by mathjs: `2 mg/L * 11400 L to g`. Numbers are as
   * entered where a person entered them, and unrounded where an earlier line worked them out. Operators have spaces
   * around them and the "/" of a unit has none. Units are named as in expressionUnit().
   */
  expression: string
  /** The answer in `unit`, unrounded. */
  value: number
  unit: UnitCode
  /** Keys of earlier lines whose value this expression takes. */
  rests: readonly string[]
}
