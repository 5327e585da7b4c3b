import { useState } from 'react'
import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import * as contracts from '../../../shared/contracts/adverse-events.contract.ts'
import type { AdverseEvent } from '../../../shared/contracts/adverse-events.contract.ts'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { adverseWords as words } from '../../../shared/messages/adverse-events.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { api } from '../../lib/api-client.ts'
import { useMay } from '../../lib/may.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { CautionBlock } from '../../ui/caution-block.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'

const shortest = 3
const adverseKey = ['adverse-events'] as const
const adverseQuery = (number: string) =>
  queryOptions({
    queryKey: [...adverseKey, number],
    queryFn: ({ signal }) => api(contracts.listAdverseEvents, { params: { number }, signal }),
  })

/** An event holds the doses of its order: everything about orders and doses is read again. */
function useAdverseMutation<V>(call: (variables: V) => Promise<unknown>) {
  const client = useQueryClient()
  return useMutation({ mutationFn: call, onSuccess: () => client.invalidateQueries() })
}

/** What went wrong under an order: recorded by whoever saw it, reviewed by a veterinarian. */
export function AdverseEvents({
  number,
  doseKey,
  zone,
}: {
  number: string
  /** The dose that is looked at; null on the page of the order. */
  doseKey: string | null
  zone: string
}) {
  const { data } = useQuery(adverseQuery(number))
  const mayRecord = useMay('adverse-event.record').allowed
  const mayReview = useMay('adverse-event.review').allowed
  const rows = data?.rows ?? []
  return (
    <section className="stack" aria-labelledby="adverse-events">
      <h2 id="adverse-events" className="t-head">
        {words.heading}
      </h2>
      {data && rows.length === 0 ? <p className="t-2">{words.none}</p> : null}
      {rows.map((event) => (
        <OneEvent key={event.id} number={number} event={event} zone={zone} mayReview={mayReview} />
      ))}
      {mayRecord ? <RecordForm key={String(rows.length)} number={number} doseKey={doseKey} /> : null}
    </section>
  )
}

function OneEvent({
  number,
  event,
  zone,
  mayReview,
}: {
  number: string
  event: AdverseEvent
  zone: string
  mayReview: boolean
}) {
  const said = [
    words.seenAt({ at: sayInstant(event.happenedAt, zone), by: event.recordedBy }),
    event.doseKey === null ? '' : words.afterDose({ key: event.doseKey }),
    event.affectedCount === null ? '' : words.affected({ count: event.affectedCount }),
  ].filter((part) => part !== '')
  const { review } = event
  if (review)
    return (
      <div>
        <p>{event.seen}</p>
        <p className="t-note">{said.join('; ')}</p>
        <p>{review.finding}</p>
        <p className="t-note">{words.reviewed({ by: review.by, at: sayInstant(review.at, zone) })}</p>
      </div>
    )
  return (
    <CautionBlock level="stop" title={event.seen}>
      <p className="t-note">{said.join('; ')}</p>
      <p>{words.holds}</p>
      {mayReview ? <ReviewForm number={number} eventId={event.id} /> : null}
    </CautionBlock>
  )
}

function ReviewForm({ number, eventId }: { number: string; eventId: string }) {
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [finding, setFinding] = useState('')
  const review = useAdverseMutation((body: BodyOf<typeof contracts.reviewAdverseEvent>) =>
    api(contracts.reviewAdverseEvent, { params: { number, eventId }, body }),
  )
  const send = async () => {
    if (!(await refusal.attempt(() => review.mutateAsync({ id, finding: finding.trim() })))) return
    toast({ words: words.reviewedNow })
  }
  return (
    <div className="stack">
      <TextareaField
        label={words.finding}
        rows={2}
        maxLength={2000}
        value={finding}
        wrong={refusal.at('/finding') ?? refusal.general(['/finding'])}
        onChange={(event) => setFinding(event.target.value)}
      />
      <Button
        size="small"
        disabled={finding.trim().length < shortest || refusal.busy}
        onClick={() => void send()}
      >
        {words.review}
      </Button>
    </div>
  )
}

function RecordForm({ number, doseKey }: { number: string; doseKey: string | null }) {
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [seen, setSeen] = useState('')
  const [count, setCount] = useState('')
  const record = useAdverseMutation((body: BodyOf<typeof contracts.recordAdverseEvent>) =>
    api(contracts.recordAdverseEvent, { params: { number }, body }),
  )
  const send = async () => {
    const body = {
      id,
      doseKey,
      seen: seen.trim(),
      affectedCount: count.trim() === '' ? null : Number(count),
      happenedAt: new Date().toISOString(),
    }
    if (!(await refusal.attempt(() => record.mutateAsync(body)))) return
    toast({ words: words.recorded })
  }
  const isCount = /^\d{0,8}$/.test(count.trim())
  return (
    <details className="fold">
      <summary>{words.record}</summary>
      <div className="stack">
        <TextareaField
          label={words.seen}
          hint={words.seenHint}
          rows={2}
          maxLength={2000}
          value={seen}
          wrong={refusal.at('/seen') ?? refusal.general(['/seen', '/affectedCount'])}
          onChange={(event) => setSeen(event.target.value)}
        />
        <TextField
          label={words.count}
          hint={words.countHint}
          optional
          inputMode="numeric"
          value={count}
          maxLength={8}
          wrong={isCount ? refusal.at('/affectedCount') : words.countHint}
          onChange={(event) => setCount(event.target.value)}
        />
        <Button
          disabled={seen.trim().length < shortest || !isCount || refusal.busy}
          onClick={() => void send()}
        >
          {words.recordIt}
        </Button>
      </div>
    </details>
  )
}
