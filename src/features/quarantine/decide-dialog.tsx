import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import type { decideEvent } from '../../../shared/contracts/case-events.contract.ts'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { ProtocolVersion } from '../../../shared/contracts/protocols.contract.ts'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { extensionKindWords } from '../../../shared/messages/quarantine.ts'
import { caseEventWords } from '../../../shared/messages/quarantine-case.ts'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { newId } from '../../lib/new-id.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { SelectField } from '../../ui/select-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { RecordDialog, shortestReason, WhenField } from '../animals/index.ts'
import { useDecideEvent } from './mutations.ts'
import { protocolsQuery } from './queries.ts'

type Decision = BodyOf<typeof decideEvent>['decision']

export interface DecisionOption {
  value: string
  label: string
  decision: Decision
}

/** Every decision that a veterinarian can take about this case as it stands, each in words. */
export function decisionOptions(detail: CaseDetail, protocols: readonly ProtocolVersion[]): DecisionOption[] {
  const options: Omit<DecisionOption, 'value'>[] = []
  for (const one of detail.extensions.filter(({ state }) => state === 'standing'))
    options.push({
      label: words.endExtension({ what: `${extensionKindWords[one.kind]}, ${sayDate(one.fromOn)}` }),
      decision: { kind: 'extension-ended', extensionEventId: one.eventId },
    })
  for (const { criterionId, name, met, wanted } of detail.criteria.filter((one) => one.wanted === 0))
    options.push({
      label: met ? words.declareNotMet({ name }) : words.declareMet({ name }),
      decision: { kind: 'criterion-declared', criterionId, met: wanted === 0 && !met },
    })
  const journey = new Set(
    detail.reasons.filter(({ code }) => code === 'transport-death').map(({ eventId }) => eventId),
  )
  for (const death of detail.deaths.filter(({ eventId }) => journey.has(eventId)))
    options.push({
      label: words.transportExtends({ on: sayDate(death.on) }),
      decision: { kind: 'transport-death-extends', deathEventId: death.eventId },
    })
  for (const one of protocols.filter(
    ({ current, code, version }) =>
      current && !(code === detail.protocol.code && version === detail.protocol.version),
  ))
    options.push({
      label: words.changeProtocol({ name: `${one.code}, ${one.name}` }),
      decision: { kind: 'protocol-changed', protocolVersionId: one.id },
    })
  for (const event of detail.events.filter((one) => one.voidedReason === null && voidable.has(one.kind)))
    options.push({
      label: words.voidEvent({ what: caseEventWords[event.kind] ?? event.kind, on: sayDate(event.on) }),
      decision: { kind: 'voided', voidsEventId: event.id },
    })
  return options.map((option, i) => ({ ...option, value: String(i) }))
}

/** Events that a person entered here and that can have been a mistake; holds and locks are lifted instead. */
const voidable = new Set([
  'addition',
  'breach',
  'clinical-signs',
  'not-feeding',
  'feeding',
  'pause-started',
  'result',
  'death',
  'criterion-declared',
])

/** A veterinarian's decision about the clock, with its reason. */
export function DecideDialog({ of: detail, onBack }: { of: CaseDetail; onBack: () => void }) {
  const when = useMoment()
  const decide = useDecideEvent(detail.number)
  const refusal = useRefusal()
  const toast = useToast()
  const { data: protocols = [] } = useQuery(protocolsQuery)
  const [id] = useState(newId)
  const [chosen, setChosen] = useState('')
  const [reason, setReason] = useState('')
  const options = decisionOptions(detail, protocols)
  const decision = options.find(({ value }) => value === chosen)?.decision

  const send = async () => {
    if (!decision || when.instant === null) return
    const body = { id, decision, reason: reason.trim(), happenedAt: when.instant }
    if (!(await refusal.attempt(() => decide.mutateAsync(body)))) return
    toast({ words: words.recorded({ number: detail.number }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.decideQuestion({ number: detail.number })}
      act={words.decideAct}
      shut={
        decision === undefined
          ? words.chooseKind
          : reason.trim().length < shortestReason
            ? words.typeReason
            : when.missing
      }
      busy={refusal.busy}
      refused={refusal.general(['/happenedAt'])}
      typed={chosen !== '' || reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <SelectField
        label={words.decideWhat}
        hint={words.whatItDoes}
        options={options}
        value={chosen}
        onChange={({ target }) => setChosen(target.value)}
      />
      <TextareaField
        label={words.reason}
        value={reason}
        maxLength={2000}
        rows={2}
        onChange={({ target }) => setReason(target.value)}
      />
      <WhenField when={when} wrong={refusal.at('/happenedAt')} />
    </RecordDialog>
  )
}
