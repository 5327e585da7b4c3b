import type { ReactNode } from 'react'

/** One kind of part under its heading. */
export function PartGroup({ heading, children }: { heading: string; children: ReactNode }) {
  return (
    <section className="ruled stack">
      <h2 className="t-label">{heading}</h2>
      {children}
    </section>
  )
}
