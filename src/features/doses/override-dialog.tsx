import { useState } from 'react'
import { PenLine } from 'lucide-react'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { overrideWords as words } from '../../../shared/messages/doses-screens.ts'
import { newId } from '../../lib/new-id.ts'
import { useMay } from '../../lib/may.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { PasswordField } from '../../ui/password-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { SignerLines, useSigner } from '../licences/index.ts'
import { useOverrideStop } from './mutations.ts'

type Stop = BathSheet['cautions'][number]

const shortest = 3

/** The way to override an open stop for this dose, for a veterinarian; nothing for anybody else. */
export function OverrideAct({ sheet, stop }: { sheet: BathSheet; stop: Stop }) {
  const may = useMay('caution.override')
  const [asked, setAsked] = useState(false)
  if (stop.finding === null || !sheet.may.includes('caution.override')) return null
  return (
    <>
      <Button icon={PenLine} shut={may.allowed ? false : (may.why ?? '')} onClick={() => setAsked(true)}>
        {words.act}
      </Button>
      {asked ? <OverrideDialog sheet={sheet} stop={stop} onBack={() => setAsked(false)} /> : null}
    </>
  )
}

/** Signs an override: what stops, why it is given all the same, and the password again. */
function OverrideDialog({ sheet, stop, onBack }: { sheet: BathSheet; stop: Stop; onBack: () => void }) {
  const signer = useSigner()
  const may = useMay('caution.override')
  const override = useOverrideStop({ number: sheet.number, key: sheet.key })
  const refusal = useRefusal()
  const say = useToast()
  // what is signed is what stood there when it was asked for, whatever the sheet says by then
  const [asked] = useState(() => ({ stop, lotId: sheet.lotId }))
  const [reason, setReason] = useState('')
  const [password, setPassword] = useState('')
  const [isMissing, setMissing] = useState(false)
  const send = async () => {
    const { ruleId, code, finding } = asked.stop
    const typed = reason.trim()
    if (typed.length < shortest || password === '' || finding === null) return setMissing(true)
    setMissing(false)
    const done = await refusal.attempt(() =>
      override.mutateAsync({
        commandKey: newId(),
        password,
        licenceId: signer.licenceId,
        ruleId,
        code,
        finding,
        lotId: asked.lotId,
        reason: typed,
      }),
    )
    // a password is typed for one attempt
    setPassword('')
    if (!done) return signer.readAgain()
    say({ words: words.done })
    onBack()
  }
  return (
    <Dialog
      question={words.question}
      typed={reason !== ''}
      onBack={onBack}
      acts={
        <>
          <Button
            kind="primary"
            size="touch"
            icon={PenLine}
            disabled={refusal.busy}
            shut={signer.shut ?? false}
            onClick={() => void send()}
          >
            {words.sign}
          </Button>
          <Button size="touch" onClick={onBack}>
            {words.back}
          </Button>
        </>
      }
    >
      <div className="stack">
        <p>
          <b>{asked.stop.title}.</b> {asked.stop.text}
        </p>
        <p>{words.body}</p>
        <WrongSummary fields={[]} general={refusal.general(['/password', '/reason'])} />
        <TextareaField
          label={words.reason}
          rows={3}
          maxLength={2000}
          value={reason}
          wrong={isMissing && reason.trim().length < shortest ? formWords.needed : refusal.at('/reason')}
          onChange={(event) => setReason(event.target.value)}
        />
        <div className="signature-who">
          <SignerLines signer={signer} may={may} />
        </div>
        {signer.lockedUntil === null ? (
          <PasswordField
            label={words.password}
            autoComplete="off"
            value={password}
            wrong={refusal.at('/password') ?? (isMissing && password === '' ? formWords.needed : undefined)}
            onChange={(event) => setPassword(event.target.value)}
          />
        ) : null}
      </div>
    </Dialog>
  )
}
