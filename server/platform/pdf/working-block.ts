import type { DocumentBlock } from '../../../shared/domain/documents/pdf-document-model.ts'

/** A working as a document shows it: every line that the screen has, the last of them the total. */
export function workingBlock(
  working: readonly { label: string; shown: string; result: string }[],
): DocumentBlock {
  const lines = working.map(({ label, shown, result }, i) => ({
    what: label,
    formula: shown,
    result,
    total: i === working.length - 1,
  }))
  return { kind: 'working', lines }
}
