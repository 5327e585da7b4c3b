import type { ReactNode } from 'react'

/**
 * The signed amount and the recomputed one, side by side, each with its word and the reason for the difference.
 * Never one number and never an average. Give each number with `Quantity`-made text.
 */
export function PairOfAmounts({
  signed,
  signedWords,
  recomputed,
  recomputedWords,
  reason,
}: {
  signed: ReactNode
  signedWords: string
  recomputed: ReactNode
  recomputedWords: string
  reason: ReactNode
}) {
  return (
    <div className="amount-pair">
      <div>
        <b>{signed}</b>
        <small>{signedWords}</small>
      </div>
      <div className="is-recomputed">
        <b>{recomputed}</b>
        <small>{recomputedWords}</small>
      </div>
      <div className="amount-reason">{reason}</div>
    </div>
  )
}
