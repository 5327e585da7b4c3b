import type { RunningBath } from '../../../shared/contracts/doses.contract.ts'
import { sheetWords, timerWords as words } from '../../../shared/messages/doses-screens.ts'
import { sayTime } from '../../../shared/messages/say-date.ts'
import { paths } from '../../lib/paths.ts'
import { useUnsent } from '../../lib/stop-entries.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { clockText, timerOf } from './timer-model.ts'
import { useServerMs } from './use-bath-clock.ts'

/** Ends one of the baths, at its time or before it. */
export type EndBath = (kind: 'stop' | 'end', bath: RunningBath) => void

/**
 * The baths of the order that run beside the one that the sheet times. One of another dose is ended on its own sheet;
 * a second record of this dose here.
 */
export function OtherBaths({
  number,
  ownKey,
  baths,
  now,
  zone,
  receivedMs,
  onEnd,
}: {
  number: string
  ownKey: string
  baths: readonly RunningBath[]
  now: string
  zone: string
  receivedMs: number
  /** Null for whoever may not end a bath. */
  onEnd: EndBath | null
}) {
  const nowMs = useServerMs(now, receivedMs)
  return (
    <section className="stack">
      <h2 className="t-head">{words.others}</h2>
      <ul className="other-baths">
        {baths.map((bath) => (
          <li key={bath.doseId}>
            <BathTime bath={bath} nowMs={nowMs} zone={zone} />
            {bath.key !== ownKey ? (
              <ButtonLink to={paths.orderSheet(number, bath.key)}>
                {sheetWords.tab({ number, key: bath.key })}
              </ButtonLink>
            ) : onEnd === null ? null : (
              <EndActs bath={bath} onEnd={onEnd} />
            )}
          </li>
        ))}
      </ul>
    </section>
  )
}

function BathTime({ bath, nowMs, zone }: { bath: RunningBath; nowMs: number; zone: string }) {
  const { key, startedAt, endsAt } = bath
  if (endsAt === null)
    return (
      <>
        <b>{words.otherDose({ key })}</b>
        <p className="t-strong text-magenta">{words.endUntold}</p>
      </>
    )
  const timer = timerOf({ startedAt, endsAt }, nowMs)
  const at = { start: sayTime(startedAt, zone), end: sayTime(endsAt, zone) }
  return (
    <>
      <p className="row row-wrap">
        <b>{words.otherDose({ key })}</b>
        <span className={timer.isUp ? 't-strong text-magenta' : 't-strong'} role="timer" aria-live="off">
          {timer.isUp ? words.over({ time: clockText(timer.leftMs) }) : clockText(timer.leftMs)}
        </span>
      </p>
      <p className="t-2">{timer.isUp ? words.otherUp(at) : words.otherRuns(at)}</p>
      {timer.isUp ? <p className="t-strong text-magenta">{words.upWords}</p> : null}
    </>
  )
}

function EndActs({ bath, onEnd }: { bath: RunningBath; onEnd: EndBath }) {
  const unsent = useUnsent({ doseId: bath.doseId })
  if (unsent !== null) return null
  return (
    <div className="row row-wrap">
      <Button kind="stop" onClick={() => onEnd('stop', bath)}>
        {words.stop}
      </Button>
      <Button onClick={() => onEnd('end', bath)}>{words.end}</Button>
    </div>
  )
}
