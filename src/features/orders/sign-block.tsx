import { useState } from 'react'
import { PenLine } from 'lucide-react'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import { useMay } from '../../lib/may.ts'
import { Button } from '../../ui/button.tsx'
import { PasswordField } from '../../ui/password-field.tsx'
import { SignatureBlock } from '../../ui/signature-block.tsx'
import { Tick } from '../../ui/tick.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { SignerLines } from '../licences/index.ts'
import type { Signer } from '../licences/index.ts'

/**
 * Where an order is signed: as what, by whom with which licence, and the password again. Whoever cannot sign is told
 * why, in place of the field.
 */
export function SignBlock({
  signer,
  shut,
  missing,
  busy,
  passwordWrong,
  refused,
  statement = null,
  onSign,
}: {
  signer: Signer
  /** Why the order can't be signed as it stands. */
  shut: string | undefined
  missing: readonly string[]
  busy: boolean
  passwordWrong: string | undefined
  /** Why the last attempt was refused, where it was not the password. */
  refused: string | undefined
  /** What has to be stated besides, and is signed with the order; null where nothing has. */
  statement?: { heading: string; text: string; needed: string } | null
  onSign: (password: string, stated: boolean) => Promise<boolean>
}) {
  const may = useMay('order.sign')
  const [password, setPassword] = useState('')
  const [asked, setAsked] = useState(false)
  const [tried, setTried] = useState(false)
  // ticked for this text: another statement has to be read anew
  const [statedFor, setStatedFor] = useState<string | null>(null)
  const stated = statement !== null && statedFor === statement.text
  const send = async () => {
    setAsked(true)
    setTried(true)
    if (password === '' || (statement !== null && !stated)) return
    // a password is typed for one attempt
    if (await onSign(password, stated)) setPassword('')
    setAsked(false)
  }
  return (
    <div id="sign" tabIndex={-1}>
      <SignatureBlock meaning={words.sign} who={<SignerLines signer={signer} may={may} />}>
        {may.allowed && signer.lockedUntil === null ? (
          <form
            className="stack"
            noValidate
            onSubmit={(event) => {
              event.preventDefault()
              void send()
            }}
          >
            <p className="signature-text">{words.signMeaning}</p>
            {missing.length > 0 ? (
              <div>
                <b>{words.missingHeading}</b>
                <ul className="missing">
                  {missing.map((one) => (
                    <li key={one}>{one}</li>
                  ))}
                </ul>
              </div>
            ) : null}
            {statement ? (
              <Tick
                id="relationship"
                label={
                  <>
                    <b className="block">{statement.heading}</b>
                    {statement.text}
                  </>
                }
                checked={stated}
                onChange={(event) => setStatedFor(event.target.checked ? statement.text : null)}
              />
            ) : null}
            <PasswordField
              label={words.password}
              autoComplete="off"
              value={password}
              wrong={passwordWrong ?? (asked && password === '' ? words.passwordNeeded : undefined)}
              onChange={(event) => setPassword(event.target.value)}
            />
            <WrongSummary
              fields={
                statement && tried && !stated
                  ? [{ id: 'relationship', label: statement.heading, says: statement.needed }]
                  : []
              }
              general={refused}
            />
            <Button
              kind="primary"
              icon={PenLine}
              type="submit"
              shut={busy ? words.signing : (shut ?? signer.shut)}
            >
              {words.signAct}
            </Button>
          </form>
        ) : (
          <Button icon={PenLine} shut={signer.lockedUntil === null ? (may.why ?? '') : (signer.shut ?? '')}>
            {words.signAct}
          </Button>
        )}
      </SignatureBlock>
    </div>
  )
}
