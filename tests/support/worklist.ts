import type { ReplyOf } from '../../shared/contracts/contract.ts'
import type { getToday, TodayWork } from '../../shared/contracts/today.contract.ts'
import { roles } from '../../shared/domain/permissions/roles.ts'
import type { Role } from '../../shared/domain/permissions/roles.ts'
import type { TestApi, TestPerson } from './api.ts'

/** Reads the worklist as people of a test. */
export function worklistOf(api: TestApi) {
  async function todayOf(who: Role | TestPerson) {
    const { agent } = typeof who === 'string' ? await api.as(who) : who
    return (await agent.get('/api/today').expect(200)).body as ReplyOf<typeof getToday>
  }
  /** Work of a kind, as one person has it; only what names a number, code or id where one is given. */
  async function itemsOf(who: Role | TestPerson, kind: TodayWork['kind'], about?: string) {
    return (await todayOf(who)).items.filter(
      (item) => item.kind === kind && (about === undefined || Object.values(item.params).includes(about)),
    )
  }
  /** Which roles have work of a kind about something on their worklist. */
  async function rolesThatSee(kind: TodayWork['kind'], about: string): Promise<Role[]> {
    const seen = await Promise.all(roles.map((role) => itemsOf(role, kind, about)))
    return roles.filter((_, i) => (seen[i] ?? []).length > 0)
  }
  return { todayOf, itemsOf, rolesThatSee }
}
