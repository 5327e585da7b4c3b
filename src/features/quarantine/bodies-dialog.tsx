import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import type { Observation } from '../../../shared/contracts/observations.contract.ts'
import { observationForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { newId } from '../../lib/new-id.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { typedText } from '../../lib/typed-text.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Stepper } from '../../ui/stepper.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { inhabitantsQuery, RecordDialog, shortestReason } from '../animals/index.ts'
import { useNameBodies } from './mutations.ts'

/** Says whose the bodies were that an observation could not name. Who was there then is offered. */
export function BodiesDialog({ observation, onBack }: { observation: Observation; onBack: () => void }) {
  const { id: observationId, enclosure, happenedAt, bodiesToName } = observation
  const name = useNameBodies(observationId)
  const here = useQuery(inhabitantsQuery(enclosure, happenedAt))
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [deathIds] = useState(() => new Map<string, string>())
  const [counts, setCounts] = useState<Readonly<Record<string, number>>>({})
  const [reason, setReason] = useState('')
  const named = Object.values(counts).reduce((sum, count) => sum + count, 0)
  const left = bodiesToName - named

  /** One id for each animal, so that the form sent again names nobody twice. */
  const deathIdOf = (accession: string) => {
    const known = deathIds.get(accession) ?? newId()
    deathIds.set(accession, known)
    return known
  }

  const send = async () => {
    const deaths = Object.entries(counts)
      .filter(([, count]) => count > 0)
      .map(([accession, count]) => ({ id: deathIdOf(accession), accession, count }))
    const body = { id, deaths, reason: typedText(reason) }
    if (!(await refusal.attempt(() => name.mutateAsync(body)))) return
    toast({ words: words.bodiesRecorded })
    onBack()
  }

  return (
    <RecordDialog
      question={words.bodiesQuestion({ enclosure })}
      act={words.bodiesAct}
      shut={
        left < 0
          ? words.tooManyNamed
          : left > 0 && reason.trim().length < shortestReason
            ? words.nameOrExplain
            : undefined
      }
      busy={refusal.busy}
      refused={refusal.general(['/reason'])}
      typed={named > 0 || reason !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <p role="status">{words.bodiesLeft({ count: Math.max(0, left) })}</p>
      <QueryStanding query={here} what={words.whoWasThere} rows={2} />
      {(here.data?.rows ?? []).map((row) => (
        <Stepper
          key={row.id}
          label={words.bodiesOf({ accession: row.accession, animal: row.name ?? row.taxon.commonName })}
          value={counts[row.accession] ?? null}
          onChange={(next) => setCounts({ ...counts, [row.accession]: next })}
          max={bodiesToName}
        />
      ))}
      <TextareaField
        label={words.bodiesReason}
        hint={words.bodiesReasonHint}
        rows={2}
        maxLength={2000}
        value={reason}
        wrong={refusal.at('/reason')}
        onChange={({ target }) => setReason(target.value)}
      />
    </RecordDialog>
  )
}
