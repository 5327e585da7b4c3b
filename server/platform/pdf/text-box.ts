import type { RichText } from '../../../shared/domain/documents/pdf-document-model.ts'
import { breakLines, type TextLine, type TextOptions } from './break-lines.ts'
import type { Typeface } from './typeface.ts'

/** Broken text of one size, ready to be drawn; all measures in points. */
export interface TextBox {
  lines: TextLine[]
  size: number
  leading: number
  height: number
  /** Of the widest line. */
  width: number
}

/** Measures text for a column of `width` points. Leading is 1.27 of the size unless given. */
export function textBox(
  face: Typeface,
  text: RichText,
  width: number,
  options: TextOptions & { leading?: number },
): TextBox {
  const leading = options.leading ?? options.size * 1.27
  return boxOf(breakLines(face, text, width, options), options.size, leading)
}

/** Divides a box after its first `count` lines. */
export function splitBox(box: TextBox, count: number): [TextBox, TextBox] {
  return [
    boxOf(box.lines.slice(0, count), box.size, box.leading),
    boxOf(box.lines.slice(count), box.size, box.leading),
  ]
}

function boxOf(lines: TextLine[], size: number, leading: number): TextBox {
  return {
    lines,
    size,
    leading,
    height: lines.length * leading,
    width: Math.max(0, ...lines.map((line) => line.width)),
  }
}
