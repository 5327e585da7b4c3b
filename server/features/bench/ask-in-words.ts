import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { formatFigure } from '../../../shared/bench/present.ts'
import { sayAnswer } from '../../../shared/bench/say-answer.ts'
import { orderBenchWords } from '../../../shared/messages/orders.ts'
import { Problem } from '../../platform/http/problem.ts'
import { answerOf, presentSource } from './answer.ts'

/** Asks a calculator by its name and says the answer; why there is none where it is refused. */
export async function askInWords({ calculator, inputs }: { calculator: string; inputs: unknown }) {
  const of = calculatorAt(calculator)
  if (!of) return { ok: false as const, why: orderBenchWords.unknown }
  try {
    const answer = await answerOf(of, inputs)
    const [{ value, rounded, unit }] = answer.figures
    const figure = { value, rounded, unit, text: formatFigure(answer.figures[0]).text }
    const said = sayAnswer(of, { body: inputs, answer })
    return { ok: true as const, answer: { ...said, figure, sources: answer.sources.map(presentSource) } }
  } catch (error) {
    if (error instanceof Problem && (error.code === 'not-computable' || error.code === 'working-disagrees'))
      return { ok: false as const, why: error.details.detail ?? '' }
    throw error
  }
}
