import type { RichText, Span } from '../../../shared/domain/documents/pdf-document-model.ts'
import { drawnForm, glueQuantities, wholeQuantity } from './drawn-form.ts'
import { PdfRenderError } from './pdf-render-error.ts'
import { boldTracking, codePointName, type Typeface } from './typeface.ts'

export type Tone = 'ink' | 'second' | 'paper'

export interface Look {
  bold: boolean
  italic: boolean
  tone: Tone
}

/** A stretch of one line in one look; `x` counts from the line's left end. */
export interface Fragment extends Look {
  text: string
  x: number
}

export interface TextLine {
  fragments: Fragment[]
  width: number
}

export interface TextOptions {
  size: number
  bold?: boolean
  tone?: Tone
  /** Names the place in an error: "caution 'Copper goes to waste water'". */
  block: string
}

interface StyledText {
  characters: string[]
  /** Advance of each character at the asked size. */
  widths: number[]
  looks: Look[]
}

/**
 * Breaks text into lines not wider than `width`. Lines end at plain spaces only; a word that is wider than the line
 * is divided, after a hyphen or slash where it has one, but never within a number or between a number and its unit.
 *
 * @throws PdfRenderError missing-glyph, does-not-fit
 */
export function breakLines(face: Typeface, text: RichText, width: number, options: TextOptions): TextLine[] {
  const styled = styledText(face, text, options)
  const lines: TextLine[] = []
  for (const [from, to] of stretches(styled, '\n', 0, styled.characters.length)) {
    let lineFrom = from
    let lineTo = from
    for (const [wordFrom, wordTo] of stretches(styled, ' ', from, to)) {
      if (lineTo > lineFrom && widthOf(styled, lineFrom, wordTo) > width) {
        lines.push(lineOf(styled, lineFrom, lineTo))
        lineFrom = wordFrom
      }
      lineTo = wordTo
      while (widthOf(styled, lineFrom, lineTo) > width + 0.001) {
        const at = divide(styled, lineFrom, lineTo, width, options.block)
        lines.push(lineOf(styled, lineFrom, at))
        lineFrom = at
      }
    }
    lines.push(lineOf(styled, lineFrom, lineTo))
  }
  return lines
}

/**
 * Widths a column may have: `line` needs no second line, `whole` keeps every word together, `least` only every number
 * with its unit.
 */
export function leastWidths(
  face: Typeface,
  text: RichText,
  options: TextOptions,
): { line: number; whole: number; least: number } {
  const styled = styledText(face, text, options)
  let line = 0
  let whole = 0
  let least = 0
  for (const [from, to] of stretches(styled, '\n', 0, styled.characters.length)) {
    line = Math.max(line, widthOf(styled, from, to))
    for (const [wordFrom, wordTo] of stretches(styled, ' ', from, to)) {
      whole = Math.max(whole, widthOf(styled, wordFrom, wordTo))
      for (const [start, end] of unbreakable(styled, wordFrom, wordTo))
        least = Math.max(least, widthOf(styled, start, end))
    }
  }
  return { line, whole, least }
}

function styledText(face: Typeface, text: RichText, options: TextOptions): StyledText {
  const spans: readonly Span[] = typeof text === 'string' ? [{ text }] : text
  const parts = spans.map((span) => [...drawnForm(span.text)])
  const looks = spans.flatMap((span, i) => {
    const look: Look = {
      bold: span.bold ?? options.bold ?? false,
      italic: span.italic ?? false,
      tone: span.tone ?? options.tone ?? 'ink',
    }
    return (parts[i] ?? []).map(() => look)
  })
  const characters = [...glueQuantities(parts.flat().join(''))]
  const widths = characters.map((character, i) => {
    if (character === '\n') return 0
    const code = character.codePointAt(0) ?? 0
    if (!face.has(code))
      throw new PdfRenderError('missing-glyph', {
        character: `${character} (${codePointName(character)})`,
        block: options.block,
      })
    return options.size * (face.advance(code) + (looks[i]?.bold ? boldTracking : 0))
  })
  return { characters, widths, looks }
}

/** The stretches between separators, empty ones left out unless there is nothing else. */
function stretches(text: StyledText, separator: string, from: number, to: number): [number, number][] {
  const found: [number, number][] = []
  let start = from
  for (let i = from; i <= to; i++)
    if (i === to || text.characters[i] === separator) {
      if (i > start || separator === '\n') found.push([start, i])
      start = i + 1
    }
  return found
}

function widthOf(text: StyledText, from: number, to: number): number {
  let width = 0
  for (let i = from; i < to; i++) width += text.widths[i] ?? 0
  return width
}

/** The pieces into which a word may be divided at worst. */
function unbreakable(text: StyledText, from: number, to: number): [number, number][] {
  const word = text.characters.slice(from, to)
  const pieces: [number, number][] = []
  let next = from
  for (const match of word.join('').matchAll(wholeQuantity)) {
    // Characters outside the basic plane are never drawable, so code units and characters count alike.
    const start = from + match.index
    for (; next < start; next++) pieces.push([next, next + 1])
    next = start + match[0].length
    pieces.push([start, next])
  }
  for (; next < to; next++) pieces.push([next, next + 1])
  return pieces
}

/** Where a word wider than the line is divided. */
function divide(text: StyledText, from: number, to: number, width: number, block: string): number {
  let last = from
  let afterHyphen = from
  let used = 0
  for (const [start, end] of unbreakable(text, from, to)) {
    used += widthOf(text, start, end)
    if (used > width) break
    last = end
    if (/[-/_.@,;:]/.test(text.characters[end - 1] ?? '')) afterHyphen = end
  }
  if (last === from)
    throw new PdfRenderError('does-not-fit', { text: text.characters.slice(from, to).join(''), block })
  return widthOf(text, from, afterHyphen) > width / 2 ? afterHyphen : last
}

function lineOf(text: StyledText, from: number, to: number): TextLine {
  const fragments: Fragment[] = []
  let x = 0
  for (let i = from; i < to; i++) {
    const look = text.looks[i]
    if (!look) continue
    const character = text.characters[i] ?? ''
    const current = fragments.at(-1)
    if (current && sameLook(current, look)) current.text += character
    else fragments.push({ ...look, text: character, x })
    x += text.widths[i] ?? 0
  }
  return { fragments, width: x }
}

function sameLook(a: Look, b: Look): boolean {
  return a.bold === b.bold && a.italic === b.italic && a.tone === b.tone
}
