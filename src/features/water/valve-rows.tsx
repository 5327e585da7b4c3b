import { useState } from 'react'
import type { ConnectionNow } from '../../../shared/contracts/water-facts.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { Button } from '../../ui/button.tsx'
import { CautionBlock } from '../../ui/caution-block.tsx'
import { Tag } from '../../ui/tag.tsx'
import { useRecordConnectionState } from './mutations.ts'
import { StateDialog } from './state-dialog.tsx'

/** How a valve or pump stands, in its own word. */
export function connectionWord({ kind, state }: Pick<ConnectionNow, 'kind' | 'state'>): string {
  if (state === 'unknown') return waterWords.notKnown
  if (kind === 'pump') return state === 'open' ? waterWords.running : waterWords.stopped
  return state === 'open' ? waterWords.open : waterWords.shut
}

const questionOf = (row: ConnectionNow, open: boolean) => {
  if (row.kind === 'pump') return open ? waterWords.startQuestion(row) : waterWords.stopQuestion(row)
  return open ? waterWords.openQuestion(row) : waterWords.shutQuestion(row)
}
const actOf = (row: ConnectionNow, open: boolean) => {
  if (row.kind === 'pump') return open ? waterWords.startIt : waterWords.stopIt
  return open ? waterWords.openIt : waterWords.shutIt
}

/** Valves and pumps with how they stand since when, and the act that changes it. */
export function ValveRows({
  rows,
  mayRecord,
  volumeHolds,
  sayWhen,
}: {
  rows: readonly ConnectionNow[]
  mayRecord: boolean
  /** The volume now in force holds for the valves as they stand. */
  volumeHolds: boolean
  sayWhen: (at: string) => string
}) {
  const [asked, setAsked] = useState<{ row: ConnectionNow; open: boolean } | null>(null)
  const record = useRecordConnectionState()
  if (rows.length === 0) return <p className="t-2">{waterWords.noValves}</p>
  return (
    <>
      <ul className="state-rows">
        {rows.map((row) => (
          <li key={row.id} className="state-row">
            <span>
              <b>{row.code}</b> {row.name}
              <small>{waterWords.joins({ from: row.fromCode, to: row.toCode })}</small>
            </span>
            <span>
              <Tag kind={row.state === 'unknown' ? 'solid' : 'plain'}>{connectionWord(row)}</Tag>
              <small>
                {row.since
                  ? waterWords.sinceBy({ at: sayWhen(row.since), by: row.by ?? '' })
                  : waterWords.unknownValve}
              </small>
            </span>
            {mayRecord ? (
              <span className="row">
                {row.state === 'open' ? null : (
                  <Button size="small" onClick={() => setAsked({ row, open: true })}>
                    {actOf(row, true)}
                    <span className="visually-hidden">{` ${row.code}`}</span>
                  </Button>
                )}
                {row.state === 'shut' ? null : (
                  <Button size="small" onClick={() => setAsked({ row, open: false })}>
                    {actOf(row, false)}
                    <span className="visually-hidden">{` ${row.code}`}</span>
                  </Button>
                )}
              </span>
            ) : (
              <span />
            )}
          </li>
        ))}
      </ul>
      {asked ? (
        <StateDialog
          question={questionOf(asked.row, asked.open)}
          act={actOf(asked.row, asked.open)}
          onBack={() => setAsked(null)}
          onRecord={(entry) => record.mutateAsync({ connectionId: asked.row.id, open: asked.open, ...entry })}
        >
          {asked.open && !asked.row.inside ? (
            <CautionBlock level="warning">
              {waterWords.willJoin({ codes: `${asked.row.fromCode} and ${asked.row.toCode}` })}
            </CautionBlock>
          ) : null}
          {volumeHolds ? <p className="t-2">{waterWords.volumeWillNotHold}</p> : null}
        </StateDialog>
      ) : null}
    </>
  )
}
