/**
 * A cell as a spreadsheet may open it: what a spreadsheet would take for a formula gets an apostrophe before it.
 * Negative numbers stay numbers; everything else that begins with one of the six signs is guarded.
 */
export function guardCell(text: string): string {
  if (!/^[=+\-@\t\r]/.test(text)) return text
  return /^-(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?$/.test(text) ? text : `'${text}`
}
