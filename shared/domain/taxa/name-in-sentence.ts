/** First words of common names that are written large wherever they stand. */
const largeAlways = new Set([
  'African',
  'American',
  'Amazon',
  'Antarctic',
  'Arctic',
  'Atlantic',
  'Australian',
  'Banggai',
  'Caribbean',
  'Chinese',
  'European',
  'Galapagos',
  'Humboldt',
  'Japanese',
  'Mediterranean',
  'Mexican',
  'Pacific',
  'Siberian',
])

/**
 * The common name of an animal as it stands inside a sentence: `lined seahorse`, but `Pacific sea nettle` and
 * `Kemp's ridley`.
 *
 * @param commonName as in the list of taxa, which writes the first letter large
 */
export function nameInSentence(commonName: string): string {
  const first = commonName.split(/[\s-]/)[0] ?? ''
  if (largeAlways.has(first) || /['’]s$/.test(first)) return commonName
  return commonName.charAt(0).toLowerCase() + commonName.slice(1)
}
