import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { overrideDoseStop } from '../../../shared/contracts/doses.contract.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import * as repository from './administrations.repository.ts'
import { lockAndRead, personOf, refuseBroken, subjectOf, versionOf } from './dose-context.ts'
import type { AdministrationsParts } from './dose-context.ts'
import { refuseOtherLot } from './lot-of-order.ts'
import { findingOf } from './signed-overrides.ts'
import type { OverrideContent } from './signed-overrides.ts'

/** Overriding a stop at the tank: for one dose, one finding and the facts that it rests on, signed with a reason. */
export function createOverrides(parts: AdministrationsParts) {
  return {
    /**
     * Everything is judged again in this transaction; what is signed is a stop that stands now, on the facts that the
     * signer was shown.
     *
     * @refuses licence-not-valid | password-wrong | sign-in-locked | may-not | not-found | broken-record |
     * dose-not-possible | caution-not-fired | caution-stops
     */
    async overrideDoseStop(
      context: RequestContext,
      number: string,
      key: string,
      given: BodyOf<typeof overrideDoseStop>,
    ): Promise<void> {
      const now = parts.clock.now()
      const { password, licenceId } = given
      const signatory = await parts.signing.confirmSignatory(context, 'caution.override', password, now, {
        licenceId,
      })
      await parts.transactions.inTransaction(context, async (tx) => {
        const situation = await lockAndRead(parts, tx, { number, key, at: tx.at, lotId: given.lotId })
        refuseBroken(situation)
        if (given.lotId !== null) await refuseOtherLot(tx, situation, given.lotId)
        const { records, row, content, block, answer, facts, lotId } = situation
        if (records.some((record) => record.dose_key === key))
          throw new Problem('dose-not-possible', { detail: doseWords.alreadyRecorded })
        if (row.phase === 'discontinued' || row.phase === 'expired')
          throw new Problem('dose-not-possible', { detail: doseWords.ended })
        const { ruleId, code, finding } = given
        const caution = answer?.cautions.find(
          (one) => one.level === 'stop' && one.ruleId === ruleId && one.code === code,
        )
        const stands = caution && facts ? findingOf(caution, facts, lotId) : null
        if (caution?.overridable === false)
          throw new Problem('caution-stops', {
            detail: doseWords.notOverridable,
            extra: { cautions: [{ ruleId, code, overridable: false }] },
          })
        if (!caution || !stands || stands.finding !== finding)
          throw new Problem('caution-not-fired', {
            detail: doseWords.findingChanged,
            extra: { answers: [{ ruleId, code }] },
          })
        const { title, text } = sayCaution(caution, facts?.zone ?? 'UTC')
        const id = parts.ids.next()
        const signed: OverrideContent = {
          kind: 'dose-override',
          overrideId: id,
          order: { number, versionNo: content.versionNo, hash: block.hash },
          doseKey: key,
          ruleId,
          code,
          title,
          text,
          ...stands,
          lotId,
          reason: given.reason,
        }
        const sealed = await parts.signing.seal(tx, {
          signatory,
          subject: { kind: 'dose-override', id, label: `${number} dose ${key}` },
          meaning: doseWords.meaningOverride,
          content: JSON.parse(JSON.stringify(signed)) as Json,
        })
        await repository.insertOverride(tx, {
          id,
          orderVersionId: versionOf(situation),
          doseKey: key,
          signedTextId: sealed.id,
          ruleId,
          code,
          reason: given.reason,
          recordedAt: tx.at,
          recordedBy: personOf(tx),
        })
        tx.audit({
          action: 'dose.override',
          subject: subjectOf(situation),
          after: { key, ruleId, code, text, reason: given.reason, hash: sealed.hash },
          clinical: true,
        })
      })
    },
  }
}
