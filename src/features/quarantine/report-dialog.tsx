import { useState } from 'react'
import type { reportEvent } from '../../../shared/contracts/case-events.contract.ts'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { RecordDialog, WhenField } from '../animals/index.ts'
import { useReportEvent } from './mutations.ts'

type ReportedEvent = BodyOf<typeof reportEvent>['event']
type Kind = ReportedEvent['kind']

const kinds: readonly { value: Kind; label: () => string }[] = [
  { value: 'addition', label: () => words.addition },
  { value: 'breach', label: () => words.breach },
  { value: 'clinical-signs', label: () => words.signs },
  { value: 'not-feeding', label: () => words.notFeeding },
  { value: 'feeding', label: () => words.feeding },
  { value: 'pause-started', label: () => words.fault },
  { value: 'pause-ended', label: () => words.faultOver },
]

/** What has been chosen and typed so far; null is "not said". */
export interface ReportDraft {
  kind: Kind | null
  what: 'wet-material' | 'undisinfected-gear' | null
  into: 'same-water' | 'connected-water' | 'same-room' | null
  how: 'escape' | 'splash' | 'net' | 'other' | null
  otherUnitStatus: 'lower' | 'same-or-higher' | null
  text: string
  cause: 'life-support-failure' | 'temperature-out-of-range' | null
  pauseId: string | null
}

export const emptyReport: ReportDraft = {
  kind: null,
  what: null,
  into: null,
  how: null,
  otherUnitStatus: null,
  text: '',
  cause: null,
  pauseId: null,
}

/** The event as it is sent; null while something that it needs has not been said. */
export function reportedEvent(draft: ReportDraft): ReportedEvent | null {
  const text = typedText(draft.text)
  const { kind, what, into, how, otherUnitStatus, cause, pauseId } = draft
  switch (kind) {
    case 'addition':
      return what && into ? { kind, what, into } : null
    case 'breach':
      return how && otherUnitStatus ? { kind, how, otherUnitStatus } : null
    case 'clinical-signs':
      return text ? { kind, signs: text } : null
    case 'not-feeding':
    case 'feeding':
      return text ? { kind, subject: text } : null
    case 'pause-started':
      return cause ? { kind, cause } : null
    case 'pause-ended':
      return pauseId ? { kind, pauseId } : null
    default:
      return null
  }
}

/** Reports something that the clock goes by. What it does is the server's to work out, and the sheet's to explain. */
export function ReportDialog({
  of: detail,
  zone,
  onBack,
}: {
  of: CaseDetail
  zone: string
  onBack: () => void
}) {
  const when = useMoment()
  const report = useReportEvent(detail.number)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [draft, setDraft] = useState(emptyReport)
  const [note, setNote] = useState('')
  const set = (change: Partial<ReportDraft>) => setDraft((before) => ({ ...before, ...change }))
  const event = reportedEvent(draft)
  const pausing = detail.runningPauses.length > 0

  const send = async () => {
    if (event === null || when.instant === null) return
    const happenedAt = when.instant
    const done = await refusal.attempt(() =>
      report.mutateAsync({ id, event, happenedAt, note: typedText(note) }),
    )
    if (!done) return
    toast({ words: words.recorded({ number: detail.number }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.reportQuestion({ number: detail.number })}
      act={words.reportAct}
      shut={draft.kind === null ? words.chooseFirst : event === null ? words.chooseKind : when.missing}
      busy={refusal.busy}
      refused={refusal.general(['/happenedAt'])}
      typed={draft.kind !== null}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <SelectField
        label={words.reportWhat}
        hint={words.deathsElsewhere}
        options={kinds
          .filter(({ value }) => value !== 'pause-ended' || pausing)
          .map(({ value, label }) => ({ value, label: label() }))}
        value={draft.kind ?? ''}
        onChange={({ target }) =>
          setDraft({ ...emptyReport, kind: kinds.find(({ value }) => value === target.value)?.value ?? null })
        }
      />
      <EventFields draft={draft} detail={detail} zone={zone} onChange={set} />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
      <TextareaField
        label={words.note}
        optional
        hint={words.whatItDoes}
        value={note}
        maxLength={2000}
        rows={2}
        onChange={({ target }) => setNote(target.value)}
      />
    </RecordDialog>
  )
}

function EventFields({
  draft,
  detail,
  zone,
  onChange,
}: {
  draft: ReportDraft
  detail: CaseDetail
  zone: string
  onChange: (change: Partial<ReportDraft>) => void
}) {
  switch (draft.kind) {
    case 'addition':
      return (
        <>
          <ChoiceField
            label={words.additionWhat}
            segments={[
              { value: 'wet-material', label: words.wetMaterial },
              { value: 'undisinfected-gear', label: words.gear },
            ]}
            value={draft.what}
            onChange={(what) => onChange({ what })}
          />
          <ChoiceField
            label={words.additionInto}
            segments={[
              { value: 'same-water', label: words.sameWater },
              { value: 'connected-water', label: words.connectedWater },
              { value: 'same-room', label: words.sameRoom },
            ]}
            value={draft.into}
            onChange={(into) => onChange({ into })}
          />
        </>
      )
    case 'breach':
      return (
        <>
          <ChoiceField
            label={words.breachHow}
            segments={[
              { value: 'escape', label: words.escape },
              { value: 'splash', label: words.splash },
              { value: 'net', label: words.net },
              { value: 'other', label: words.other },
            ]}
            value={draft.how}
            onChange={(how) => onChange({ how })}
          />
          <ChoiceField
            label={words.otherUnit}
            segments={[
              { value: 'lower', label: words.lower },
              { value: 'same-or-higher', label: words.sameOrHigher },
            ]}
            value={draft.otherUnitStatus}
            onChange={(otherUnitStatus) => onChange({ otherUnitStatus })}
          />
        </>
      )
    case 'clinical-signs':
    case 'not-feeding':
    case 'feeding':
      return (
        <TextField
          label={draft.kind === 'clinical-signs' ? words.signsSeen : words.subject}
          value={draft.text}
          maxLength={2000}
          onChange={({ target }) => onChange({ text: target.value })}
        />
      )
    case 'pause-started':
      return (
        <ChoiceField
          label={words.faultWhat}
          segments={[
            { value: 'life-support-failure', label: words.lifeSupport },
            { value: 'temperature-out-of-range', label: words.temperature },
          ]}
          value={draft.cause}
          onChange={(cause) => onChange({ cause })}
        />
      )
    case 'pause-ended':
      return (
        <SelectField
          label={words.whichPause}
          options={detail.runningPauses.map(({ pauseId, since, cause }) => ({
            value: pauseId,
            label: `${cause === 'temperature-out-of-range' ? words.temperature : words.lifeSupport}, ${words.pauseSince({ at: sayMoment(since, zone, detail.asOf) })}`,
          }))}
          value={draft.pauseId ?? ''}
          onChange={({ target }) => onChange({ pauseId: target.value || null })}
        />
      )
    default:
      return null
  }
}
