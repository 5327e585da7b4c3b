import { useState } from 'react'
import type { Licence } from '../../../shared/contracts/people.contract.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { peopleWords as words } from '../../../shared/messages/people.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useEndLicence } from './mutations.ts'

/** Asks for the last day and the reason before a licence is ended before its time. */
export function EndLicenceDialog({
  personId,
  licence,
  onBack,
}: {
  personId: string
  licence: Licence
  onBack: () => void
}) {
  const [key, setKey] = useState(newId)
  const [endedOn, setEndedOn] = useState('')
  const [reason, setReason] = useState('')
  const [tried, setTried] = useState(false)
  const refusal = useRefusal()
  const ending = useEndLicence(personId)
  const send = async () => {
    setTried(true)
    if (endedOn === '' || reason.trim() === '') return
    const body = { endedOn, reason: reason.trim() }
    if (await refusal.attempt(() => ending.mutateAsync({ licenceId: licence.id, body, key }))) onBack()
    // what is typed anew is another command
    else setKey(newId())
  }
  const missing = (text: string) => (tried && text.trim() === '' ? formWords.needed : undefined)
  return (
    <Dialog
      question={words.endAsk({ number: licence.number })}
      onBack={onBack}
      typed={endedOn !== '' || reason !== ''}
      acts={
        <>
          <Button kind="primary" disabled={refusal.busy} onClick={() => void send()}>
            {words.endAct}
          </Button>
          <Button onClick={onBack}>{words.goBack}</Button>
        </>
      }
    >
      <div className="stack">
        <p>{words.endText}</p>
        <WrongSummary fields={[]} general={refusal.general(['/endedOn', '/reason'])} />
        <TextField
          label={words.endedOn}
          hint={words.endHint({ from: sayDate(licence.validFrom), until: sayDate(licence.validUntil) })}
          type="date"
          value={endedOn}
          wrong={refusal.at('/endedOn') ?? missing(endedOn)}
          onChange={({ target }) => setEndedOn(target.value)}
        />
        <TextField
          label={words.reason}
          value={reason}
          wrong={refusal.at('/reason') ?? missing(reason)}
          onChange={({ target }) => setReason(target.value)}
        />
      </div>
    </Dialog>
  )
}
