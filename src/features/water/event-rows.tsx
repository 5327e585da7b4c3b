import { useState } from 'react'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import type { WaterEventRow } from '../../../shared/contracts/water-facts.ts'
import { waterEventNames } from '../../../shared/messages/water.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { Button } from '../../ui/button.tsx'
import { classNames } from '../../ui/class-names.ts'
import { useVoidRecord } from './mutations.ts'
import { StrikeDialog } from './strike-dialog.tsx'

/** "15 % of the water", "454 L", with the machine that was cleaned. */
export function eventAmount(row: Pick<WaterEventRow, 'amount' | 'sharePercent'>): string {
  if (row.sharePercent !== null) return waterWords.shareOf({ percent: String(row.sharePercent) })
  if (!row.amount) return ''
  const { value, unit } = row.amount
  return isUnitCode(unit) ? formatReading({ value, unit }).text : `${value} ${unit}`
}

/** What was done to the water, the newest first; a wrong row is struck through and stays. */
export function EventRows({
  rows,
  mayRecord,
  sayWhen,
}: {
  rows: readonly WaterEventRow[]
  mayRecord: boolean
  sayWhen: (at: string) => string
}) {
  const [asked, setAsked] = useState<WaterEventRow | null>(null)
  const strike = useVoidRecord()
  if (rows.length === 0) return <p className="t-2">{waterWords.noEvents}</p>
  return (
    <>
      <ul className="state-rows">
        {rows.map((row) => (
          <li key={row.id} className={classNames('state-row', row.voided && 'is-void')}>
            <span>
              <b>{waterEventNames[row.kind]}</b>
              {` ${[row.waterBodyCode, row.lifeSupportCode].filter(Boolean).join(', ')}`}
              {row.note ? <small>{row.note}</small> : null}
              {row.voided ? <small>{`${waterWords.struck}: ${row.voided.reason}`}</small> : null}
            </span>
            <span>
              {eventAmount(row)}
              <small>{`${sayWhen(row.happenedAt)}, ${row.recordedBy}`}</small>
            </span>
            {mayRecord && !row.voided ? (
              <Button size="small" kind="plain" onClick={() => setAsked(row)}>
                {waterWords.strike}
                <span className="visually-hidden">{` ${waterEventNames[row.kind]} ${sayWhen(row.happenedAt)}`}</span>
              </Button>
            ) : (
              <span />
            )}
          </li>
        ))}
      </ul>
      {asked ? (
        <StrikeDialog
          onBack={() => setAsked(null)}
          onStrike={(given) => strike.mutateAsync({ kind: 'water-event', id: asked.id, ...given })}
        />
      ) : null}
    </>
  )
}
