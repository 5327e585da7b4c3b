import type { CheckedFingerprint } from '../../../shared/contracts/documents.contract.ts'
import type { PrintReadRow } from './documents.reads.ts'

/** Whether the record behind a print still stands as printed, and which version it has now. */
export type PrintState = Pick<CheckedFingerprint, 'state' | 'now'>

/** Answers for one kind of document. */
export type AnswerForPrint = (print: PrintReadRow) => Promise<PrintState>

/**
 * Who knows whether a print is still good: each kind of document is answered for by the feature that makes it, which
 * is built later than this one and registers itself.
 */
export function createPrintStates() {
  const answers = new Map<string, AnswerForPrint>()
  return {
    answerFor(kind: string, answer: AnswerForPrint): void {
      if (answers.has(kind)) throw new Error(`two features answer for prints of kind ${kind}`)
      answers.set(kind, answer)
    },
    async stateOf(print: PrintReadRow): Promise<PrintState> {
      return (await answers.get(print.kind)?.(print)) ?? { state: 'unknown', now: null }
    },
  }
}

export type PrintStates = ReturnType<typeof createPrintStates>
