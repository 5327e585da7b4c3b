/**
 * Units and counted nouns that stay on the line of their number even when the space before them was typed as a plain
 * one (in free text). It changes where a line may end, never what stands on it.
 */
const unitWords = [
  '(?:[kmcnμ]?[gLlm]|mol|mmol|μmol|meq|mEq|gal|qt|oz|lb|ft|in|IU)(?:[²³])?(?:[/·](?:[A-Za-zμ]+[²³]?))*',
  '°[CF]|%|‰|K|pH|ppt|psu|PSU|[mμ]S/cm|mV|kPa|hPa|mmHg|bar|k?W|dKH|dGH',
  'h|min|s|d|hours?|minutes?|seconds?|days?|weeks?|months?|years?|litres?|micrograms?|units?|drops?',
].join('|')
const numberThenUnit = new RegExp(`(?<=\\d) (?=(?:${unitWords})(?![\\p{L}\\d]))`, 'gu')
const signThenNumber = /(?<=(?:^|[\s(])[−+±×]) (?=\d)/gu

/**
 * Text as the renderer measures it: composed characters, the upright mu for the micro sign (which this font draws
 * slanted), one kind of breaking and one kind of no-break space, no invisible formatting characters.
 * Under NFKC it equals the given text, apart from the characters that nobody can see.
 */
export function drawnForm(text: string): string {
  return text
    .normalize('NFC')
    .replace(/\u00b5/g, '\u03bc')
    .replace(/\r\n?|\u2028|\u2029/g, '\n')
    .replace(/\u2011/g, '-')
    .replace(/[\u2007\u202f]/g, '\u00a0')
    .replace(/[\t\u2000-\u2006\u2008-\u200a\u205f\u3000]/g, ' ')
    .replace(/[\u00ad\u200b-\u200f\u202a-\u202e\u2060\u2066-\u2069\ufeff]/g, '')
}

/** Turns the spaces inside a quantity into no-break ones; the length stays the same. */
export function glueQuantities(text: string): string {
  return text.replace(numberThenUnit, '\u00a0').replace(signThenNumber, '\u00a0')
}

/**
 * Stretches of an over-long word that are not divided even then: a number with its sign and its unit. The unit may
 * be glued by a no-break space or follow directly ("0.44 g", "23.4 °C", "− 41.0 L").
 */
export const wholeQuantity = /(?:[−+±×<>≤≥~≈]\u00a0?)?\d[\d.,]*(?:\u00a0?[%‰°A-Za-zμ/²³·]{1,12})?/gu
