import { sayDate } from '../../../shared/messages/say-date.ts'
import { sayMoment } from '../../lib/say-moment.ts'

/** When a fact happened, for a list: its date, month or year alone where no time of day is known. */
export const sayFactMoment = (
  { happenedAt, knownOn }: { happenedAt: string; knownOn: string | null },
  zone: string,
  now: string,
): string => (knownOn === null ? sayMoment(happenedAt, zone, now) : sayDate(knownOn))
