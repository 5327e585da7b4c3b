import { useState } from 'react'
import { Link, useNavigate } from 'react-router-dom'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { caseWords } from '../../../shared/messages/quarantine-case.ts'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { quarantineWords } from '../../../shared/messages/quarantine-screens.ts'
import { useMay } from '../../lib/may.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { useLeaveGuard } from '../../lib/use-leave-guard.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { Conditions } from '../../ui/condition-row.tsx'
import { FlagWords } from '../../ui/flag-mark.tsx'
import { LeaveQuestion } from '../../ui/leave-question.tsx'
import { PasswordField } from '../../ui/password-field.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { SignatureBlock } from '../../ui/signature-block.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { shortestReason } from '../animals/index.ts'
import { SignerLines, useSigner } from '../licences/index.ts'
import { clearanceConditions } from './before-clearance.tsx'
import { sayUnmet } from './clock-sentences.ts'
import { useClearCase } from './mutations.ts'
import { animalsText, flagOfCase, hasEnded, stateOfCase } from './passage-of-case.ts'

/** The signed end of quarantine. What stands against it is read first; against it only with a reason. */
export function ClearanceForm({ of: detail }: { of: CaseDetail }) {
  const may = useMay('case.clear')
  const fixed = detail.unmet.filter(({ overridable }) => !overridable)
  const stopped = fixed.length > 0 || detail.openDiscrepancies > 0
  const why = hasEnded(detail) ? words.alreadyEnded : may.why
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche
          place={
            <>
              <Link to={paths.quarantine()}>{quarantineWords.title}</Link> /{' '}
              <Link to={paths.quarantineCase(detail.number)}>{detail.number}</Link>
            </>
          }
          title={words.clearTitle({ number: detail.number })}
          source={words.clearSource}
          flag={<FlagWords flag={flagOfCase(detail)}>{stateOfCase(detail)}</FlagWords>}
        />
        <div className="pane">
          <Conditions heading={caseWords.before} conditions={clearanceConditions(detail)} />
        </div>
      </Area>
      <Area className="pane">
        {why !== undefined || stopped ? (
          <div className="stack max-w-[60ch]" role="status">
            <h2 className="t-head">{words.clearCannot}</h2>
            {why === undefined ? null : <p>{why}</p>}
            {fixed.map((one) => (
              <p key={one.code}>{sayUnmet(one, detail.names)}</p>
            ))}
            {detail.openDiscrepancies > 0 ? (
              <p>
                {caseWords.discrepancies({ count: detail.openDiscrepancies })}. {caseWords.discrepanciesKnown}
              </p>
            ) : null}
            <ButtonLink className="justify-self-start" to={paths.quarantineCase(detail.number)}>
              {words.backToCase}
            </ButtonLink>
          </div>
        ) : (
          <SignClearance of={detail} />
        )}
      </Area>
    </Sheet>
  )
}

function SignClearance({ of: detail }: { of: CaseDetail }) {
  const signer = useSigner()
  const may = useMay('case.clear')
  const { number } = detail
  const clear = useClearCase(number)
  const refusal = useRefusal()
  const navigate = useNavigate()
  const toast = useToast()
  const [reason, setReason] = useState('')
  const [password, setPassword] = useState('')
  const { blocker, letGo } = useLeaveGuard(reason.trim() !== '')
  const against = detail.unmet.length > 0
  const shut =
    against && reason.trim().length < shortestReason
      ? words.typeReason
      : (signer.shut ?? (password === '' ? words.typePassword : undefined))

  const send = async () => {
    const body = {
      licenceId: signer.licenceId,
      password,
      expectedUnmet: detail.unmet.map(({ code }) => code),
      expectedEarliestOn: detail.earliestClearanceOn,
      ...(against ? { reason: reason.trim() } : {}),
    }
    const done = await refusal.attempt(() => clear.mutateAsync({ key: newId(), body }))
    setPassword('')
    if (!done) return signer.readAgain()
    toast({ words: words.clearDone({ number }) })
    letGo()
    await navigate(paths.quarantineCase(number))
  }

  return (
    <form
      className="stack max-w-[60ch]"
      noValidate
      onSubmit={(event) => {
        event.preventDefault()
        if (shut === undefined && !refusal.busy) void send()
      }}
    >
      <WrongSummary fields={[]} general={refusal.general(['/password', '/reason'])} />
      <section className="stack" aria-labelledby="clear-stands">
        <h2 id="clear-stands" className="t-head">
          {words.clearStands}
        </h2>
        {against ? (
          <ul className="stack gap-2">
            {detail.unmet.map((one, i) => (
              <li key={`${one.code} ${String(i)}`}>{sayUnmet(one, detail.names)}</li>
            ))}
          </ul>
        ) : (
          <p>{words.clearNothing}</p>
        )}
      </section>
      {against ? (
        <TextareaField
          label={words.clearReason}
          hint={words.clearReasonHint}
          wrong={refusal.at('/reason')}
          value={reason}
          maxLength={2000}
          onChange={({ target }) => setReason(target.value)}
        />
      ) : null}
      <SignatureBlock meaning={words.clearMeaning} who={<SignerLines signer={signer} may={may} />}>
        <p>
          {words.clearText({
            number,
            animals: `${animalsText(detail.animals)} (${detail.batch.map(({ accession }) => accession).join(', ')})`,
            day:
              detail.dayNumber === null
                ? caseWords.notBegun
                : caseWords.dayOf({ day: detail.dayNumber, length: detail.requiredDays }),
          })}
        </p>
        {signer.lockedUntil === null ? (
          <PasswordField
            label={words.password}
            hint={words.passwordHint}
            wrong={refusal.at('/password')}
            autoComplete="off"
            value={password}
            onChange={({ target }) => setPassword(target.value)}
          />
        ) : null}
        <div className="row row-wrap">
          <Button
            type="submit"
            kind={against ? 'edge' : 'clear'}
            disabled={refusal.busy}
            shut={shut ?? false}
          >
            {against ? caseWords.clearAgainst({ count: detail.unmet.length }) : words.clearAct}
          </Button>
          <ButtonLink to={paths.quarantineCase(number)}>{words.backToCase}</ButtonLink>
        </div>
      </SignatureBlock>
      <LeaveQuestion blocker={blocker} />
    </form>
  )
}
