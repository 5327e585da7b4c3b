import { useState } from 'react'
import { useQuery, useQueryClient } from '@tanstack/react-query'
import { useNavigate, useSearchParams } from 'react-router-dom'
import { observationWords as words } from '../../../shared/messages/observation-screens.ts'
import { useFacilityNow } from '../../lib/facility-time.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { enterAndSend } from '../../lib/enter-and-send.ts'
import { newId } from '../../lib/new-id.ts'
import { outbox } from '../../lib/outbox.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { thisDevice } from '../../lib/this-device.ts'
import { useOutbox } from '../../lib/use-outbox.ts'
import { Button } from '../../ui/button.tsx'
import { FlagWords } from '../../ui/flag-mark.tsx'
import { PhoneSheet } from '../../ui/phone-frame.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { entries } from './entries.ts'
import { HoldQuestion, UrgentQuestion } from './observation-questions.tsx'
import { RoundFields, WordsFields } from './observation-fields.tsx'
import { bodyOf, draftOf, emptyDraft, isWorthSaving, saysWhatIsSeen } from './observation-draft.ts'
import type { ObservationBody, ObservationDraft } from './observation-draft.ts'
import { onCallQuery, roundQuery } from './queries.ts'
import { SignalBanner } from './signal-banner.tsx'

/**
 * What a keeper sees at one enclosure. The entry is kept on the device before anything is sent, so that neither a lost
 * signal nor a closed page loses it. With `?mend=id` it opens on an entry that the server did not take.
 */
export function ObservationSheet({ code }: { code: string }) {
  const [search] = useSearchParams()
  const { refused } = useOutbox()
  const mended = refused.find((item) => item.id === search.get('mend') && item.kind === 'observation')
  return (
    <ObservationForm
      key={mended?.id ?? code}
      code={code}
      mended={mended?.body as ObservationBody | undefined}
    />
  )
}

function ObservationForm({ code, mended }: { code: string; mended: ObservationBody | undefined }) {
  const me = useMe()
  const { zone } = me.facility
  const now = useFacilityNow(zone)
  const client = useQueryClient()
  const navigate = useNavigate()
  const toast = useToast()
  const mayRecord = useMay('observation.record')
  const mayHold = useMay('case.hold')
  const { data: round } = useQuery(roundQuery)
  // read here so that the numbers are on this device before they are needed
  useQuery(onCallQuery)
  const [draft, setDraft] = useState<ObservationDraft>(() => (mended ? draftOf(mended) : emptyDraft))
  const [asking, setAsking] = useState<'urgent' | 'hold' | null>(null)
  const [busy, setBusy] = useState(false)

  const place = round?.value.rows.find((row) => row.enclosure === code)
  const held = place?.cases.find((one) => one.held)
  const first = held ?? place?.cases[0]
  const label = [code, first?.name ?? place?.name].filter(Boolean).join(' ')
  const flagOnly = !mayRecord.allowed
  const ready = flagOnly ? saysWhatIsSeen(draft) && draft.forVeterinarian : isWorthSaving(draft)

  const save = async (said: ObservationDraft, urgent: boolean) => {
    if (busy) return
    setBusy(true)
    const happenedAt = mended?.happenedAt ?? new Date().toISOString()
    const body = bodyOf(said, {
      id: mended?.id ?? newId(),
      enclosure: code,
      happenedAt,
      device: thisDevice(),
      online: navigator.onLine && mended === undefined,
      urgent,
      newId,
    })
    if (urgent && body.noticeId) {
      // the call is shown from the first moment; what becomes of it is said there
      await outbox.enter(entries.observation(me.id, label, body))
      void outbox.flush(me.id)
      await navigate(paths.urgentCall(body.noticeId))
      return
    }
    const fate = await enterAndSend(client, entries.observation(me.id, label, body))
    if (fate === 'sent')
      toast({ words: words.recorded({ code, at: sayMoment(happenedAt, zone, happenedAt) }) })
    await navigate(fate === 'refused' ? paths.unsent() : paths.rounds())
  }

  const hold = async (number: string) => {
    setAsking(null)
    const fate = await enterAndSend(client, entries.hold(me.id, number, undefined))
    if (fate === 'refused') await navigate(paths.unsent())
    else toast({ words: fate === 'sent' ? words.holdDone({ number }) : words.holdKept({ number }) })
  }

  return (
    <PhoneSheet
      back={{ to: paths.rounds(), label: words.back }}
      title={label}
      under={
        place?.lastLookAt
          ? words.lastLook({
              at: sayMoment(place.lastLookAt, zone, new Date().toISOString()),
              looks: place.looksToday,
            })
          : place
            ? words.neverLooked
            : undefined
      }
      flag={
        first ? (
          <FlagWords flag={first.held ? 'L' : 'Q'}>
            {first.held ? words.held : first.dayNumber === null ? '' : words.dayOf({ day: first.dayNumber })}
          </FlagWords>
        ) : undefined
      }
      banner={<SignalBanner />}
      foot={
        <>
          <div className="observe-foot">
            <Button
              kind="urgent"
              size="touch"
              onClick={() => (saysWhatIsSeen(draft) ? void save(draft, true) : setAsking('urgent'))}
            >
              {words.urgent}
            </Button>
            {place && place.cases.length > 0 && mayHold.allowed ? (
              <Button kind="hold" size="touch" onClick={() => setAsking('hold')}>
                {words.hold}
              </Button>
            ) : (
              <span />
            )}
            <Button
              kind="primary"
              size="touch"
              disabled={busy || !ready}
              onClick={() => void save(draft, false)}
            >
              {words.save({ at: now.time })}
            </Button>
          </div>
          <p className="hint text-center">
            {ready ? words.keptUntilSent : flagOnly ? words.flagFirst : words.sayOne}
          </p>
        </>
      }
    >
      {mended ? (
        <p className="t-strong" role="status">
          {words.mending}
        </p>
      ) : null}
      {round && !place ? <p className="t-2">{words.unknownPlace}</p> : null}
      {round?.old && place ? (
        <p className="t-note">
          {words.oldRound({ at: sayMoment(round.at, zone, new Date().toISOString()) })}
        </p>
      ) : null}
      {flagOnly ? (
        <p>{words.flagOnly}</p>
      ) : (
        <RoundFields draft={draft} onChange={setDraft} animals={place?.animals ?? []} />
      )}
      <WordsFields draft={draft} onChange={setDraft} />
      {asking === 'urgent' ? (
        <UrgentQuestion
          onBack={() => setAsking(null)}
          onCall={(seen) => {
            const said = { ...draft, words: seen }
            setDraft(said)
            setAsking(null)
            void save(said, true)
          }}
        />
      ) : null}
      {asking === 'hold' && place ? (
        <HoldQuestion
          numbers={place.cases.map((one) => one.number)}
          onBack={() => setAsking(null)}
          onHold={(number) => void hold(number)}
        />
      ) : null}
    </PhoneSheet>
  )
}
