/** The drawing of an empty list: a course to a harbour where nobody lies. Decoration; the words stand beside it. */
export function EmptyHarbour() {
  return (
    <svg width="150" height="60" viewBox="0 36 150 60" aria-hidden="true">
      <path d="M6 70C30 62 48 78 74 70S120 64 144 72" className="p-contour" />
      <path d="M14 82C38 76 60 88 82 82S122 78 138 84" className="p-contour" strokeDasharray="1 3" />
      <path d="M10 56H120" className="p-ahead" />
      <circle cx="14" cy="56" r="5" className="p-done" />
      <circle cx="14" cy="56" r="1.7" className="p-dot" />
      <AnchorMark x={132} y={54} />
    </svg>
  )
}

/** The harbour mark; green only when every condition is met. */
export function AnchorMark({
  x,
  y,
  scale = 1,
  met = false,
}: {
  x: number
  y: number
  scale?: number
  met?: boolean
}) {
  return (
    <g transform={`translate(${x} ${y}) scale(${scale})`} className={met ? 'p-anchor is-met' : 'p-anchor'}>
      <circle cx="0" cy="-6.2" r="2" />
      <path d="M0 -4.2V7M-4 -1h8M-7 1.5C-7 5.5 -3.5 7 0 7S7 5.5 7 1.5" />
    </g>
  )
}
