/** The items of a list setting. */
export function itemsOf(value: string): string[] {
  return value === '' ? [] : value.split(',').map((item) => item.trim())
}

/** A list as it is kept: no empty items, one comma and one space between two. */
export const tidyList = (typed: string): string =>
  itemsOf(typed)
    .filter((item) => item !== '')
    .join(', ')
