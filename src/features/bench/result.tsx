import type { ReactNode } from 'react'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import type { BenchAnswer } from '../../../shared/bench/evaluate.ts'
import { formatCell, formatFigure, formatRange, formatWorking } from '../../../shared/bench/present.ts'
import { say, sayCaution, sayLine } from '../../../shared/bench/words.ts'
import type { FormattedQuantity } from '../../../shared/domain/quantities/formatted-quantity.ts'
import { sources } from '../../../shared/domain/sources.ts'
import { benchSheetWords as words, sourceMarks } from '../../../shared/messages/bench-sheet.ts'
import { CautionBlock, sortCautions } from '../../ui/caution-block.tsx'
import { WorkingBlock } from '../../ui/working-block.tsx'
import { LongQuantity } from './long-quantity.tsx'

/** CSS px of a digit and of a letter of the unit in each size, and the room that a phone of 390 has for both. */
const widths = { dose: [36, 19], mid: [20, 12] } as const
const roomPx = 330

/** The largest size in which the figure stands in one line on a phone; the smallest may break within its digits. */
function sizeOf({ number, symbol }: FormattedQuantity): 'dose' | 'mid' | 'strong' {
  const fits = ([digit, letter]: readonly [number, number]) =>
    number.length * digit + symbol.length * letter <= roomPx
  return fits(widths.dose) ? 'dose' : fits(widths.mid) ? 'mid' : 'strong'
}

/** The result with its range, and the figures that were worked out with it. */
export function ResultFigures({ of, answer }: { of: AnyCalculator; answer: BenchAnswer }) {
  const [result, ...others] = answer.figures
  const ends = answer.range && formatRange(answer.range, result)
  const shown = formatFigure(result)
  return (
    <>
      <p className="t-label">{say(of, `result.${result.key}`)}</p>
      <p>
        <LongQuantity of={shown} size={sizeOf(shown)} />
      </p>
      {ends ? (
        <p data-quantity="dose">{words.between({ low: ends.low.text, high: ends.high.text })}</p>
      ) : null}
      {others.length > 0 ? (
        <dl className="bench-figures">
          {others.map((figure) => (
            <div key={figure.key}>
              <dt>{say(of, `result.${figure.key}`)}</dt>
              <dd>
                <LongQuantity of={formatFigure(figure)} size="strong" />
              </dd>
            </div>
          ))}
        </dl>
      ) : null}
    </>
  )
}

/** Everything behind the result: cautions, the steps of a plan, the working, the sources. */
export function ResultGrounds({
  of,
  answer,
  children,
}: {
  of: AnyCalculator
  answer: BenchAnswer
  /** Stands between the working and the sources. */
  children?: ReactNode
}) {
  const { schedule } = answer
  const rows = formatWorking(answer).map(({ line, formula, result, isResult }) => ({
    key: line.key,
    what: sayLine(of, line),
    formula,
    result: <LongQuantity of={result} />,
    kind: isResult ? ('sum' as const) : ('line' as const),
  }))
  return (
    <>
      {sortCautions(answer.cautions.map((one) => ({ ...one, text: sayCaution(of, one) }))).map((caution) => (
        <CautionBlock key={caution.code + caution.text} level={caution.level}>
          {caution.text}
        </CautionBlock>
      ))}
      {schedule ? (
        <table className="bench-schedule" aria-label={words.schedule}>
          <thead>
            <tr>
              {schedule.columns.map((column) => (
                <th key={column.key} scope="col">
                  {say(of, `column.${column.key}`)}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {schedule.rows.map((row, at) => (
              <tr key={at}>
                {schedule.columns.map((column, i) => (
                  <td key={column.key} className="num">
                    {formatCell(row[i] ?? 0, column).text}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      ) : null}
      <section>
        <h2 className="t-head">{words.working}</h2>
        <WorkingBlock label={words.working} rows={rows} />
        <p className="t-note">{say(of, 'formula')}</p>
      </section>
      {children}
      <details className="bench-sources">
        <summary>{words.sources({ count: answer.sources.length })}</summary>
        <ul>
          {answer.sources.map((key) => (
            <li key={key}>
              {sources[key].citation} <span className="t-2">{sourceMarks[sources[key].mark]}</span>
            </li>
          ))}
        </ul>
      </details>
    </>
  )
}
