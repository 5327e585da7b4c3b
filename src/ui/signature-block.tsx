import { useId } from 'react'
import type { ReactNode } from 'react'

/**
 * The double ink edge of whatever binds. The heading is the meaning of the signature; under it who signs and until when
 * the licence runs; then the fields and the act, or what stands on the record after signing.
 */
export function SignatureBlock({
  meaning,
  who,
  children,
}: {
  meaning: string
  who: ReactNode
  children?: ReactNode
}) {
  const id = useId()
  return (
    <section className="signature double-edge" aria-labelledby={id}>
      <h2 id={id} className="t-head">
        {meaning}
      </h2>
      <div className="signature-who">{who}</div>
      {children}
    </section>
  )
}
