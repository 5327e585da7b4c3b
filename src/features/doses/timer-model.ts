import { counted } from '../../../shared/messages/define-messages.ts'
import { timerWords as words } from '../../../shared/messages/doses-screens.ts'

const second = 1000
const minute = 60 * second

export interface BathTimer {
  elapsedMs: number
  /** Below zero once the time is up. */
  leftMs: number
  isUp: boolean
  /** 0 to 1, for the drawing. */
  share: number
}

/**
 * How far the device's clock is from the server's, by a reply of the server. A bath is timed by the server's time, so
 * that a phone whose clock is wrong, a reload and a second phone all show the same.
 *
 * @param serverNow  the server's time in the reply
 * @param receivedMs when the reply came, by the device's clock
 */
export function serverOffsetMs(serverNow: string, receivedMs: number): number {
  return Date.parse(serverNow) - receivedMs
}

/** The bath at a moment of the server's time. */
export function bathTimer(startedAt: string, contactMinutes: number, atMs: number): BathTimer {
  const elapsedMs = Math.max(0, atMs - Date.parse(startedAt))
  const wholeMs = contactMinutes * minute
  const leftMs = wholeMs - elapsedMs
  return { elapsedMs, leftMs, isUp: leftMs <= 0, share: Math.min(1, elapsedMs / wholeMs) }
}

/** The same of a bath with its own start and end. */
export function timerOf(
  { startedAt, endsAt }: { startedAt: string; endsAt: string },
  atMs: number,
): BathTimer {
  return bathTimer(startedAt, (Date.parse(endsAt) - Date.parse(startedAt)) / minute, atMs)
}

const two = (value: number) => String(value).padStart(2, '0')

/** "21:18", "3:59:10"; rounded up while time is left, so that 0:00 is shown only when it is up. */
export function clockText(ms: number): string {
  const seconds = ms > 0 ? Math.ceil(ms / second) : Math.floor(-ms / second)
  const hours = Math.floor(seconds / 3600)
  const minutes = Math.floor((seconds % 3600) / 60)
  return hours > 0
    ? `${String(hours)}:${two(minutes)}:${two(seconds % 60)}`
    : `${String(minutes)}:${two(seconds % 60)}`
}

/** "3 hours 59 minutes", for a sentence. */
export function durationText(ms: number): string {
  const minutes = Math.floor(Math.abs(ms) / minute)
  const hours = Math.floor(minutes / 60)
  const rest = minutes % 60
  const parts = [
    ...(hours > 0 ? [counted(hours, 'hour', 'hours')] : []),
    ...(rest > 0 || hours === 0 ? [counted(rest, 'minute', 'minutes')] : []),
  ]
  return parts.join(' ')
}

/** Minutes left at which somebody who listens is told. */
const toldAtMinutesLeft = [10, 5, 2, 1]
const toldEveryMinutesOver = 5

/**
 * What is said aloud at this moment; it changes only at the moments worth hearing, so that a reader is not talked
 * through every second.
 */
export function announcement(timer: BathTimer, contactMinutes: number): string {
  if (timer.isUp) {
    const over = Math.floor(-timer.leftMs / minute / toldEveryMinutesOver) * toldEveryMinutesOver
    return over === 0 ? words.timeIsUp : words.overBy({ time: durationText(over * minute) })
  }
  const minutesLeft = timer.leftMs / minute
  const told = [...toldAtMinutesLeft]
    .reverse()
    .find((limit) => limit < contactMinutes && minutesLeft <= limit)
  return told === undefined
    ? words.runs({ minutes: counted(contactMinutes, 'minute', 'minutes') })
    : words.leftAloud({ time: durationText(told * minute) })
}
