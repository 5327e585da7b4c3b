import type { BathSheet, RecordedDose } from '../../../shared/contracts/doses.contract.ts'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { CautionBlock } from '../../ui/caution-block.tsx'
import { Tag } from '../../ui/tag.tsx'
import { DoseText } from '../orders/index.ts'

const kindWords = (kind: RecordedDose['kind']) =>
  ({
    given: words.kindGiven,
    recorded: words.kindRecorded,
    withheld: words.kindWithheld,
    refused: words.kindRefused,
  })[kind]

/** Everything recorded of this dose: what, when, by whom, how it ended, and what a veterinarian has to look at. */
export function RecordedDoses({ sheet, zone }: { sheet: BathSheet; zone: string }) {
  if (sheet.recorded.length === 0) return null
  return (
    <section className="stack">
      <h2 className="t-head">{words.records}</h2>
      {sheet.recorded.map((record) => (
        <OneRecord key={record.id} record={record} sheet={sheet} zone={zone} />
      ))}
    </section>
  )
}

const aMinuteMs = 60_000

function OneRecord({ record, sheet, zone }: { record: RecordedDose; sheet: BathSheet; zone: string }) {
  const at = (instant: string) => sayMoment(instant, zone, sheet.now)
  const { stop } = record
  const wasLater = Date.parse(record.recordedAt) - Date.parse(record.happenedAt) > aMinuteMs
  return (
    <article className="dose-record">
      <p className="row row-wrap">
        <b>{kindWords(record.kind)}</b>
        {record.amountText === null ? null : <DoseText text={record.amountText} size="strong" />}
        {record.lotNumber === null ? null : <span>{words.lotGiven({ lot: record.lotNumber })}</span>}
        {record.twice ? <Tag kind="late">{words.twice}</Tag> : null}
      </p>
      <p className="t-2">
        {words.recordLine({ by: record.by, at: at(record.happenedAt) })}
        {wasLater ? `, ${words.enteredLater({ at: at(record.recordedAt) })}` : null}
      </p>
      {record.note === null ? null : <p>{record.note}</p>}
      {record.twice ? <p className="t-2">{words.twiceBody}</p> : null}
      {stop === null ? null : (
        <>
          <p>
            {stop.cause === 'stopped'
              ? words.stoppedAt({ at: at(stop.at), by: stop.by })
              : sheet.contactMinutes === null
                ? words.outOfWater({ at: at(stop.at), by: stop.by })
                : words.endedInTime({ at: at(stop.at), by: stop.by })}
          </p>
          {stop.seen === null ? null : <p>{words.seen({ seen: stop.seen })}</p>}
          {stop.rescue === null ? null : <p>{words.rescue({ rescue: stop.rescue })}</p>}
        </>
      )}
      {record.exceptions.length > 0 ? (
        <div className="stack">
          <h3 className="t-label">{words.exceptions}</h3>
          {record.exceptions.map((exception, i) => (
            <CautionBlock
              key={`${exception.ruleId} ${exception.code} ${String(i)}`}
              level={exception.level}
              title={exception.title}
            >
              {exception.text}
            </CautionBlock>
          ))}
        </div>
      ) : null}
    </article>
  )
}
