/**
 * A printed document as pure data: what stands on the sheet and in which order, without a font or a page number.
 * The builder of each document (order, certificate, history …) makes one; the PDF renderer measures and draws it,
 * and a screen can draw the same data as an accessible page.
 *
 * Every string is already worded and formatted: quantities come from the one dose formatter with a no-break space
 * between number and unit, times carry their zone. Nothing here computes or translates.
 */

/** A run of text of one look. `italic` is for scientific names; `tone: 'second'` for what supports the figure. */
export interface Span {
  text: string
  bold?: boolean
  italic?: boolean
  tone?: 'second'
}

/** Text of one look, or runs of several. A line feed begins a new line. */
export type RichText = string | readonly Span[]

export type Paper = 'a4' | 'letter'

/** Signal flags Q (in quarantine), L (held), C (cleared, valid), N (not cleared, not valid); words always beside it. */
export type FlagLetter = 'Q' | 'L' | 'C' | 'N'

export interface PdfDocumentModel {
  /** Title in the file's properties: "Treatment order TO-0734, version 2". */
  title: string
  /** BCP 47 language of the words: "en". */
  language: string
  paper: Paper
  head: DocumentHead
  /** One line for each signer with meaning and time: "Signed by Dr Ilse Marrow, 14 May 2026, 14:24:07, UTC−4". */
  signers: readonly string[]
  /** Short form of the fingerprint, from `formatFingerprint`; absent on what is not a record (a label). */
  recordCheck?: string
  /** A state that no page may hide: draft, held, superseded, record check failed. White on ink, on every page. */
  notice?: string
  printed: PrintedNote
  blocks: readonly DocumentBlock[]
}

export interface DocumentHead {
  facility: string
  /** "Treatment order: bath" */
  name: string
  /** "TO-0734" */
  number?: string
  /** "version 2" */
  version?: string
  /** Which units, which basis: "Volumes in litres, copper as free copper." */
  source?: string
  subject?: DocumentSubject
}

/** What or whom the document is about; its name is repeated on every page. */
export interface DocumentSubject {
  name: string
  flag?: FlagLetter
  lines?: readonly RichText[]
}

export interface PrintedNote {
  by: string
  /** With the zone: "14 May 2026, 14:33, UTC−4". */
  at: string
  /** The same instant, ISO 8601, for the file's properties. */
  atIso: string
  /** "A later version may exist." */
  note?: string
}

export type DocumentBlock =
  | HeadingBlock
  | ParagraphBlock
  | GridBlock
  | AmountBlock
  | TableBlock
  | WorkingBlock
  | ConditionsBlock
  | CautionBlock
  | SignaturesBlock
  | PenBlock
  | CourseBlock
  | DrawingBlock
  | FlagLineBlock
  | FingerprintBlock
  | QrBlock
  | ColumnsBlock
  | GroupBlock
  | RuleBlock
  | PageBreakBlock

export interface HeadingBlock {
  kind: 'heading'
  text: string
  /** Stands at the right end of the heading's line. */
  aside?: string
}

export interface ParagraphBlock {
  kind: 'paragraph'
  text: RichText
  /** `small` for sources and the standing caution; never for a dose. */
  size?: 'body' | 'small'
}

/** Key and value pairs, a label column and a value column, one or two pairs side by side. */
export interface GridBlock {
  kind: 'grid'
  entries: readonly { label: string; value: RichText }[]
  columns?: 1 | 2
}

/** The number a person acts on, with its unit, and what it is. One on a sheet. */
export interface AmountBlock {
  kind: 'amount'
  above?: RichText
  value: string
  unit: string
  lines: readonly RichText[]
  /** Under a hairline: limits and how later amounts come about. */
  limits?: RichText
}

export interface TableColumn {
  head: string
  /** Part of the width relative to the other columns; widened by itself when a number would not fit. */
  share: number
  align?: 'left' | 'right'
}

/** A cell to read, or a blank box for the pen with its unit printed in. */
export type TableCell = RichText | PenCell
export interface PenCell {
  pen: true
  unit?: string
}

export interface TableBlock {
  kind: 'table'
  columns: readonly TableColumn[]
  rows: readonly (readonly TableCell[])[]
  /** Printed under the ink rule, bold. */
  totals?: readonly RichText[]
  /** What an empty table says: "No permits on file." */
  emptyText: string
  /** Every cell with an edge of its own; always so when a cell is for the pen. */
  boxed?: boolean
}

