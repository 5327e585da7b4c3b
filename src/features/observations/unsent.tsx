import { useState } from 'react'
import { Link } from 'react-router-dom'
import { observationWords as words } from '../../../shared/messages/observation-screens.ts'
import { sayObservation } from '../../../shared/messages/observations.ts'
import { useMe } from '../../lib/me.ts'
import { outbox } from '../../lib/outbox.ts'
import type { OutboxItem } from '../../lib/outbox-store.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { useOutbox } from '../../lib/use-outbox.ts'
import { Button } from '../../ui/button.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { ListEmpty } from '../../ui/list-states.tsx'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import type { ObservationBody } from './observation-draft.ts'
import { SignalBanner } from './signal-banner.tsx'

/** What was entered on this device and is not with the server: waiting, not taken, struck out. Nothing is lost. */
export function Unsent() {
  const me = useMe()
  const { waiting, refused, struck, ofOthers } = useOutbox()
  const [busy, setBusy] = useState(false)
  const [tried, setTried] = useState(false)
  const [striking, setStriking] = useState<OutboxItem | null>(null)
  const send = async () => {
    setBusy(true)
    await outbox.flush(me.id)
    setBusy(false)
    setTried(true)
  }
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche title={words.unsentTitle} source={words.unsentSource} />
        {waiting.length > 0 ? (
          <div className="pane stack">
            <Button kind="primary" disabled={busy} onClick={() => void send()}>
              {words.sendNow}
            </Button>
            {tried && !busy ? <p role="status">{words.stillWaits}</p> : null}
          </div>
        ) : null}
      </Area>
      <Area>
        <SignalBanner />
        {ofOthers > 0 ? <p className="pane">{words.unsentOfOthers({ count: ofOthers })}</p> : null}
        {waiting.length + refused.length + struck.length === 0 ? (
          <div className="pane">
            <ListEmpty title={words.unsentNone} act={<Link to={paths.rounds()}>{words.back}</Link>}>
              {words.unsentNoneWhy}
            </ListEmpty>
          </div>
        ) : null}
        <EntryList heading={words.refused} items={refused} onStrike={setStriking} />
        <EntryList heading={words.waiting} items={waiting} />
        <EntryList heading={words.struck} items={struck} />
      </Area>
      {striking ? (
        <ReasonDialog
          question={words.strikeQuestion}
          body={words.strikeBody}
          label={words.reason}
          act={words.strikeAct}
          back={words.keepIt}
          onBack={() => setStriking(null)}
          onAct={async (reason) => {
            await outbox.strike(striking.id, reason)
            setStriking(null)
          }}
        />
      ) : null}
    </Sheet>
  )
}

function EntryList({
  heading,
  items,
  onStrike,
}: {
  heading: string
  items: readonly OutboxItem[]
  onStrike?: (item: OutboxItem) => void
}) {
  const { zone } = useMe().facility
  const now = new Date().toISOString()
  if (items.length === 0) return null
  return (
    <section className="pane stack" aria-label={heading}>
      <h2 className="t-head">{heading}</h2>
      {items.map((item) => (
        <div key={item.id} className="case-line">
          <span>
            <b className="t-strong">
              {item.label}, {kindOf(item)}
            </b>{' '}
            <span className="t-note">
              {words.madeAt({ at: sayMoment(item.madeAt, zone, now) })}
              {item.tries > 0 ? `, ${words.triedTimes({ count: item.tries })}` : ''}
            </span>
            {item.kind === 'observation' ? (
              <span className="block">
                {sayObservation(item.body as unknown as ObservationBody).join('. ')}
              </span>
            ) : null}
            {writtenWith(item) === '' ? null : <span className="block">{writtenWith(item)}</span>}
            {item.refusal && item.state === 'refused' ? (
              <span className="t-strong block">{item.refusal.says}</span>
            ) : null}
            {item.struckReason === null ? null : (
              <span className="block">{words.struckBecause({ reason: item.struckReason })}</span>
            )}
          </span>
          {onStrike ? (
            <span className="row row-wrap">
              {item.kind === 'observation' ? (
                <Link
                  className="btn btn-small"
                  to={`${paths.observe(String(item.body['enclosure']))}?mend=${item.id}`}
                >
                  {words.mend}
                </Link>
              ) : (
                <Button
                  size="small"
                  onClick={() => void outbox.mend(item.id, item.body).then(() => outbox.flush(item.personId))}
                >
                  {words.tryAgain}
                </Button>
              )}
              <Button size="small" onClick={() => onStrike(item)}>
                {words.strike}
              </Button>
            </span>
          ) : null}
        </div>
      ))}
    </section>
  )
}

const kindWords: Readonly<Record<string, () => string>> = {
  hold: () => words.kindHold,
  telephoned: () => words.kindTelephoned,
  'bath-stop': () => words.kindBathStop,
  'order-hold': () => words.kindOrderHold,
}

const kindOf = ({ kind }: OutboxItem): string => kindWords[kind]?.() ?? words.kindObservation

/** What a person wrote with a stop or a hold. */
function writtenWith({ kind, body }: OutboxItem): string {
  if (kind !== 'bath-stop' && kind !== 'order-hold') return ''
  return [body['seen'], body['rescue'], body['reason']].filter((text) => typeof text === 'string').join('. ')
}
