import type { BathSheet, RecordedDose, RunningBath } from '../../../shared/contracts/doses.contract.ts'
import { sayTime } from '../../../shared/messages/say-date.ts'
import { timerWords as words } from '../../../shared/messages/doses-screens.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { Conditions } from '../../ui/condition-row.tsx'
import { announcement, clockText, durationText, timerOf } from './timer-model.ts'
import type { BathTimer } from './timer-model.ts'
import { useServerMs, useWakeLock } from './use-bath-clock.ts'

const width = 358
const bars = [0, 1, 2, 3, 4]

/** The time of a running bath, large enough to read from the other side of the tank, by the server's clock. */
export function RunningTime({
  bath,
  now,
  zone,
  receivedMs,
}: {
  bath: RunningBath
  now: string
  zone: string
  receivedMs: number
}) {
  const nowMs = useServerMs(now, receivedMs)
  useWakeLock()
  const { startedAt, endsAt } = bath
  if (endsAt === null)
    return (
      <section className="bath-run" aria-label={words.timeLeft}>
        <p className="t-strong text-magenta" role="alert">
          {words.endUntold}
        </p>
      </section>
    )
  const timer = timerOf({ startedAt, endsAt }, nowMs)
  const minutes = (timer.elapsedMs + timer.leftMs) / 60_000
  return (
    <section className="bath-run" aria-label={words.timeLeft}>
      <p className="t-label">{timer.isUp ? words.timeUp : words.timeLeft}</p>
      {/* the figures change every second and are not read aloud; what is worth hearing stands below */}
      <p className={timer.isUp ? 'bath-time text-magenta' : 'bath-time'} role="timer" aria-live="off">
        {timer.isUp ? words.over({ time: clockText(timer.leftMs) }) : clockText(timer.leftMs)}
      </p>
      {timer.isUp ? <p className="t-strong text-magenta">{words.upWords}</p> : null}
      <TimeBar timer={timer} from={sayTime(startedAt, zone)} until={sayTime(endsAt, zone)} />
      <p className="visually-hidden" aria-live="polite">
        {announcement(timer, minutes)}
      </p>
    </section>
  )
}

function TimeBar({ timer, from, until }: { timer: BathTimer; from: string; until: string }) {
  const x = Math.max(6, Math.min(width - 6, timer.share * width))
  const label = words.passed({
    passed: durationText(timer.elapsedMs),
    whole: durationText(timer.elapsedMs + timer.leftMs),
  })
  return (
    <svg className="bath-bar" viewBox={`0 0 ${String(width)} 40`} role="img" aria-label={label}>
      <rect x=".5" y="14.5" width={width - 1} height="9" fill="var(--paper)" stroke="var(--ink)" />
      {bars.map((bar) => (
        <rect key={bar} x={(bar * width) / 4.5} y="16.5" width={width / 9} height="5" fill="var(--ink)" />
      ))}
      <path d={`M${String(x)} 12l-6 -10h12z`} fill="var(--ink)" />
      <path d={`M${String(x)} 6V24`} stroke="var(--ink)" strokeWidth="2" />
      <text x="0" y="38" className="bath-bar-text">
        {from}
      </text>
      <text x={width} y="38" textAnchor="end" className="bath-bar-text">
        {until}
      </text>
    </svg>
  )
}

/** What has been done and what comes next in a running bath. */
export function RunningSteps({
  sheet,
  record,
  bath,
  zone,
}: {
  sheet: BathSheet
  record: RecordedDose
  bath: RunningBath
  zone: string
}) {
  const at = (instant: string) => sayMoment(instant, zone, sheet.now)
  const { endsAt } = bath
  const sayOut = () => {
    if (endsAt === null) return words.endUntold
    const out = { at: at(endsAt) }
    return Date.parse(endsAt) < Date.parse(sheet.now) ? words.outNow(out) : words.outBy(out)
  }
  return (
    <Conditions
      heading={record.amountText ?? sheet.drug}
      note={[record.amountText === null ? null : sheet.drug, record.lotNumber].filter(Boolean).join(', ')}
      conditions={[
        {
          key: 'in',
          state: 'met',
          what: words.in({ at: at(record.happenedAt), by: record.by }),
          known: record.note,
        },
        {
          key: 'out',
          state: 'open',
          what: sayOut(),
        },
      ]}
    />
  )
}