/** The shown arithmetic: what, the formula with its numbers and units, the result. */
export interface WorkingBlock {
  kind: 'working'
  lines: readonly WorkingEntry[]
}
export interface WorkingEntry {
  what: string
  formula: RichText
  result: string
  /** Date of an old or estimated value the line rests on. */
  note?: RichText
  /** The last line, bold between ink rules. */
  total?: boolean
}

/** What must be true before an act, each with an open ring to be ticked by pen. */
export interface ConditionsBlock {
  kind: 'conditions'
  items: readonly RichText[]
  columns?: 1 | 2
}

export type CautionLevel = 'stop' | 'warning' | 'note' | 'stop-if'

export interface CautionBlock {
  kind: 'caution'
  level: CautionLevel
  title?: string
  lines: readonly RichText[]
  /** "Overridden by Dr I. Marrow 14:12, reason: …"; an overridden stop keeps its look. */
  override?: RichText
}

/** The signature and licence block, one entry for each signature. */
export interface SignaturesBlock {
  kind: 'signatures'
  entries: readonly SignatureEntry[]
}
export interface SignatureEntry {
  name: string
  role: string
  /** "licence VL-20417, valid to 30 Sep 2026"; absent for who signs without one (a witness). */
  licence?: string
  jurisdiction?: string
  /** The controlled-substance registration, of what was signed under one. */
  registration?: string
  /** "Signed as author of this order" */
  meaning: string
  /** Date, time to the second, zone. */
  signedAt: string
  /** Whether the text still matches what was signed; `broken` is drawn so that nobody can miss it. */
  check: 'intact' | 'broken'
  /** The state in words. */
  checkWords: string
}

/** Blank boxes to be filled in by pen, with label above and unit printed in. */
export interface PenBlock {
  kind: 'pen'
  fields: readonly { label: string; unit?: string; share?: number }[]
}

/** Events one under another along a drawn course, oldest or newest first as given. */
export interface CourseBlock {
  kind: 'course'
  stops: readonly CourseStop[]
  emptyText: string
}
export interface CourseStop {
  when: string
  title: string
  text?: RichText
  /** Papers that prove it. */
  aside?: RichText
  /** `made` is a filled fix and a solid line on, `ahead` an open ring and a dashed line, `doubtful` a broken ring. */
  state: 'made' | 'ahead' | 'doubtful'
}

/** A line drawing in its own units, scaled to the width; `alt` says in words what it shows and is printed under it. */
export interface DrawingBlock {
  kind: 'drawing'
  width: number
  height: number
  marks: readonly DrawingMark[]
  alt: string
}
export type DrawingMark =
  | { mark: 'line'; from: Point; to: Point; weight?: number; dash?: readonly number[]; tone?: 'ink' | 'hair' }
  | { mark: 'circle'; at: Point; radius: number; weight?: number; filled?: boolean }
  | { mark: 'box'; at: Point; width: number; height: number; weight?: number; filled?: boolean }
  | { mark: 'cross'; at: Point; arm: number; weight?: number }
  | {
      mark: 'text'
      at: Point
      text: string
      size: number
      anchor?: 'start' | 'middle' | 'end'
      bold?: boolean
    }
  | { mark: 'flag'; at: Point; side: number; flag: FlagLetter }
export type Point = readonly [x: number, y: number]

/** A flag with its words. */
export interface FlagLineBlock {
  kind: 'flag-line'
  flag: FlagLetter
  text: RichText
}

/** The fingerprint in full, and where it can be looked up. */
export interface FingerprintBlock {
  kind: 'fingerprint'
  label: string
  fingerprint: string
  lookUp?: string
}

/** A square code with its address in words beneath. */
export interface QrBlock {
  kind: 'qr'
  text: string
  sideMm: number
  caption: string
}

/** Blocks side by side; one under another when they are taller than a page. */
export interface ColumnsBlock {
  kind: 'columns'
  columns: readonly { share: number; blocks: readonly DocumentBlock[] }[]
  divided?: boolean
}

/** Blocks that stay on one page as long as a page can hold them. */
export interface GroupBlock {
  kind: 'group'
  blocks: readonly DocumentBlock[]
}

/** An ink rule from edge to edge of the sheet. */
export interface RuleBlock {
  kind: 'rule'
}

export interface PageBreakBlock {
  kind: 'page-break'
}
