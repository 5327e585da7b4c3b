import { spawnSync } from 'node:child_process'

/** Runs a poppler tool on a file given on its standard input: the reader that is not our own. */
function poppler(tool: string, args: string[], bytes: Uint8Array): Buffer {
  const run = spawnSync(tool, args, { input: bytes, maxBuffer: 64 << 20 })
  if (run.error) throw run.error
  if (run.status !== 0) throw new Error(`${tool} ended with ${run.status}: ${run.stderr.toString()}`)
  return run.stdout
}

const pagesFrom = (page?: number) => (page === undefined ? [] : ['-f', String(page), '-l', String(page)])

/** The text of a file or of one page in the order in which it was drawn. */
export function textOf(bytes: Uint8Array, page?: number): string {
  return poppler('pdftotext', ['-raw', ...pagesFrom(page), '-', '-'], bytes).toString('utf8')
}

/** The text of each page; poppler ends a page with a form feed. */
export function pageTexts(bytes: Uint8Array): string[] {
  return textOf(bytes).split('\f').slice(0, -1)
}

/** One form for both sides of a comparison: the micro sign is drawn as mu, which NFKC makes of it too. */
export const nfkc = (text: string): string => text.normalize('NFKC')

/** The same as it stands on the sheet, in lines. */
export function layoutOf(bytes: Uint8Array, page?: number): string {
  return poppler('pdftotext', ['-layout', ...pagesFrom(page), '-', '-'], bytes).toString('utf8')
}

export function infoOf(bytes: Uint8Array): Record<string, string> {
  const lines = poppler('pdfinfo', ['-'], bytes).toString('utf8').split('\n')
  return Object.fromEntries(
    lines
      .filter((line) => line.includes(':'))
      .map((line) => [line.split(':')[0] ?? '', line.slice(line.indexOf(':') + 1).trim()]),
  )
}

export function pageCount(bytes: Uint8Array): number {
  return Number(infoOf(bytes)['Pages'])
}

export interface Word {
  text: string
  left: number
  top: number
  right: number
  bottom: number
}

/** Every word of a page with its place in points. */
export function wordsOf(bytes: Uint8Array, page = 1): Word[] {
  const html = poppler('pdftotext', ['-bbox', ...pagesFrom(page), '-', '-'], bytes).toString('utf8')
  return [
    ...html.matchAll(/<word xMin="([\d.]+)" yMin="([\d.]+)" xMax="([\d.]+)" yMax="([\d.]+)">(.*?)<\/word>/g),
  ].map(([, left, top, right, bottom, text]) => ({
    text: (text ?? '').replaceAll('&amp;', '&').replaceAll('&lt;', '<').replaceAll('&gt;', '>'),
    left: Number(left),
    top: Number(top),
    right: Number(right),
    bottom: Number(bottom),
  }))
}

export interface GreyPage {
  width: number
  height: number
  /** Grey of the pixel at a place in points, 0 black … 255 white. */
  at(x: number, y: number): number
  /** Part of an area, given in points, that is darker than mid grey. */
  darkShare(left: number, top: number, right: number, bottom: number): number
}

/** A page as a greyscale printer would put it down, at 144 dots to the inch. */
export function greyOf(bytes: Uint8Array, page = 1): GreyPage {
  const image = poppler(
    'pdftoppm',
    ['-gray', '-r', '144', '-f', String(page), '-l', String(page), '-'],
    bytes,
  )
  const header = /^P5\s+(\d+)\s+(\d+)\s+255\s/.exec(image.subarray(0, 40).toString('latin1'))
  if (!header) throw new Error('pdftoppm gave no grey image')
  const [width, height] = [Number(header[1]), Number(header[2])]
  const pixels = image.subarray(header[0].length)
  const at = (x: number, y: number) => pixels[Math.floor(y * 2) * width + Math.floor(x * 2)] ?? 255
  return {
    width,
    height,
    at,
    darkShare: (left, top, right, bottom) => {
      let dark = 0
      let all = 0
      for (let y = top; y < bottom; y += 0.5)
        for (let x = left; x < right; x += 0.5) {
          all++
          if (at(x, y) < 128) dark++
        }
      return dark / all
    },
  }
}
