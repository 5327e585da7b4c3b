/**
 * The answer of a domain function: a value, or a refusal that says why the question has no answer.
 * Refusals are returned, never thrown; a thrown error is a bug.
 */
export type Result<T, Code extends string = string> =
  { ok: true; value: T } | { ok: false; refusal: Refusal<Code> }

/**
 * Why a question has no answer. The sentence is made from `code` and `params` by the message catalogue,
 * so that the engine stays free of words.
 */
export interface Refusal<Code extends string = string> {
  code: Code
  /** The input that has to change, as named in the function's arguments; absent when no single one is at fault. */
  field?: string
  params?: Record<string, string | number>
}

/** Wraps an answer. */
export function ok<T>(value: T): { ok: true; value: T } {
  return { ok: true, value }
}

/** Wraps a refusal. */
export function refuse<Code extends string>(
  code: Code,
  field?: string,
  params?: Record<string, string | number>,
): { ok: false; refusal: Refusal<Code> } {
  return {
    ok: false,
    refusal: { code, ...(field === undefined ? {} : { field }), ...(params ? { params } : {}) },
  }
}
