import type { ReactNode } from 'react'
import { benchCarryWords as words } from '../../shared/messages/bench-carry.ts'

/** On a form: what was carried into it from the bench, with everything that it rests on. */
export function FromBench({
  head,
  says,
  inputs,
  working,
  sources = [],
  children,
}: {
  head: string
  /** What became of it here. */
  says: string
  inputs: readonly string[]
  working: readonly string[]
  sources?: readonly string[]
  /** What may be done with it. */
  children?: ReactNode
}) {
  return (
    <section className="from-bench" aria-label={words.heading}>
      <p>
        <strong>{head}</strong> {says}
      </p>
      <details className="fold">
        <summary>{words.grounds}</summary>
        <Lines title={words.asked} lines={inputs} />
        <Lines title={words.working} lines={working} />
        {sources.length > 0 ? <Lines title={words.sources} lines={sources} /> : null}
      </details>
      {children}
    </section>
  )
}

function Lines({ title, lines }: { title: string; lines: readonly string[] }) {
  return (
    <>
      <p className="t-label">{title}</p>
      <ul>
        {lines.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
    </>
  )
}
