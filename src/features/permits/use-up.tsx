import { permitWords as words } from '../../../shared/messages/permits-sheet.ts'

/** The share of a permit that is used up, 0…1; more than 1 when more was taken than it allows. */
export function usedShare(used: number, allowed: number): number {
  return used / allowed
}

/**
 * The use-up of a permit as a graduated bar with its numbers beside it. What is over stands outside the box, hatched,
 * and is said in words.
 */
export function UseUp({ used, allowed }: { used: number; allowed: number | null }) {
  if (allowed === null) return <span>{words.usedOf({ used, of: null })}</span>
  const share = usedShare(used, allowed)
  const over = used - allowed
  const box = 72
  return (
    <span className="use-up">
      <svg width="92" height="12" aria-hidden="true">
        <rect x=".5" y="1.5" width={box} height="9" className="p-line p-paper" />
        <rect x=".5" y="3.5" width={Math.min(1, share) * box} height="5" className="p-ink" />
        {over > 0 ? <path d={`M${String(box + 3)} 2l4 8m2-8l4 8m2-8l4 8`} className="p-line" /> : null}
      </svg>
      <span>
        {words.usedOf({ used, of: allowed })}
        {over > 0 ? <b className="block">{words.over({ by: over })}</b> : null}
      </span>
    </span>
  )
}
