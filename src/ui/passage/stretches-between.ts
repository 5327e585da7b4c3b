/**
 * What is left of a stretch between gaps in it.
 *
 * @param gaps by their beginning; they may overlap
 */
export function stretchesBetween(
  from: number,
  to: number,
  gaps: readonly (readonly [from: number, to: number])[],
): [from: number, to: number][] {
  const left: [number, number][] = []
  let at = from
  for (const [begin, end] of gaps) {
    if (begin > at) left.push([at, begin])
    at = Math.max(at, end)
  }
  if (to > at) left.push([at, to])
  return left
}
