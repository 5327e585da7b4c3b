import { useState } from 'react'
import type { BathSheet, RecordedDose } from '../../../shared/contracts/doses.contract.ts'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { CautionBlock } from '../../ui/caution-block.tsx'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { Tag } from '../../ui/tag.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { DoseText } from '../orders/index.ts'
import { useStrikeRecord } from './mutations.ts'
import { isNotToCome } from './sheet-model.ts'

const kindWords = (kind: RecordedDose['kind']) =>
  ({
    given: words.kindGiven,
    recorded: words.kindRecorded,
    withheld: words.kindWithheld,
    refused: words.kindRefused,
  })[kind]

/** Amounts of what was recorded are left out for whoever may calculate another dose. */
const isLeftOut = (sheet: BathSheet) => sheet.blind && isNotToCome(sheet)

/** Everything recorded of this dose: what, when, by whom, how it ended, and what a veterinarian has to look at. */
export function RecordedDoses({ sheet, zone }: { sheet: BathSheet; zone: string }) {
  if (sheet.recorded.length === 0) return null
  return (
    <section className="stack">
      <h2 className="t-head">{words.records}</h2>
      {sheet.recorded.map((record) => (
        <OneRecord key={record.id} record={record} sheet={sheet} zone={zone} />
      ))}
      {isLeftOut(sheet) ? (
        <>
          <p className="t-note">{words.recordedLeftOut}</p>
          <ButtonLink kind="plain" to={`${paths.orderSheet(sheet.number)}?dose=${sheet.key}&part=whole`}>
            {words.showRecorded}
          </ButtonLink>
        </>
      ) : null}
    </section>
  )
}

const aMinuteMs = 60_000

function OneRecord({ record, sheet, zone }: { record: RecordedDose; sheet: BathSheet; zone: string }) {
  const at = (instant: string) => sayMoment(instant, zone, sheet.now)
  const { stop, otherStops } = record
  const wasLater = Date.parse(record.recordedAt) - Date.parse(record.happenedAt) > aMinuteMs
  return (
    <article className={record.struck === null ? 'dose-record' : 'dose-record is-struck'}>
      {record.struck === null ? null : (
        <p>
          <b>{words.struck({ by: record.struck.by, at: at(record.struck.at) })}</b>{' '}
          {words.struckReason({ reason: record.struck.reason })}
        </p>
      )}
      <p className="row row-wrap">
        <b className="struck-text">{kindWords(record.kind)}</b>
        {record.amountText === null ? null : (
          <span className="struck-text">
            <DoseText text={record.amountText} size="strong" />
          </span>
        )}
        {record.lotNumber === null ? null : <span>{words.lotGiven({ lot: record.lotNumber })}</span>}
        {record.twice ? <Tag kind="late">{words.twice}</Tag> : null}
      </p>
      <p className="t-2">
        {words.recordLine({ by: record.by, at: at(record.happenedAt) })}
        {wasLater ? `, ${words.enteredLater({ at: at(record.recordedAt) })}` : null}
      </p>
      {record.note === null ? null : <p>{record.note}</p>}
      {record.twice ? <p className="t-2">{words.twiceBody}</p> : null}
      {stop === null ? null : <End stop={stop} sheet={sheet} at={at} />}
      {otherStops.length > 0 ? (
        <>
          {stop === null && otherStops.length === 1 ? null : (
            <p className="t-strong text-magenta">
              {words.severalEnds({ count: otherStops.length + (stop === null ? 0 : 1) })}
            </p>
          )}
          {otherStops.map((other) => (
            <div key={other.id}>
              {stop === null ? null : <p className="t-label">{words.otherEnd}</p>}
              <End stop={other} sheet={sheet} at={at} />
            </div>
          ))}
        </>
      ) : null}
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
      <StrikeActs record={record} at={at} />
    </article>
  )
}

/** When a bath ended, by whom, and what was seen and done. */
function End({
  stop,
  sheet,
  at,
}: {
  stop: NonNullable<RecordedDose['stop']>
  sheet: BathSheet
  at: (instant: string) => string
}) {
  const said = { at: at(stop.at), by: stop.by }
  return (
    <>
      <p>
        {stop.cause === 'stopped'
          ? words.stoppedAt(said)
          : sheet.contactMinutes === null
            ? words.outOfWater(said)
            : words.endedInTime(said)}
      </p>
      {stop.beforeStart ? <p className="t-strong text-magenta">{words.stopBeforeStart}</p> : null}
      {stop.seen === null ? null : <p>{words.seen({ seen: stop.seen })}</p>}
      {stop.rescue === null ? null : <p>{words.rescue({ rescue: stop.rescue })}</p>}
    </>
  )
}

/** Strikes a record or one of its ends out, for whoever may: with a reason, and it stays readable. */
function StrikeActs({ record, at }: { record: RecordedDose; at: (instant: string) => string }) {
  const strike = useStrikeRecord()
  const say = useToast()
  const [asked, setAsked] = useState<{ kind: 'dose' | 'stop'; id: string; key: string } | null>(null)
  const { stop } = record
  const others = record.otherStops.filter((other) => other.mayStrike)
  if (!record.mayStrike && !stop?.mayStrike && others.length === 0) return null
  return (
    <div className="row row-wrap">
      {record.mayStrike ? (
        <Button size="small" onClick={() => setAsked({ kind: 'dose', id: record.id, key: newId() })}>
          {words.strikeDose}
        </Button>
      ) : null}
      {stop?.mayStrike ? (
        <Button size="small" onClick={() => setAsked({ kind: 'stop', id: stop.id, key: newId() })}>
          {record.otherStops.length > 0 ? words.strikeOtherStop({ at: at(stop.at) }) : words.strikeStop}
        </Button>
      ) : null}
      {others.map((other) => (
        <Button
          key={other.id}
          size="small"
          onClick={() => setAsked({ kind: 'stop', id: other.id, key: newId() })}
        >
          {words.strikeOtherStop({ at: at(other.at) })}
        </Button>
      ))}
      {asked === null ? null : (
        <ReasonDialog
          question={asked.kind === 'dose' ? words.strikeDoseQuestion : words.strikeStopQuestion}
          body={asked.kind === 'dose' ? words.strikeDoseBody : words.strikeStopBody}
          label={words.strikeReason}
          act={words.strikeAct}
          back={words.strikeBack}
          onBack={() => setAsked(null)}
          onAct={async (reason) => {
            await strike.mutateAsync({ ...asked, reason })
            setAsked(null)
            say({ words: words.strikeDone })
          }}
        />
      )}
    </div>
  )
}
