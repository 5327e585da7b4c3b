import { useState } from 'react'
import type { enterResult } from '../../../shared/contracts/case-events.contract.ts'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { instantOfMoment } from '../../lib/local-moment.ts'
import { newId } from '../../lib/new-id.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { MomentField } from '../../ui/moment-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { RecordDialog } from '../animals/index.ts'
import { useEnterResult } from './mutations.ts'

type Given = BodyOf<typeof enterResult>

/** The result of a sample. The day on which it was taken is what counts; a positive one is named. */
export function ResultDialog({ of: detail, onBack }: { of: CaseDetail; onBack: () => void }) {
  const when = useMoment()
  const enter = useEnterResult(detail.number)
  const refusal = useRefusal()
  const toast = useToast()
  const [id] = useState(newId)
  const [testKey, setTestKey] = useState('')
  const [result, setResult] = useState<Given['result'] | null>(null)
  const [taken, setTaken] = useState('')
  const [pathogen, setPathogen] = useState('')
  const [status, setStatus] = useState<NonNullable<Given['pathogenStatus']> | null>(null)
  const [note, setNote] = useState('')
  const tests = Object.entries(detail.names.tests)
  const takenAt = instantOfMoment(taken, when.zone)
  const positive = result === 'positive'
  const unsaid = positive && (typedText(pathogen) === undefined || status === null)

  const send = async () => {
    if (result === null || takenAt === null || when.instant === null) return
    const body: Given = {
      id,
      testKey,
      result,
      takenAt,
      happenedAt: when.instant,
      note: typedText(note),
      ...(positive && status !== null ? { pathogenName: typedText(pathogen), pathogenStatus: status } : {}),
    }
    if (!(await refusal.attempt(() => enter.mutateAsync(body)))) return
    toast({ words: words.recorded({ number: detail.number }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.resultQuestion({ number: detail.number })}
      act={words.resultAct}
      shut={
        testKey === '' || result === null
          ? words.chooseKind
          : takenAt === null || unsaid
            ? words.typeWords
            : when.missing
      }
      busy={refusal.busy}
      refused={refusal.general(['/happenedAt', '/takenAt', '/pathogenName'])}
      typed={testKey !== '' || note !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      {tests.length === 0 ? <p className="t-2">{words.noTests}</p> : null}
      <SelectField
        label={words.resultTest}
        options={tests.map(([value, label]) => ({ value, label }))}
        value={testKey}
        onChange={({ target }) => setTestKey(target.value)}
      />
      <ChoiceField
        label={words.resultWhich}
        segments={[
          { value: 'negative', label: words.negative },
          { value: 'positive', label: words.positive },
          { value: 'inconclusive', label: words.inconclusive },
          { value: 'insufficient', label: words.insufficient },
        ]}
        value={result}
        onChange={setResult}
      />
      {positive ? (
        <>
          <TextField
            label={words.pathogen}
            value={pathogen}
            maxLength={120}
            wrong={refusal.at('/pathogenName')}
            onChange={({ target }) => setPathogen(target.value)}
          />
          <ChoiceField
            label={words.pathogenStatus}
            segments={[
              { value: 'listed', label: words.listed },
              { value: 'facility-critical', label: words.critical },
              { value: 'other', label: words.neither },
            ]}
            value={status}
            onChange={setStatus}
          />
        </>
      ) : null}
      <MomentField label={words.takenAt} value={taken} wrong={refusal.at('/takenAt')} onChange={setTaken} />
      <MomentField
        label={words.reportedAt}
        value={when.moment}
        wrong={when.missing ?? refusal.at('/happenedAt')}
        onChange={when.setMoment}
      />
      <TextareaField
        label={words.note}
        optional
        value={note}
        maxLength={2000}
        rows={2}
        onChange={({ target }) => setNote(target.value)}
      />
    </RecordDialog>
  )
}
