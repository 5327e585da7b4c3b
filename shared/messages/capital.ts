/** A title or a sentence begins with a capital, also where a drug's name or a sign does not. */
export const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)
