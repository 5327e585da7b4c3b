import type { CautionRule } from '../../../shared/contracts/caution-rules.contract.ts'
import * as contracts from '../../../shared/contracts/caution-rules.contract.ts'
import { Problem } from '../../platform/http/problem.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { ParametersService } from './parameters.service.ts'

export function cautionRoutes(parameters: ParametersService, rules: () => Promise<CautionRule[]>): Route[] {
  const ruleOf = async (ruleId: string) => {
    const rule = (await rules()).find((one) => one.ruleId === ruleId)
    if (!rule) throw new Problem('not-found')
    return rule
  }
  return [
    route(contracts.listCautionRules, async () => ({ rules: await rules() })),
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
