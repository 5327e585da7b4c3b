/** How the animals of a line stand to what was taken for them under the permits of one kind. */
export type CoverMark = 'fewer-than-animals' | 'more-than-animals'

/**
 * Whether the permits of one kind cover the animals of a line, no fewer and no more. Several permits of a kind share a
 * line; of each kind (leaving one country, entering another) the whole line needs to be covered. Animals dead on arrival
 * were shipped under the permit, though the collection never had them: they may be counted or not.
 *
 * @param animals    alive, and dead in the boxes; whole animals
 * @param quantities taken for this line under each permit of the kind, whole animals
 * @source common practice of permit keeping, no source
 */
export function judgeLineCover(
  animals: { alive: number; dead: number },
  quantities: readonly number[],
): CoverMark | null {
  const taken = quantities.reduce((sum, quantity) => sum + quantity, 0)
  if (taken < animals.alive) return 'fewer-than-animals'
  return taken > animals.alive + animals.dead ? 'more-than-animals' : null
}
