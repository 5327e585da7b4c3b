import { useState } from 'react'
import type { Licence } from '../../../shared/contracts/people.contract.ts'
import { peopleWords } from '../../../shared/messages/people.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useVoidLicence } from './mutations.ts'

/** Asks for the reason before a licence is voided. */
export function VoidLicenceDialog({
  personId,
  licence,
  onBack,
}: {
  personId: string
  licence: Licence
  onBack: () => void
}) {
  const [key] = useState(newId)
  const [reason, setReason] = useState('')
  const voiding = useVoidLicence(personId)
  const problem = isProblem(voiding.error) ? voiding.error : null
  return (
    <Dialog
      question={peopleWords.voidAsk({ number: licence.number })}
      onBack={onBack}
      typed={reason !== ''}
      acts={
        <>
          <Button
            kind="primary"
            disabled={voiding.isPending}
            onClick={() => voiding.mutate({ licenceId: licence.id, reason, key }, { onSuccess: onBack })}
          >
            {peopleWords.voidAct}
          </Button>
          <Button onClick={onBack}>{peopleWords.goBack}</Button>
        </>
      }
    >
      <p>{peopleWords.voidText}</p>
      <TextField
        label={peopleWords.reason}
        value={reason}
        wrong={problem?.errors[0]?.detail ?? problem?.says}
        onChange={(event) => setReason(event.target.value)}
      />
    </Dialog>
  )
}
