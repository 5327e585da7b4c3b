import { benchCarryWords as words } from '../messages/bench-carry.ts'
import type { AnyCalculator } from './definition.ts'
import type { BenchAnswer } from './evaluate.ts'
import { formatFigure, formatRange, formatWorking } from './present.ts'
import { sayInputs } from './say-inputs.ts'
import { say, sayLine } from './words.ts'

export interface SaidAnswer {
  name: string
  result: string
  inputs: string[]
  working: string[]
}

/**
 * A question to a calculator and its answer in words, for whoever takes it over.
 *
 * @param asked.originOf where the figure of an input comes from and when it was found; undefined for one that was typed
 */
export function sayAnswer(
  of: AnyCalculator,
  asked: { body: unknown; answer: BenchAnswer; originOf?: (input: string) => string | undefined },
): SaidAnswer {
  const { body, answer, originOf } = asked
  const [figure] = answer.figures
  const result = formatFigure(figure).text
  const ends = answer.range && formatRange(answer.range, figure)
  return {
    name: say(of, 'name'),
    result: ends ? words.between({ result, low: ends.low.text, high: ends.high.text }) : result,
    inputs: sayInputs(of, body).map(({ input, what, text }) => {
      const from = originOf?.(input)
      return from === undefined ? words.line({ what, text }) : words.lineFrom({ what, text, from })
    }),
    working: formatWorking(answer).map(({ line, formula, result: shown }) =>
      words.step({ what: sayLine(of, line), formula, result: shown.text }),
    ),
  }
}
