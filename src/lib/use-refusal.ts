import { useState } from 'react'
import { isProblem } from './problem-error.ts'
import type { ProblemError } from './problem-error.ts'

/** What the server refused of a form that is not held by react-hook-form. */
export interface Refusal {
  /** Sends, and keeps what was refused; true when it went through. */
  attempt: (send: () => Promise<unknown>) => Promise<boolean>
  /** What is wrong with the field at a JSON pointer. */
  at: (pointer: string) => string | undefined
  /** What is to be said above the form: refusals of fields it does not show, or of the whole. */
  general: (shownPointers: readonly string[]) => string | undefined
  /** Whether the last attempt was refused for one of these reasons. */
  was: (...codes: string[]) => boolean
  busy: boolean
}

/** Sends a form and keeps the server's refusal until the next attempt. Anything but a refusal is a bug and is thrown. */
export function useRefusal(): Refusal {
  const [problem, setProblem] = useState<ProblemError | null>(null)
  const [busy, setBusy] = useState(false)
  return {
    busy,
    async attempt(send) {
      setBusy(true)
      setProblem(null)
      try {
        await send()
        return true
      } catch (error) {
        if (!isProblem(error)) throw error
        setProblem(error)
        return false
      } finally {
        setBusy(false)
      }
    },
    was: (...codes) => problem !== null && isProblem(problem, ...codes),
    at: (pointer) => problem?.errors.find((error) => error.pointer === pointer)?.detail,
    general: (shownPointers) => {
      if (!problem) return undefined
      const elsewhere = problem.errors.filter((error) => !shownPointers.includes(error.pointer))
      if (problem.errors.length === 0) return problem.says
      return elsewhere.length > 0 ? elsewhere.map((error) => error.detail).join(' ') : undefined
    },
  }
}
