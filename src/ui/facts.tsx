import { Fragment } from 'react'
import type { ReactNode } from 'react'

/** What is known of a record, as pairs of a term and what it is. */
export function Facts({ of }: { of: readonly (readonly [term: string, value: ReactNode])[] }) {
  return (
    <dl className="facts">
      {of.map(([term, value]) => (
        <Fragment key={term}>
          <dt>{term}</dt>
          <dd>{value}</dd>
        </Fragment>
      ))}
    </dl>
  )
}
