import type { WorkingLine } from '../working/working-line.ts'

/** The water in one shape: how much, and the lines that led to it; the last line is the volume itself. */
export interface ShapeVolume {
  litres: number
  lines: WorkingLine[]
}

/** Where a shape stands in a worksheet: names its lines and the fields of its refusals. */
export interface ShapePlace {
  /** Key of the line of its volume, and prefix of the lines before it. */
  key: string
  /** Prefix of refused fields, "parts.0."; empty at the top. */
  path: string
  /** Parameters of the label: role and name of the part. */
  params: Record<string, string | number>
}
