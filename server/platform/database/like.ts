/**
 * The LIKE pattern for a text anywhere in a column, with its wildcards taken literally; null where nothing is searched.
 * Compared as `plain_text(column) LIKE plain_text($n)`, so that accents and capitals need not be typed.
 */
export function containing(text: string | undefined): string | null {
  return text ? `%${text.replace(/[\\%_]/g, '\\$&')}%` : null
}
