import { tallyFirings } from '../../../shared/domain/cautions/tally-firings.ts'
import { cautionRuleWords } from '../../../shared/messages/cautions.ts'
import type { Db } from '../../platform/database/db.ts'
import type { Parts } from '../../platform/parts.ts'
import type { FacilityService } from '../facility/index.ts'
import type { SigningService } from '../signing/index.ts'
import { cautionRoutes } from './cautions.routes.ts'
import { readFirings } from './firings.reads.ts'
import { readCautionSettings, readParameterVersions } from './parameters.reads.ts'
import { createParameters } from './parameters.service.ts'
import { RuleParameterConfirmation, RuleParameterVersion } from './rule-parameter.entity.ts'
import { presentRules } from './rules.present.ts'

export const cautionEntities = [RuleParameterVersion, RuleParameterConfirmation]

export function createCautions(parts: Parts & { facility: FacilityService; signing: SigningService }) {
  const { dataSource, clock } = parts
  const service = createParameters(parts)
  /** The facility's confirmed thresholds as they were in force at an instant. */
  const settingsAt = (at: Date, db: Db = dataSource) => readCautionSettings(db, at)
  const rules = async () =>
    presentRules(await settingsAt(clock.now()), await readParameterVersions(dataSource))
  const firings = async (month: string) => {
    const { firings: found, unreadable } = await readFirings(dataSource, month)
    const tally = tallyFirings(found).map((one) => ({ ...one, asks: cautionRuleWords[one.ruleId] }))
    return { rules: tally, unreadable }
  }
  return { service, settingsAt, rules, routes: cautionRoutes(service, rules, firings) }
}

export type Cautions = ReturnType<typeof createCautions>
