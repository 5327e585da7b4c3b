import type { CautionSettings } from '../../../shared/domain/cautions/caution-rule.ts'
import { resolveParameters } from '../../../shared/domain/cautions/resolve-parameters.ts'
import { tricaineFood } from '../../../shared/domain/cautions/rules/r19-tricaine-food.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { withdrawalHold, withWithdrawal } from '../../../shared/domain/formulary/withdrawal.ts'
import type { WithdrawalHold } from '../../../shared/domain/formulary/withdrawal.ts'
import type { FacilityDate } from '../../../shared/domain/time/instant.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import type { Db } from '../../platform/database/db.ts'
import { happenedBy } from '../../platform/database/happened-by.ts'
import type { AnimalQuestions } from '../animals/index.ts'

interface DoseRow {
  agent: AgentCode
  number: string
  enclosure_id: string
  happened_at: Date
  named: string[]
}

/** Doses of the agents after which animals wait, since an instant, with the animals that their orders name. */
const readDoses = (db: Db, since: Date, at: Date): Promise<DoseRow[]> =>
  db.query(
    `SELECT v.agent, o.number, v.enclosure_id, d.happened_at,
            coalesce((SELECT array_agg(a.animal_id) FROM order_version_animals a WHERE a.order_version_id = v.id), '{}') AS named
       FROM live_doses d
       JOIN order_versions v ON v.id = d.order_version_id
       JOIN orders o ON o.id = v.order_id
      WHERE v.agent = ANY ($1) AND d.kind IN ('given', 'recorded') AND d.happened_at > $2 AND ${happenedBy('d', '$3')}`,
    [[...withWithdrawal], since, at],
  )

const dayMs = 86_400_000

/**
 * Whether an animal still waits after a dose before it may be eaten or set free: one that an order named it for, or that
 * went into the water that it was in, also as part of the group it was taken out of, or that joined it.
 *
 * @param asked.on the day on which it would leave
 */
export async function readWithdrawalHold(
  parts: {
    animals: AnimalQuestions
    settingsAt(at: Date, db?: Db): Promise<CautionSettings>
    zone(): Promise<string>
  },
  asked: { animalId: string; on: FacilityDate; at: Date },
  db: Db,
): Promise<WithdrawalHold | null> {
  const settings = await parts.settingsAt(asked.at, db)
  const days = resolveParameters(tricaineFood, settings).find(({ key }) => key === 'withdrawalDays')?.value
  if (days === undefined) throw new Error('the rule on tricaine has no withdrawal')
  // one day more than the days of the calendar can be long
  const since = new Date(asked.at.getTime() - (Math.ceil(days) + 2) * dayMs)
  const doses = await readDoses(db, since, asked.at)
  if (doses.length === 0) return null
  const ids = await parts.animals.joinedBy(asked.animalId, db)
  const stays = await parts.animals.whereabouts(ids, since, db)
  const was = (dose: DoseRow) =>
    stays.some((stay) => {
      const at = dose.happened_at.getTime()
      if (Date.parse(stay.from) > at || (stay.until !== null && Date.parse(stay.until) < at)) return false
      return dose.named.includes(stay.asId) || stay.enclosureId === dose.enclosure_id
    })
  const zone = await parts.zone()
  const given = doses.filter(was).map((dose) => ({
    agent: dose.agent,
    orderNumber: dose.number,
    givenOn: facilityDateOf(dose.happened_at.toISOString(), zone),
  }))
  return withdrawalHold(given, days, asked.on)
}
