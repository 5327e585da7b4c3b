import { Link } from 'react-router-dom'
import { benchGroups } from '../../../shared/bench/groups.ts'
import { benchGroupNames } from '../../../shared/messages/bench.ts'
import { benchSheetWords as words } from '../../../shared/messages/bench-sheet.ts'
import { paths } from '../../lib/paths.ts'
import { listedCalculators, type ListedCalculator } from './load-calculator.ts'

/** Calculators whose name, purpose or other names have words that begin as each of those typed. */
export function matchingCalculators(q: string): ListedCalculator[] {
  const wanted = q.toLowerCase().split(/\s+/).filter(Boolean)
  return listedCalculators.filter((of) => {
    const text = `${of.words.name} ${of.words.purpose} ${of.words.search}`.toLowerCase()
    const starts = text.split(/[^\p{L}\p{N}-]+/u)
    return wanted.every((word) => starts.some((each) => each.startsWith(word)))
  })
}

/** The calculators: the dozen that are used every week first, the rest behind "more", by what they are about. */
export function CalculatorList({ q }: { q: string }) {
  const found = matchingCalculators(q)
  const weekly = found.filter((of) => of.weekly)
  const more = found.filter((of) => !of.weekly)
  if (found.length === 0) return <p role="status">{words.noneFound}</p>
  const groups = benchGroups.filter((group) => more.some((of) => of.group === group))
  return (
    <>
      {weekly.length > 0 ? (
        <section className="stack">
          <h2 className="t-head">{words.weekly}</h2>
          <Tools of={weekly} />
        </section>
      ) : null}
      {more.length > 0 ? (
        <details open={q !== '' || weekly.length === 0} className="bench-more">
          <summary>{words.more({ count: more.length })}</summary>
          {groups.map((group) => (
            <section key={group} className="stack mt-4">
              <h2 className="t-head">{benchGroupNames[group]}</h2>
              <Tools of={more.filter((of) => of.group === group)} />
            </section>
          ))}
        </details>
      ) : null}
      <p className="t-note no-print">
        <a href="/api/docs">{words.forPrograms}</a>
      </p>
    </>
  )
}

function Tools({ of: tools }: { of: readonly ListedCalculator[] }) {
  return (
    <ul className="bench-tools">
      {tools.map((of) => (
        <li key={of.id}>
          <Link to={paths.calculator(of.id)}>{of.words.name}</Link>
          <span className="t-2">{of.words.purpose}</span>
        </li>
      ))}
    </ul>
  )
}
