import type { RefObject } from 'react'
import { ArrowDown, TriangleAlert } from 'lucide-react'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import type { Evaluation } from '../../../shared/bench/evaluate.ts'
import { formatFigure } from '../../../shared/bench/present.ts'
import { say } from '../../../shared/bench/words.ts'
import { benchResultWords as words } from '../../../shared/messages/bench-result.ts'
import { Icon } from '../../ui/icon.tsx'
import { LongQuantity } from './long-quantity.tsx'
import { sayEvaluation, warningsIn } from './result-said.tsx'
import { useKeyboardInset } from './use-keyboard-inset.ts'

/**
 * The result again, at the foot of a narrow screen while the fields are in sight; the result itself stands below them.
 * It leads there, since the warnings and the working belong to the figure.
 */
export function ResultBar({
  of,
  evaluation,
  result,
}: {
  of: AnyCalculator
  evaluation: Evaluation
  result: RefObject<HTMLElement | null>
}) {
  useKeyboardInset()
  const goThere = () => {
    result.current?.scrollIntoView({ block: 'start' })
    result.current?.focus({ preventScroll: true })
  }
  const count = warningsIn(evaluation)
  const figure = evaluation.ok ? evaluation.answer.figures[0] : null
  return (
    <div className="bench-bar">
      <button type="button" onClick={goThere}>
        {figure ? (
          <span className="bench-bar-figure">
            <span>{say(of, `result.${figure.key}`)}</span>
            <b>
              <LongQuantity of={formatFigure(figure)} size="strong" />
            </b>
          </span>
        ) : (
          <span className="bench-bar-why">{sayEvaluation(of, evaluation)}</span>
        )}
        {count > 0 ? (
          <span className="bench-bar-warnings">
            <Icon of={TriangleAlert} /> {words.warnings({ count })}
          </span>
        ) : null}
        <Icon of={ArrowDown} />
        <span className="visually-hidden">{words.toResult}</span>
      </button>
    </div>
  )
}
