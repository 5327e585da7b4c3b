import type { BenchReply } from '../../../shared/contracts/bench.contract.ts'
import type { FieldProblem } from '../../../shared/contracts/problems.ts'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import { evaluate, type BenchAnswer } from '../../../shared/bench/evaluate.ts'
import { formatFigure, formatRange, formatWorking } from '../../../shared/bench/present.ts'
import { say, sayCaution, sayLine, sayRefusal } from '../../../shared/bench/words.ts'
import type { Refusal } from '../../../shared/domain/result.ts'
import { sources, type SourceKey } from '../../../shared/domain/sources.ts'
import { benchWords } from '../../../shared/messages/bench.ts'
import { verifyWorking } from '../../platform/arithmetic/verify-working.ts'
import { Problem } from '../../platform/http/problem.ts'

/** A work, cited, with its mark. */
export const presentSource = (key: SourceKey) => ({ key, ...sources[key] })

function refusedInput(of: AnyCalculator, refusal: Refusal): FieldProblem {
  return {
    pointer: refusal.field === undefined ? '' : `/${refusal.field}`,
    detail: sayRefusal(of, refusal),
    code: refusal.code,
  }
}

/**
 * Asks a calculator and has its working evaluated a second way, before the figure leaves the server.
 *
 * @throws Problem not-computable with every input at fault · working-disagrees
 */
export async function answerOf(of: AnyCalculator, body: unknown): Promise<BenchAnswer> {
  const evaluation = evaluate(of, body)
  if (!evaluation.ok) {
    const errors = evaluation.refusals.map((refusal) => refusedInput(of, refusal))
    const detail = errors.map((each) => each.detail).slice(0, 3)
    throw new Problem('not-computable', { errors, detail: detail.join(' · ') })
  }
  const verified = await verifyWorking(evaluation.answer.working)
  if (!verified.ok) throw new Problem('working-disagrees', { detail: benchWords.disagrees })
  return evaluation.answer
}

/** An answer as it crosses the wire: every figure also as it is shown, every line and caution also in words. */
export function presentAnswer(of: AnyCalculator, answer: BenchAnswer): BenchReply {
  const { figures, range, schedule, cautions } = answer
  const [result] = figures
  const ends = range && formatRange(range, result)
  return {
    calculator: of.id,
    value: result.value,
    unit: result.unit,
    significantFigures: result.significantFigures,
    shown: formatFigure(result).text,
    range:
      range && ends
        ? { ...range, shown: benchWords.range({ low: ends.low.text, high: ends.high.text }) }
        : null,
    figures: figures.map((figure) => ({
      key: figure.key,
      what: say(of, `result.${figure.key}`),
      value: figure.value,
      unit: figure.unit,
      significantFigures: figure.significantFigures,
      shown: formatFigure(figure).text,
    })),
    working: formatWorking(answer).map(({ line, formula, result: shown }) => {
      const { key, expression, value, unit, rests } = line
      return {
        key,
        what: sayLine(of, line),
        expression,
        formula,
        value,
        unit,
        shown: shown.text,
        rests: [...rests],
      }
    }),
    schedule:
      schedule === null || schedule === undefined
        ? null
        : {
            columns: schedule.columns.map(({ key, unit }) => ({ key, unit, what: say(of, `column.${key}`) })),
            rows: schedule.rows.map((row) => [...row]),
          },
    sources: answer.sources.map(presentSource),
    cautions: cautions.map((caution) => ({
      code: caution.code,
      level: caution.level,
      text: sayCaution(of, caution),
    })),
  }
}
