import { useState } from 'react'
import { observationWords as words } from '../../../shared/messages/observation-screens.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { SelectField } from '../../ui/select-field.tsx'

/** Whom somebody reached by telephone; it may stay unsaid. */
export function TelephonedQuestion({
  names,
  onRecord,
  onBack,
}: {
  names: readonly string[]
  onRecord: (whom: string | undefined) => void
  onBack: () => void
}) {
  const [whom, setWhom] = useState('')
  return (
    <Dialog
      question={words.telephonedQuestion}
      onBack={onBack}
      acts={
        <>
          <Button kind="primary" size="touch" onClick={() => onRecord(whom || undefined)}>
            {words.telephonedAct}
          </Button>
          <Button size="touch" onClick={onBack}>
            {words.backToEntry}
          </Button>
        </>
      }
    >
      <SelectField
        label={words.telephonedWhom}
        startsEmpty={false}
        options={[
          { value: '', label: words.nobodyReached },
          ...names.map((value) => ({ value, label: value })),
        ]}
        value={whom}
        onChange={({ target }) => setWhom(target.value)}
      />
    </Dialog>
  )
}
