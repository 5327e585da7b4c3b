/**
 * Message catalogues. A catalogue is an object of sentences (strings, or functions of named parameters),
 * used as `words.title` and `words.signedBy({ name })`; a missing key does not compile.
 *
 * The active language is a transform applied on reading: plain English, or the pseudo-locale that tests use to
 * find text that does not come from a catalogue or does not survive longer or right-to-left words.
 */
type Sentence = string | ((params: never) => string)
export type Messages = Record<string, Sentence>

export type MessageLocale = 'en' | 'pseudo' | 'pseudo-rtl'

let locale: MessageLocale = 'en'

/** Chooses the language of every catalogue from now on; the screen must be drawn again by the caller. */
export function setMessageLocale(next: MessageLocale): void {
  locale = next
}

/** The language chosen last. */
export function messageLocale(): MessageLocale {
  return locale
}

const accented: Record<string, string> = {
  a: 'á',
  e: 'é',
  i: 'í',
  o: 'ó',
  u: 'ú',
  A: 'Á',
  E: 'É',
  I: 'Í',
  O: 'Ó',
  U: 'Ú',
  n: 'ñ',
  c: 'ç',
  y: 'ý',
}

/** A sentence as the pseudo-locale shows it: accented, about 40 % longer, in brackets; digits and units untouched. */
export function pseudo(text: string): string {
  const longer = text.replace(/[a-zA-Z]{3,}/g, (word) =>
    [...word]
      .map((letter) => accented[letter] ?? letter)
      .join('')
      .replace(/([áéíóú])/, '$1$1'),
  )
  return `[${longer}${'·'.repeat(Math.ceil(text.length * 0.2))}]`
}

function shown(text: string): string {
  if (locale === 'en') return text
  return locale === 'pseudo' ? pseudo(text) : `\u202e${pseudo(text)}\u202c`
}

/**
 * Makes a catalogue whose sentences follow the chosen language.
 *
 * @param sentences English, as rendered; parameters are already formatted (numbers with their units)
 */
export function defineMessages<T extends Messages>(sentences: T): Readonly<T> {
  const catalogue: Record<string, unknown> = {}
  for (const [key, sentence] of Object.entries(sentences)) {
    if (typeof sentence === 'string') {
      Object.defineProperty(catalogue, key, { enumerable: true, get: () => shown(sentence) })
    } else {
      catalogue[key] = (params: never) => shown(sentence(params))
    }
  }
  return catalogue as Readonly<T>
}

/** "1 animal", "2 animals": the count with the right form of its noun. */
export function counted(count: number | bigint, one: string, many: string): string {
  return `${count.toLocaleString('en-GB')}\u00a0${Number(count) === 1 ? one : many}`
}
