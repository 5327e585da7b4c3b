import { useState } from 'react'
import type { Setting } from '../../../shared/contracts/facility.contract.ts'
import type { SettingKey } from '../../../shared/domain/settings/settings.ts'
import { facilityWords } from '../../../shared/messages/people.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { settingHints, settingNames } from '../../../shared/messages/settings.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { useConfirmSetting, useProposeSetting } from './queries.ts'

/** One setting: the value in force, who confirmed it, and a proposal that waits, if any. */
export function SettingRow({ setting }: { setting: Setting }) {
  const { zone } = useMe().facility
  const may = useMay('facility.manage')
  const toast = useToast()
  const [typed, setTyped] = useState('')
  const [id, setId] = useState(newId)
  const propose = useProposeSetting(setting.key)
  const confirm = useConfirmSetting(setting.key)
  const key = setting.key as SettingKey
  const { proposal } = setting
  const problem = isProblem(propose.error) ? propose.error : isProblem(confirm.error) ? confirm.error : null

  return (
    <section className="stack border-b border-hair pb-4">
      <h2 className="t-head">{settingNames[key]}</h2>
      <p className="t-strong">{setting.value === '' ? '–' : setting.value}</p>
      <p className="t-2">
        {setting.state === 'confirmed' && setting.confirmedAt
          ? facilityWords.confirmed({
              by: setting.confirmedBy ?? '',
              at: sayInstant(setting.confirmedAt, zone),
            })
          : facilityWords.default}
      </p>
      {proposal ? (
        <div className="row row-wrap">
          <p>
            {facilityWords.waiting({
              value: proposal.value,
              by: proposal.proposedBy,
              at: sayInstant(proposal.proposedAt, zone),
            })}
          </p>
          <Button
            size="small"
            kind="primary"
            shut={may.allowed ? false : (may.why ?? false)}
            disabled={confirm.isPending}
            onClick={() =>
              confirm.mutate(
                { proposalId: proposal.id, key: proposal.id },
                { onSuccess: () => toast({ words: facilityWords.inForce }) },
              )
            }
          >
            {facilityWords.confirm}
          </Button>
        </div>
      ) : null}
      {may.allowed ? (
        <form
          className="stack max-w-[460px]"
          onSubmit={(event) => {
            event.preventDefault()
            propose.mutate(
              { id, value: typed },
              {
                onSuccess: () => {
                  setTyped('')
                  setId(newId())
                  toast({ words: facilityWords.proposed })
                },
              },
            )
          }}
        >
          <TextField
            label={facilityWords.newValue({ setting: settingNames[key] })}
            hint={settingHints[key]}
            wrong={problem?.errors[0]?.detail ?? problem?.says}
            value={typed}
            onChange={(event) => setTyped(event.target.value)}
          />
          <div>
            <Button size="small" type="submit" disabled={propose.isPending}>
              {facilityWords.propose}
            </Button>
          </div>
        </form>
      ) : null}
    </section>
  )
}
