import type { Refusal } from '../../../shared/domain/result.ts'
import { checkSetting } from '../../../shared/domain/settings/check-setting.ts'
import type { SettingRefusal } from '../../../shared/domain/settings/check-setting.ts'
import { itemsOf } from '../../../shared/domain/settings/list-items.ts'
import { settingKeys, settings } from '../../../shared/domain/settings/settings.ts'
import type { SettingKey } from '../../../shared/domain/settings/settings.ts'
import type { Paper } from '../../../shared/domain/documents/pdf-document-model.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { settingDetails, settingNames, settingRefusals } from '../../../shared/messages/settings.ts'
import type { Setting } from '../../../shared/contracts/facility.contract.ts'
import type { Ids } from '../../platform/ids.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { timeNotAhead } from '../../platform/http/check-time.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { presentSetting } from './facility.present.ts'
import { insertConfirmation, insertSettingVersion, lockSetting, takeNumber } from './facility.repository.ts'
import type { SettingRow } from './facility.reads.ts'

export interface FacilityParts {
  transactions: Transactions
  ids: Ids
  readVersions(key?: string, tx?: Tx): Promise<SettingRow[]>
  readConfirmed(key: string, tx?: Tx): Promise<string | null>
}

/** Kinds of human numbers and the form each takes; zeros in braces are the running number. */
const fixedForms = {
  order: 'TO-{0000}',
  case: 'Q-{000}',
  transaction: 'TR-{0000}',
  permit: 'PM-{000}',
} as const
export type NumberKind = keyof typeof fixedForms | 'accession'

/** The three times of a recorded fact, and who wrote it down. */
export interface FactTimes {
  happenedAt: Date
  happenedOn: string
  recordedAt: Date
  recordedBy: string | null
}

/** Puts a running number into a form such as `HP-{0000}`. */
export function formatNumber(form: string, number: number): string {
  return form.replace(/\{(0+)\}/, (_all, zeros: string) => String(number).padStart(zeros.length, '0'))
}

function refusedValue({ code, params }: Refusal<SettingRefusal>): Problem {
  const says = settingRefusals[code]
  const entry = params?.['entry']
  const detail = entry === undefined ? says : settingDetails.inEntry({ entry: String(entry), says })
  return refusedInput('/value', detail, code)
}

export function createFacilityService(parts: FacilityParts) {
  async function valueOf(key: SettingKey, tx?: Tx): Promise<string> {
    return (await parts.readConfirmed(key, tx)) ?? settings[key].default
  }
  async function settingOf(key: SettingKey): Promise<Setting> {
    return presentSetting(key, await parts.readVersions(key))
  }

  return {
    valueOf,
    /** The paper that documents are laid out for. */
    paper: async (): Promise<Paper> => ((await valueOf('facility.paper')) === 'Letter' ? 'letter' : 'a4'),
    async listSettings(): Promise<Setting[]> {
      const rows = await parts.readVersions()
      return settingKeys.map((key) =>
        presentSetting(
          key,
          rows.filter((row) => row.key === key),
        ),
      )
    },
    settingOf,
    async proposeSetting(
      context: RequestContext,
      key: SettingKey,
      given: { id: string; value: string; reason?: string },
    ) {
      const checked = checkSetting(settings[key], given.value)
      if (!checked.ok) throw refusedValue(checked.refusal)
      await parts.transactions.inTransaction(context, async (tx) => {
        const row = {
          id: given.id,
          key,
          value: checked.value,
          reason: given.reason ?? null,
          proposedAt: tx.at,
          proposedBy: tx.actor.personId,
        }
        await lockSetting(tx, key)
        const { created } = await insertSettingVersion(tx, row)
        if (created)
          tx.audit({
            action: 'setting.propose',
            subject: { kind: 'setting', id: key, label: settingNames[key] },
            before: { value: await valueOf(key, tx) },
            after: { value: checked.value, reason: given.reason },
          })
      })
    },
    async confirmSetting(context: RequestContext, key: SettingKey, proposalId: string) {
      await parts.transactions.inTransaction(context, async (tx) => {
        await lockSetting(tx, key)
        const versions = await parts.readVersions(key, tx)
        const proposal = versions.find((row) => row.id === proposalId)
        if (!proposal) throw new Problem('not-found')
        if (proposal.confirmed_at !== null) throw new Problem('already-confirmed')
        const [newest] = versions
        if (newest && newest.id !== proposalId)
          throw new Problem('stale-version', {
            detail: settingDetails.newerProposed({ value: newest.value, by: newest.proposed_by_name ?? '' }),
          })
        // proposed before the rules of this version
        const checked = checkSetting(settings[key], proposal.value)
        if (!checked.ok) throw refusedValue(checked.refusal)
        const before = await valueOf(key, tx)
        await insertConfirmation(tx, {
          id: parts.ids.next(),
          settingVersionId: proposalId,
          confirmedAt: tx.at,
          confirmedBy: tx.actor.personId,
          reason: null,
        })
        tx.audit({
          action: 'setting.confirm',
          subject: { kind: 'setting', id: key, label: settingNames[key] },
          before: { value: before },
          after: { value: proposal.value },
        })
      })
    },
    async zone(tx?: Tx): Promise<string> {
      return valueOf('facility.zone', tx)
    },
    /** The facility's calendar date of an instant. */
    async dateOf(at: Date, tx?: Tx): Promise<string> {
      return facilityDateOf(at.toISOString(), await valueOf('facility.zone', tx))
    },
    /**
     * The times of a fact: when it happened, on which day of the facility, when it was written down and by whom.
     * A time more than 5 minutes ahead is refused; however long ago is taken.
     */
    async timesOf(tx: Tx, happenedAt: string, pointer = '/happenedAt'): Promise<FactTimes> {
      const at = timeNotAhead(happenedAt, tx.at, pointer)
      const happenedOn = facilityDateOf(at.toISOString(), await valueOf('facility.zone', tx))
      return { happenedAt: at, happenedOn, recordedAt: tx.at, recordedBy: tx.actor.personId }
    },
    async acceptedJurisdictions(tx?: Tx): Promise<string[]> {
      return itemsOf(await valueOf('facility.jurisdictions', tx))
    },
    /** The next human number of a kind: unique, never reused, drawn under a lock. */
    async nextNumber(tx: Tx, kind: NumberKind): Promise<string> {
      const form = kind === 'accession' ? await valueOf('numbers.accession', tx) : fixedForms[kind]
      return formatNumber(form, await takeNumber(tx, kind))
    },
  }
}

export type FacilityService = ReturnType<typeof createFacilityService>
