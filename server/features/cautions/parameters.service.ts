import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/caution-rules.contract.ts'
import type { CautionRuleId, RuleParameter } from '../../../shared/domain/cautions/caution-rule.ts'
import { cautionRules } from '../../../shared/domain/cautions/caution-rules.ts'
import { checkParameter, isLegal, loosens } from '../../../shared/domain/cautions/check-parameter.ts'
import type { ParameterRefusal } from '../../../shared/domain/cautions/check-parameter.ts'
import type { Refusal } from '../../../shared/domain/result.ts'
import { ruleProblemWords as words } from '../../../shared/messages/caution-rules.ts'
import { sayParameterValue } from '../../../shared/messages/say-parameter.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Ids } from '../../platform/ids.ts'
import { insertOnce } from '../../platform/database/rows.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { FacilityService } from '../facility/index.ts'
import type { SigningService } from '../signing/index.ts'
import { readParameterVersions } from './parameters.reads.ts'
import { RuleParameterConfirmation, RuleParameterVersion } from './rule-parameter.entity.ts'

export interface ParametersParts {
  transactions: Transactions
  clock: Clock
  ids: Ids
  facility: FacilityService
  signing: SigningService
}

export interface ParameterName {
  ruleId: CautionRuleId
  key: string
}

const parameterOf = ({ ruleId, key }: ParameterName): RuleParameter | undefined => {
  const parameters = cautionRules.find(({ id }) => id === ruleId)?.parameters ?? {}
  return Object.hasOwn(parameters, key) ? parameters[key] : undefined
}

const subjectOf = ({ ruleId, key }: ParameterName) => ({
  kind: 'rule-parameter',
  id: `${ruleId}.${key}`,
  label: `${ruleId} ${key}`,
})

/** Advisory locks of this kind stand for a threshold: its versions are a ledger without a row to lock. */
const parameterLocks = 4400_0059

/** Puts everybody who proposes or confirms a value of the threshold in one line until the transaction ends. */
async function lockParameter(tx: Tx, { ruleId, key }: ParameterName): Promise<void> {
  await tx.manager.query('SELECT pg_advisory_xact_lock($1, hashtext($2))', [
    parameterLocks,
    `${ruleId}.${key}`,
  ])
}

function refusedValue(
  parameter: RuleParameter | undefined,
  { code, params }: Refusal<ParameterRefusal>,
): Problem {
  if (!parameter) return new Problem('not-found')
  const limit = Number(params?.['limit'] ?? parameter.default)
  const detail = words[code]({ limit: sayParameterValue(limit, parameter.unit) })
  return refusedInput(code === 'other-unit' ? '/unit' : '/value', detail, code)
}

