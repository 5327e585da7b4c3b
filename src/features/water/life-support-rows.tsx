import { useState } from 'react'
import type { LifeSupportNow } from '../../../shared/contracts/water-facts.ts'
import { lifeSupportNames } from '../../../shared/messages/water.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { Button } from '../../ui/button.tsx'
import { Tag } from '../../ui/tag.tsx'
import { useRecordLifeSupportState } from './mutations.ts'
import { StateDialog } from './state-dialog.tsx'

const wordOf = (state: LifeSupportNow['state']) =>
  ({ on: waterWords.on, off: waterWords.isOff, unknown: waterWords.notKnown })[state]

/** Machines with whether they are on, since when, and the switch. */
export function LifeSupportRows({
  rows,
  mayRecord,
  sayWhen,
}: {
  rows: readonly LifeSupportNow[]
  mayRecord: boolean
  sayWhen: (at: string) => string
}) {
  const [asked, setAsked] = useState<{ row: LifeSupportNow; on: boolean } | null>(null)
  const record = useRecordLifeSupportState()
  if (rows.length === 0) return <p className="t-2">{waterWords.noMachines}</p>
  return (
    <>
      <ul className="state-rows">
        {rows.map((row) => (
          <li key={row.id} className="state-row">
            <span>
              <b>{row.code}</b> {row.name}
              <small>{lifeSupportNames[row.kind]}</small>
            </span>
            <span>
              <Tag kind={row.state === 'off' ? 'solid' : 'plain'}>{wordOf(row.state)}</Tag>
              {row.since ? (
                <small>{waterWords.sinceBy({ at: sayWhen(row.since), by: row.by ?? '' })}</small>
              ) : null}
            </span>
            {mayRecord ? (
              <Button size="small" onClick={() => setAsked({ row, on: row.state !== 'on' })}>
                {row.state === 'on' ? waterWords.switchOff : waterWords.switchOn}
                <span className="visually-hidden">{` ${row.code}`}</span>
              </Button>
            ) : (
              <span />
            )}
          </li>
        ))}
      </ul>
      {asked ? (
        <StateDialog
          question={
            asked.on ? waterWords.switchOnQuestion(asked.row) : waterWords.switchOffQuestion(asked.row)
          }
          act={asked.on ? waterWords.switchOn : waterWords.switchOff}
          onBack={() => setAsked(null)}
          onRecord={(entry) => record.mutateAsync({ unitId: asked.row.id, on: asked.on, ...entry })}
        />
      ) : null}
    </>
  )
}
