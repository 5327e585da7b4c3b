import { useEffect, useState } from 'react'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import type { Evaluation } from '../../../shared/bench/evaluate.ts'
import { formatFigure } from '../../../shared/bench/present.ts'
import { say, sayRefusal } from '../../../shared/bench/words.ts'
import { benchResultWords as words } from '../../../shared/messages/bench-result.ts'

/** Typing has stopped when nothing has changed for so long. */
const quietMs = 1000

/** How many cautions ask for more than a note. */
export function warningsIn(evaluation: Evaluation): number {
  return evaluation.ok ? evaluation.answer.cautions.filter(({ level }) => level === 'warning').length : 0
}

/** The result, or the first reason why there is none, in one line. */
export function sayEvaluation(of: AnyCalculator, evaluation: Evaluation): string {
  if (!evaluation.ok) {
    const [first] = evaluation.refusals
    return first ? words.notYet({ why: sayRefusal(of, first) }) : ''
  }
  const [result] = evaluation.answer.figures
  const figure = words.figure({ name: say(of, `result.${result.key}`), figure: formatFigure(result).text })
  const count = warningsIn(evaluation)
  return count === 0 ? figure : words.figureWithWarnings({ figure, warnings: words.warnings({ count }) })
}

/** Tells a reader of the screen what came out, once typing has stopped and not at every key. */
export function ResultSaid({
  of,
  evaluation,
  untouched,
}: {
  of: AnyCalculator
  evaluation: Evaluation
  untouched: boolean
}) {
  const now = untouched ? '' : sayEvaluation(of, evaluation)
  const [said, setSaid] = useState('')
  useEffect(() => {
    const timer = setTimeout(() => setSaid(now), quietMs)
    return () => clearTimeout(timer)
  }, [now])
  return (
    <p className="visually-hidden" role="status">
      {said}
    </p>
  )
}