/** Values of this facility for the thresholds of the cautions: proposed by whoever doses, confirmed by a veterinarian. */
export function createParameters(parts: ParametersParts) {
  /** The jurisdiction that a confirmation is for: asked for where a limit of a law or label is loosened. */
  async function jurisdictionOf(
    tx: Tx,
    asked: { isLoosening: boolean; legal: boolean; typed: string | undefined; ofLicence: string },
  ): Promise<string> {
    if (asked.typed === undefined) {
      if (asked.isLoosening && asked.legal)
        throw refusedInput('/jurisdiction', words.jurisdictionNeeded, 'jurisdiction-needed')
      return asked.ofLicence
    }
    const accepted = await parts.facility.acceptedJurisdictions(tx)
    if (!accepted.includes(asked.typed))
      throw refusedInput('/jurisdiction', words.jurisdictionOther, 'jurisdiction-not-accepted')
    return asked.typed
  }

  return {
    /** @refuses not-found | bad-input, with the limit that is broken | stale-version | id-already-used */
    async propose(
      context: RequestContext,
      name: ParameterName,
      given: BodyOf<typeof contracts.proposeRuleParameter>,
    ): Promise<void> {
      const parameter = parameterOf(name)
      const checked = checkParameter(parameter, given)
      if (!checked.ok || !parameter)
        throw checked.ok ? new Problem('not-found') : refusedValue(parameter, checked.refusal)
      const { personId } = context.actor
      if (personId === null) throw new Problem('not-signed-in')
      await parts.transactions.inTransaction(context, async (tx) => {
        await lockParameter(tx, name)
        const [newest] = await readParameterVersions(tx.manager, name)
        const isRepeated = await tx.manager.existsBy(RuleParameterVersion, { id: given.id })
        if (!isRepeated && (newest?.id ?? null) !== given.supersedesId)
          throw new Problem('stale-version', {
            detail: newest
              ? words.newerProposed({
                  value: sayParameterValue(Number(newest.entered_value), parameter.unit),
                  by: newest.proposed_by_name,
                })
              : words.readAgain,
          })
        const row: RuleParameterVersion = {
          id: given.id,
          ruleId: name.ruleId,
          parameterKey: name.key,
          enteredValue: given.value.trim(),
          enteredUnit: given.unit,
          reason: given.reason,
          supersedesId: given.supersedesId,
          proposedAt: tx.at,
          proposedBy: personId,
        }
        const { created } = await insertOnce(tx, RuleParameterVersion, row, [
          'ruleId',
          'parameterKey',
          'enteredValue',
          'enteredUnit',
          'reason',
          'supersedesId',
          'proposedBy',
        ])
        if (created)
          tx.audit({
            action: 'rule-parameter.propose',
            subject: subjectOf(name),
            before: { value: newest?.entered_value ?? String(parameter.default), unit: parameter.unit },
            after: { value: row.enteredValue, unit: row.enteredUnit, reason: row.reason },
          })
      })
    },

    /**
     * @refuses licence-not-valid | licence-not-chosen | password-wrong | sign-in-locked | not-found | already-confirmed |
     * stale-version | bad-input where a limit is broken or a jurisdiction is missing
     */
    async confirm(
      context: RequestContext,
      name: ParameterName & { proposalId: string },
      given: BodyOf<typeof contracts.confirmRuleParameter>,
    ): Promise<void> {
      const parameter = parameterOf(name)
      if (!parameter) throw new Problem('not-found')
      const now = parts.clock.now()
      const { personId, licence } = await parts.signing.confirmSignatory(
        context,
        'formulary.confirm',
        given.password,
        now,
        { licenceId: given.licenceId },
      )
      await parts.transactions.inTransaction(context, async (tx) => {
        await lockParameter(tx, name)
        const versions = await readParameterVersions(tx.manager, name)
        const proposal = versions.find(({ id }) => id === name.proposalId)
        if (!proposal) throw new Problem('not-found')
        if (proposal.confirmed_at !== null) throw new Problem('already-confirmed')
        const [newest] = versions
        if (newest && newest.id !== proposal.id)
          throw new Problem('stale-version', {
            detail: words.newerProposed({
              value: sayParameterValue(Number(newest.entered_value), parameter.unit),
              by: newest.proposed_by_name,
            }),
          })
        // proposed under the limits of an earlier version of the rules
        const checked = checkParameter(parameter, {
          value: proposal.entered_value,
          unit: proposal.entered_unit,
        })
        if (!checked.ok) throw refusedValue(parameter, checked.refusal)
        const jurisdiction = await jurisdictionOf(tx, {
          isLoosening: loosens(parameter, checked.value),
          legal: isLegal(parameter),
          typed: given.jurisdiction,
          ofLicence: licence.jurisdiction,
        })
        const before = versions.find(({ confirmed_at }) => confirmed_at !== null)
        await tx.manager.insert(RuleParameterConfirmation, {
          id: parts.ids.next(),
          versionId: proposal.id,
          reason: given.reason,
          jurisdiction,
          licenceNumber: licence.number,
          confirmedAt: tx.at,
          confirmedOn: await parts.facility.dateOf(tx.at, tx),
          confirmedBy: personId,
        })
        tx.audit({
          action: 'rule-parameter.confirm',
          subject: subjectOf(name),
          before: { value: before?.entered_value ?? String(parameter.default), unit: parameter.unit },
          after: {
            value: proposal.entered_value,
            unit: parameter.unit,
            reason: given.reason,
            jurisdiction,
            licence: licence.number,
            loosens: loosens(parameter, checked.value),
          },
        })
      })
    },
  }
}

export type ParametersService = ReturnType<typeof createParameters>
