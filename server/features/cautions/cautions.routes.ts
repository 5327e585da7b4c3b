import * as firingContracts from '../../../shared/contracts/caution-firings.contract.ts'
import type { RuleFirings } from '../../../shared/contracts/caution-firings.contract.ts'
import type { CautionRule } from '../../../shared/contracts/caution-rules.contract.ts'
import * as contracts from '../../../shared/contracts/caution-rules.contract.ts'
import { csvReply } from '../../platform/http/csv-reply.ts'
import { Problem } from '../../platform/http/problem.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import { firingRows, firingsCsvColumns } from './firings-csv.ts'
import type { ParametersService } from './parameters.service.ts'

export function cautionRoutes(
  parameters: ParametersService,
  rules: () => Promise<CautionRule[]>,
  firings: (month: string) => Promise<{ rules: RuleFirings[]; unreadable: number }>,
): Route[] {
  const ruleOf = async (ruleId: string) => {
    const rule = (await rules()).find((one) => one.ruleId === ruleId)
    if (!rule) throw new Problem('not-found')
    return rule
  }
  return [
    route(contracts.listCautionRules, async () => ({ rules: await rules() })),
    route(firingContracts.listCautionFirings, async ({ query: { month } }) => ({
      month,
      ...(await firings(month)),
    })),
    route(firingContracts.listCautionFiringsCsv, async ({ query: { month } }) =>
      csvReply(`rules-${month}.csv`, firingsCsvColumns, firingRows(month, (await firings(month)).rules)),
    ),
    route(contracts.proposeRuleParameter, async ({ params, body, context }) => {
      await parameters.propose(context, params, body)
      return ruleOf(params.ruleId)
    }),
    route(contracts.confirmRuleParameter, async ({ params, body, context }) => {
      await parameters.confirm(context, params, body)
      return ruleOf(params.ruleId)
    }),
  ]
}
