import { find } from '../../../shared/contracts/find.contract.ts'
import { getToday } from '../../../shared/contracts/today.contract.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { FindQueries } from './find.queries.ts'
import type { TodayQueries } from './today.queries.ts'

export function todayRoutes(today: TodayQueries, finder: FindQueries): Route[] {
  return [
    route(getToday, ({ context }) => today.today(context.actor)),
    route(find, ({ query, context }) => finder.find(query.q, context.actor)),
  ]
}
