/** The ILIKE pattern for a text anywhere in a column, with its wildcards taken literally; null where nothing is searched. */
export function containing(text: string | undefined): string | null {
  return text ? `%${text.replace(/[\\%_]/g, '\\$&')}%` : null
}
