import { useState } from 'react'
import { BadgeCheck } from 'lucide-react'
import type { ListedParameter, ParameterVersion } from '../../../shared/contracts/caution-rules.contract.ts'
import type { CautionRuleId } from '../../../shared/domain/cautions/caution-rule.ts'
import { ruleSheetWords as words } from '../../../shared/messages/caution-rules-sheet.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { PasswordField } from '../../ui/password-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { SignerLines, useSigner } from '../licences/index.ts'
import { useConfirm } from './mutations.ts'
import { needsJurisdiction } from './rules-model.ts'

const shortestReason = 3

/** Signs a proposed value into force: how it was checked, for which jurisdiction where it loosens one of a source, and the password. */
export function ConfirmDialog({
  ruleId,
  parameter,
  proposal: given,
  onBack,
}: {
  ruleId: CautionRuleId
  parameter: ListedParameter
  proposal: ParameterVersion
  onBack: () => void
}) {
  const { zone } = useMe().facility
  // what is confirmed is what stood there when it was asked for
  const [proposal] = useState(given)
  const confirm = useConfirm({ ruleId, key: parameter.key, proposalId: proposal.id })
  const signer = useSigner()
  const may = useMay('formulary.confirm')
  const refusal = useRefusal()
  const say = useToast()
  const [reason, setReason] = useState('')
  const [jurisdiction, setJurisdiction] = useState('')
  const [password, setPassword] = useState('')
  const [isMissing, setMissing] = useState(false)
  const asksWhere = needsJurisdiction(parameter, proposal)
  const missing = (isGiven: boolean) => (isMissing && !isGiven ? formWords.needed : undefined)
  const has = {
    reason: reason.trim().length >= shortestReason,
    jurisdiction: !asksWhere || jurisdiction.trim() !== '',
    password: password !== '',
  }
  const send = async () => {
    if (!has.reason || !has.jurisdiction || !has.password) return setMissing(true)
    setMissing(false)
    const where = asksWhere ? { jurisdiction: jurisdiction.trim() } : {}
    const done = await refusal.attempt(() =>
      confirm.mutateAsync({
        key: newId(),
        password,
        licenceId: signer.licenceId,
        reason: reason.trim(),
        ...where,
      }),
    )
    // a password is typed for one attempt
    setPassword('')
    if (!done) return signer.readAgain()
    say({ words: words.confirmed })
    onBack()
  }
  return (
    <Dialog
      question={words.confirmQuestion({ rule: ruleId, name: parameter.label, value: proposal.text })}
      typed={reason !== '' || jurisdiction !== ''}
      onBack={onBack}
      acts={
        <>
          <Button
            kind="primary"
            icon={BadgeCheck}
            disabled={refusal.busy}
            shut={signer.shut ?? false}
            onClick={() => void send()}
          >
            {words.confirm}
          </Button>
          <Button onClick={onBack}>{words.back}</Button>
        </>
      }
    >
      <div className="stack">
        <p>
          {words.waiting({
            value: proposal.text,
            by: proposal.proposedBy,
            at: sayInstant(proposal.proposedAt, zone),
            why: proposal.reason,
          })}
        </p>
        <p>{words.confirmBody({ now: parameter.valueText })}</p>
        {proposal.loosens ? <p className="t-strong">{words.confirmLoosens}</p> : null}
        <WrongSummary
          fields={[]}
          general={refusal.general(['/reason', '/password', ...(asksWhere ? ['/jurisdiction'] : [])])}
        />
        {asksWhere ? (
          <>
            <p>{words.confirmLegal}</p>
            <TextField
              label={words.jurisdiction}
              hint={words.jurisdictionHint}
              maxLength={100}
              value={jurisdiction}
              wrong={refusal.at('/jurisdiction') ?? missing(has.jurisdiction)}
              onChange={(event) => setJurisdiction(event.target.value)}
            />
          </>
        ) : null}
        <TextareaField
          label={words.confirmReason}
          maxLength={2000}
          value={reason}
          wrong={refusal.at('/reason') ?? missing(has.reason)}
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
            wrong={refusal.at('/password') ?? missing(has.password)}
            onChange={(event) => setPassword(event.target.value)}
          />
        ) : null}
      </div>
    </Dialog>
  )
}
