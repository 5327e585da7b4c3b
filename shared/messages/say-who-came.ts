import { counted } from './define-messages.ts'

const ordinals = [
  'first',
  'second',
  'third',
  'fourth',
  'fifth',
  'sixth',
  'seventh',
  'eighth',
  'ninth',
  'tenth',
  'eleventh',
  'twelfth',
]

/**
 * The animals of a sentence: `a fourth ray`, `an octopus`, `3 animals (ray)`, `animals`.
 *
 * @param who how many came (0 = not told), the common name of one (`''` = not told), how many there were afterwards
 * (0 = not told)
 */
export function sayWhoCame(who: { animalCount: number; animalName: string; heldAfter: number }): string {
  const { animalCount, animalName, heldAfter } = who
  if (animalName === '') return animalCount > 0 ? counted(animalCount, 'animal', 'animals') : 'animals'
  if (animalCount !== 1) {
    const animals = animalCount > 0 ? counted(animalCount, 'animal', 'animals') : 'animals'
    return `${animals} (${animalName})`
  }
  const ordinal = heldAfter > 1 ? ordinals[heldAfter - 1] : undefined
  const words = ordinal === undefined ? animalName : `${ordinal} ${animalName}`
  return `${/^[aeio]/i.test(words) ? 'an' : 'a'} ${words}`
}
