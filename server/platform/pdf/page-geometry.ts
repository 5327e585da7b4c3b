import type { Paper } from '../../../shared/domain/documents/pdf-document-model.ts'
import { padding, px } from './type-scale.ts'

/** Sheets in points; A4 by ISO 216 (210 × 297 mm), Letter 8.5 × 11 in. */
const sheets = {
  a4: { width: (210 / 25.4) * 72, height: (297 / 25.4) * 72 },
  letter: { width: 612, height: 792 },
} as const satisfies Record<Paper, { width: number; height: number }>

export interface PageGeometry {
  width: number
  height: number
  /** Outer edge of the graduated border. */
  outer: { left: number; top: number; width: number; height: number }
  /** Inner edge, within which everything stands. */
  inner: { left: number; top: number; width: number; height: number }
  textLeft: number
  textWidth: number
}

const margin = { x: px(38), y: px(30) }
const border = px(10)

export function pageGeometry(paper: Paper): PageGeometry {
  const { width, height } = sheets[paper]
  const outer = { left: margin.x, top: margin.y, width: width - 2 * margin.x, height: height - 2 * margin.y }
  const inner = {
    left: outer.left + border,
    top: outer.top + border,
    width: outer.width - 2 * border,
    height: outer.height - 2 * border,
  }
  return { width, height, outer, inner, textLeft: inner.left + padding, textWidth: inner.width - 2 * padding }
}
