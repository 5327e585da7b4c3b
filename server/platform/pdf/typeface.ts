import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import fontkit from '@pdf-lib/fontkit'
import { drawnForm } from './drawn-form.ts'

/** Bold is the regular cut with an outline; letters stand this much further apart (parts of the size) to stay open. */
export const boldTracking = 0.012
/** Width of that outline, in parts of the size. */
export const boldOutline = 1 / 40

export interface Typeface {
  bytes: Uint8Array
  /** Advance of one character, in parts of the size. */
  advance(codePoint: number): number
  has(codePoint: number): boolean
  ascent: number
  descent: number
}

/** The static cut; the variable and the woff2 files embed wrongly or end the process. */
const file = '@expo-google-fonts/roboto-flex/400Regular/RobotoFlex_400Regular.ttf'
/** Marks that join the letter before them; what composition left over would be drawn beside its letter. */
const combining = /\p{M}/u

let loaded: Typeface | undefined

/** Roboto Flex regular, read once for each thread. */
export function typeface(): Typeface {
  loaded ??= load(readFileSync(createRequire(import.meta.url).resolve(file)))
  return loaded
}

function load(bytes: Uint8Array): Typeface {
  const font = fontkit.create(bytes)
  const drawable = new Set(
    font.characterSet.filter(
      (code) => code >= 0x20 && code < 0xfff0 && !combining.test(String.fromCodePoint(code)),
    ),
  )
  const advances = new Map<number, number>()
  return {
    bytes,
    has: (codePoint) => drawable.has(codePoint),
    advance: (codePoint) => {
      const known = advances.get(codePoint)
      if (known !== undefined) return known
      const advance = font.glyphForCodePoint(codePoint).advanceWidth / font.unitsPerEm
      advances.set(codePoint, advance)
      return advance
    },
    ascent: font.ascent / font.unitsPerEm,
    descent: -font.descent / font.unitsPerEm,
  }
}

/**
 * The characters of a text that the printed font cannot draw, each once, in order. A form that takes free text can
 * ask before the record is signed; the renderer refuses them.
 */
export function undrawableCharacters(text: string): string[] {
  const face = typeface()
  const missing = [...drawnForm(text)].filter(
    (character) => character !== '\n' && !face.has(character.codePointAt(0) ?? 0),
  )
  return [...new Set(missing)]
}

/**
 * Free text with each undrawable character as its plain form ("NH3" for a lowered 3) or spelled out as "[U+1F41F]", for documents that must come out whatever
 * somebody once typed (a history, a chart). Never for a signed text: its print would differ from what was signed.
 */
export function spellUndrawable(text: string): string {
  const missing = undrawableCharacters(text)
  return missing.reduce(
    (spelled, character) => spelled.replaceAll(character, plainForm(character)),
    drawnForm(text),
  )
}

/** A raised or lowered digit or sign has a plain one; anything else is named. */
function plainForm(character: string): string {
  const plain = character.normalize('NFKC')
  const drawable = plain !== character && undrawableCharacters(plain).length === 0
  return drawable ? plain : `[${codePointName(character)}]`
}

/** "U+1F41F" */
export function codePointName(character: string): string {
  return `U+${(character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')}`
}
