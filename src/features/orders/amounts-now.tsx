import { useQuery } from '@tanstack/react-query'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { PairOfAmounts } from '../../ui/pair-of-amounts.tsx'
import { DoseText } from './dose-text.tsx'
import { doseNowQuery } from './queries.ts'

const percentPlaces = 1

/** The signed amount beside the one for the water as it is now, with the reason; never one number. */
export function AmountsNow({
  number,
  doseKey,
  signedText,
  allowedPercent,
}: {
  number: string
  doseKey: string
  signedText: string
  allowedPercent: number
}) {
  const { data } = useQuery(doseNowQuery(number, doseKey))
  if (!data) return null
  const { driftPercent, driftWithin, amountNowText } = data
  const p = {
    percent: formatDose(Math.abs(driftPercent ?? 0), 'percent', percentPlaces).text,
    allowed: formatDose(allowedPercent, 'percent').text,
  }
  const reason =
    driftPercent === null || amountNowText === null
      ? words.nowUnknown
      : Math.abs(driftPercent) < 0.05
        ? words.driftNone
        : driftWithin
          ? words.driftInside(p)
          : words.driftOutside(p)
  return (
    <section className="stack" aria-live="polite">
      <h2 className="t-head">{words.amounts}</h2>
      {amountNowText === null ? (
        <p>{reason}</p>
      ) : (
        <PairOfAmounts
          signed={<DoseText text={signedText} />}
          signedWords={words.signedAmount}
          recomputed={<DoseText text={amountNowText} />}
          recomputedWords={words.nowAmount}
          reason={<span className={driftWithin ? undefined : 'text-magenta t-strong'}>{reason}</span>}
        />
      )}
    </section>
  )
}
