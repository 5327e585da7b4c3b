/** One thing to choose: name first, then id and place, then a figure at the right. */
export interface ComboboxOption {
  value: string
  name: string
  detail?: string
  aside?: string
}

/** The options that match every typed word, in name or detail; all of them when nothing was typed. */
export function matchingOptions(options: readonly ComboboxOption[], typed: string): ComboboxOption[] {
  const words = folded(typed).split(/\s+/).filter(Boolean)
  return options.filter((option) => {
    const text = folded(`${option.name} ${option.detail ?? ''}`)
    return words.every((word) => text.includes(word))
  })
}

/** A text cut where it matches what was typed, so that the match can be underlined. */
export function markedParts(text: string, typed: string): { text: string; marked: boolean }[] {
  const word = typed.trim().split(/\s+/)[0] ?? ''
  const at = word === '' ? -1 : folded(text).indexOf(folded(word))
  if (at < 0) return [{ text, marked: false }]
  return [
    { text: text.slice(0, at), marked: false },
    { text: text.slice(at, at + word.length), marked: true },
    { text: text.slice(at + word.length), marked: false },
  ].filter((part) => part.text !== '')
}

// one character stays one character, so that a match found here is at the same place in the text as shown
const folded = (text: string) =>
  [...text.toLowerCase()].map((letter) => letter.normalize('NFD')[0] ?? letter).join('')

/** The row that a key leads to in a list of `count`, `null` for a key that does not move. */
export function rowAfterKey(key: string, at: number | null, count: number): number | null {
  if (count === 0) return null
  if (key === 'ArrowDown') return at === null ? 0 : (at + 1) % count
  if (key === 'ArrowUp') return at === null ? count - 1 : (at - 1 + count) % count
  if (key === 'PageDown') return Math.min(count - 1, (at ?? -1) + 8)
  if (key === 'PageUp') return Math.max(0, (at ?? 0) - 8)
  return null
}
