/** A caution as one of the sentences that say what stands in the way of a dose. */
export const sayObstacle = ({ title, text }: { title: string; text: string }): string => `${title}. ${text}`

/** What stands in the way and is not the sentence of one of the cautions, which have a look of their own. */
export function restInTheWay(sheet: {
  why: readonly string[]
  cautions: readonly { title: string; text: string }[]
}): string[] {
  const said = new Set(sheet.cautions.map(sayObstacle))
  return sheet.why.filter((why) => !said.has(why))
}
