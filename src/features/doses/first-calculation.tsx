import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { sheetWords as words } from '../../../shared/messages/doses-screens.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { ButtonLink } from '../../ui/button-link.tsx'
import { SelectField } from '../../ui/select-field.tsx'

type Lot = BathSheet['lots'][number]

const lotStates: Record<string, () => string> = {
  expired: () => words.expired,
  recalled: () => words.recalled,
  'set-aside': () => words['set-aside'],
  'stored-cold': () => words['stored-cold'],
  precipitate: () => words.precipitate,
  'used-up': () => words['used-up'],
}

/** A lot as an option; one that may not be used says why. */
export function lotLabel({ lotNumber, expiresOn, state }: Lot): string {
  const why = lotStates[state]
  return why === undefined
    ? words.lotLine({ lot: lotNumber, expires: sayDate(expiresOn) })
    : words.lotShut({ lot: lotNumber, state: why() })
}

/** The first calculation: the lot in the hand, and who worked the amount out with it. */
export function FirstCalculation({
  sheet,
  zone,
  lotId,
  onLot,
}: {
  sheet: BathSheet
  zone: string
  lotId: string
  onLot: (lotId: string) => void
}) {
  const { first } = sheet
  return (
    <section className="stack">
      <h2 className="t-head">{words.first}</h2>
      {first ? (
        <p>
          {words.firstBy({
            by: first.by,
            at: sayMoment(first.at, zone, sheet.now),
            amount: first.amountText ?? '',
            lot: first.lotNumber ?? '',
          })}
        </p>
      ) : null}
      {sheet.may.includes('dose.give') ? (
        sheet.lots.length === 0 ? (
          <p>{words.noLots}</p>
        ) : (
          <SelectField
            label={words.lot}
            hint={words.firstNote}
            options={sheet.lots.map((lot) => ({ value: lot.id, label: lotLabel(lot) }))}
            value={lotId}
            onChange={(event) => onLot(event.target.value)}
          />
        )
      ) : (
        <p>{words.giveKeeper}</p>
      )}
    </section>
  )
}

/** Whether another person has calculated and agrees; until then, who may. */
export function SecondStanding({ sheet, zone }: { sheet: BathSheet; zone: string }) {
  const { first, second, secondNeeded } = sheet
  if (!secondNeeded) return <p className="t-note">{words.secondNotNeeded}</p>
  const isCurrent = first !== null && second !== null && second.at >= first.at
  return (
    <section className="stack" aria-live="polite">
      <h2 className="t-head">{words.second}</h2>
      {isCurrent && !second.markCompared ? <p className="t-2">{words.markNotCompared}</p> : null}
      {isCurrent && second.alone ? (
        <p className="t-2">
          {second.aloneText === null ? null : `${second.aloneText} `}
          {words.secondByAlone}
        </p>
      ) : null}
      {isCurrent ? (
        <p className={second.agrees ? undefined : 'text-magenta t-strong'}>
          {second.agrees
            ? words.secondAgrees({
                by: second.by,
                at: sayMoment(second.at, zone, sheet.now),
                amount: second.amountText ?? '',
              })
            : words.secondDiffers({ by: second.by, at: sayMoment(second.at, zone, sheet.now) })}
        </p>
      ) : (
        <>
          <p>{words.secondWaits}</p>
          <p className="t-2">{words.secondWho}</p>
          {sheet.repeatAt === null ? null : (
            <ButtonLink kind="plain" to={`${paths.orderSheet(sheet.number)}?dose=${sheet.key}&part=second`}>
              {words.secondAlone}
            </ButtonLink>
          )}
        </>
      )}
    </section>
  )
}
