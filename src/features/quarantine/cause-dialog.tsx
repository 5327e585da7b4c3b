import { useState } from 'react'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { deathFindingWords } from '../../../shared/messages/quarantine-case.ts'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { useMay } from '../../lib/may.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { PasswordField } from '../../ui/password-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { RecordDialog, shortestReason } from '../animals/index.ts'
import { SignerLines, useSigner } from '../licences/index.ts'
import { useSignDeathCause } from './mutations.ts'

type Death = CaseDetail['deaths'][number]
const findings = ['explained-not-transmissible', 'explained-transmissible', 'unexplained'] as const

/** Signs the cause of a death; explained and not transmissible takes its extension away. */
export function CauseDialog({ number, death, onBack }: { number: string; death: Death; onBack: () => void }) {
  const sign = useSignDeathCause(number, death.eventId)
  const signer = useSigner()
  const may = useMay('necropsy.sign')
  const refusal = useRefusal()
  const toast = useToast()
  const [finding, setFinding] = useState<Death['finding'] | null>(null)
  const [cause, setCause] = useState('')
  const [password, setPassword] = useState('')

  const send = async () => {
    if (finding === null) return
    const done = await refusal.attempt(() =>
      sign.mutateAsync({
        key: newId(),
        body: { finding, cause: cause.trim(), password, licenceId: signer.licenceId },
      }),
    )
    setPassword('')
    if (!done) return signer.readAgain()
    toast({ words: words.recorded({ number }) })
    onBack()
  }

  return (
    <RecordDialog
      question={words.causeQuestion({ on: sayDate(death.on) })}
      act={words.causeAct}
      shut={
        finding === null
          ? words.chooseKind
          : cause.trim().length < shortestReason
            ? words.typeWords
            : (signer.shut ?? (password === '' ? words.typePassword : undefined))
      }
      busy={refusal.busy}
      refused={refusal.general([])}
      typed={finding !== null || cause !== ''}
      onRecord={() => void send()}
      onBack={onBack}
    >
      <SelectField
        label={words.causeFinding}
        options={findings.map((value) => ({ value, label: deathFindingWords[value] }))}
        value={finding ?? ''}
        onChange={({ target }) => setFinding(findings.find((one) => one === target.value) ?? null)}
      />
      <TextareaField
        label={words.causeWords}
        value={cause}
        maxLength={500}
        rows={2}
        onChange={({ target }) => setCause(target.value)}
      />
      <div className="signature-who">
        <SignerLines signer={signer} may={may} />
      </div>
      {signer.lockedUntil === null ? (
        <PasswordField
          label={words.password}
          hint={words.passwordHint}
          autoComplete="off"
          value={password}
          onChange={({ target }) => setPassword(target.value)}
        />
      ) : null}
    </RecordDialog>
  )
}
