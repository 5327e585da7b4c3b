import type { ReactNode } from 'react'
import { classNames } from './class-names.ts'

export interface WorkingRow {
  key: string
  what: ReactNode
  /** The formula with numbers and units put in. */
  formula: ReactNode
  result: ReactNode
  /** `sum` is the last line, bold between rules; `carry` is brought over from another block. */
  kind?: 'line' | 'sum' | 'carry'
}

/** The shown arithmetic, line by line, so that it can be redone by hand. */
export function WorkingBlock({ label, rows }: { label: string; rows: readonly WorkingRow[] }) {
  return (
    <table className="working" aria-label={label}>
      <tbody>
        {rows.map((row) => (
          <tr key={row.key} className={classNames(row.kind && row.kind !== 'line' && `is-${row.kind}`)}>
            <th scope="row">{row.what}</th>
            <td className="working-formula">{row.formula}</td>
            <td className="working-result">{row.result}</td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}
