import { calculatorAt, calculators } from '../../../shared/bench/calculators.ts'
import { bodySchema } from '../../../shared/bench/schema.ts'
import { say } from '../../../shared/bench/words.ts'
import {
  askUnknownCalculator,
  calculatorContracts,
  listCalculators,
  printBenchSheet,
} from '../../../shared/contracts/bench.contract.ts'
import { askConnectedWater, askQuarantineClock } from '../../../shared/contracts/bench-questions.contract.ts'
import { benchWords } from '../../../shared/messages/bench.ts'
import { Problem } from '../../platform/http/problem.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import { answerConnectedWater } from './connected-water.ts'
import { answerQuarantineClock } from './quarantine-clock.ts'
import type { PrintBenchSheet } from './print-sheet.ts'
import { answerOf, presentAnswer, presentSource } from './answer.ts'

/** One address for each calculator. Nothing is kept: a figure that matters is carried into an order, a volume or a reading. */
export function benchRoutes(print: PrintBenchSheet): Route[] {
  return [
    route(listCalculators, async () => ({
      calculators: calculators.map((of) => ({
        id: of.id,
        address: `/api/bench/${of.id}`,
        name: say(of, 'name'),
        purpose: say(of, 'purpose'),
        group: of.group,
        weekly: of.weekly ?? false,
        body: bodySchema(of),
        example: { ...of.example },
        sources: of.sources.map(presentSource),
      })),
    })),
    ...calculatorContracts.map(({ of, contract }) =>
      route(contract, async ({ body }) => presentAnswer(of, await answerOf(of, body))),
    ),
    route(askQuarantineClock, async ({ body }) => answerQuarantineClock(body)),
    route(askConnectedWater, async ({ body }) => answerConnectedWater(body)),
    route(printBenchSheet, async ({ params, body, context }) => {
      const of = calculatorAt(params.calculator)
      if (!of) throw new Problem('not-found', { detail: benchWords.noSuch })
      return {
        contentType: 'application/pdf',
        fileName: `${of.id}.pdf`,
        body: await print(of, body, context.actor.printedName),
      }
    }),
    route(askUnknownCalculator, () =>
      Promise.reject(new Problem('not-found', { detail: benchWords.noSuch })),
    ),
  ]
}
