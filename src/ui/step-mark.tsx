export type StepState = 'done' | 'due' | 'to-come' | 'overdue' | 'failed'

/**
 * The mark of a step: filled, heavy ring, light ring, double magenta ring, cross. Each state has a shape of its own.
 * `small` as on the board, otherwise as in a case.
 */
export function StepMark({
  state,
  x,
  y,
  small,
}: {
  state: StepState
  x: number
  y: number
  small?: boolean
}) {
  if (state === 'failed') return <path d={`M${x - 5} ${y - 5}l10 10m0 -10l-10 10`} className="p-failed" />
  if (state === 'overdue') {
    return (
      <>
        <circle cx={x} cy={y} r={5.5} className="p-overdue" />
        <circle cx={x} cy={y} r={9} className="p-overdue-ring" />
      </>
    )
  }
  if (state === 'due') return <circle cx={x} cy={y} r={small ? 5.5 : 6.5} className="p-due" />
  if (state === 'to-come') return <circle cx={x} cy={y} r={small ? 4.2 : 5.5} className="p-to-come" />
  return (
    <>
      <circle cx={x} cy={y} r={small ? 4.6 : 5.5} className="p-done" />
      <circle cx={x} cy={y} r={1.7} className="p-dot" />
    </>
  )
}

/** The same mark as a little picture in a list or a table; the words beside it say the state. */
export function StepPicture({ state }: { state: StepState }) {
  return (
    <svg width="22" height="20" viewBox="0 0 22 20" aria-hidden="true">
      <StepMark state={state} x={11} y={10} small />
    </svg>
  )
}
