import type { ReactNode } from 'react'

/**
 * The title block in the top left corner of a sheet: place or path, title, a source note (what units, which animals,
 * which time), and the flag if there is one.
 */
export function Cartouche({
  place,
  title,
  source,
  flag,
}: {
  place?: ReactNode
  title: ReactNode
  source?: ReactNode
  flag?: ReactNode
}) {
  return (
    <div className="cartouche">
      {place ? <p className="cartouche-place">{place}</p> : null}
      <h1 className="t-title">{title}</h1>
      {source ? <p className="cartouche-source">{source}</p> : null}
      {flag ? <p className="cartouche-flag">{flag}</p> : null}
    </div>
  )
}
