import { useState } from 'react'
import { observationWords as words } from '../../../shared/messages/observation-screens.ts'
import { Button } from '../../ui/button.tsx'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'

/** What is seen, asked before somebody is called, where the form does not say it yet. */
export function UrgentQuestion({ onCall, onBack }: { onCall: (seen: string) => void; onBack: () => void }) {
  const [seen, setSeen] = useState('')
  const said = seen.trim()
  return (
    <Dialog
      question={words.urgentAsk}
      onBack={onBack}
      typed={said !== ''}
      acts={
        <>
          <Button
            kind="urgent"
            size="touch"
            shut={said === '' && words.urgentNoWords}
            onClick={() => onCall(said)}
          >
            {words.urgentCall}
          </Button>
          <Button size="touch" onClick={onBack}>
            {words.backToEntry}
          </Button>
        </>
      }
    >
      <TextareaField
        label={words.wordsLabel}
        hint={words.urgentAskBody}
        value={seen}
        maxLength={2000}
        autoFocus
        onChange={({ target }) => setSeen(target.value)}
      />
    </Dialog>
  )
}

/** One question before a hold, no password and no reason. */
export function HoldQuestion({
  numbers,
  onHold,
  onBack,
}: {
  numbers: readonly string[]
  onHold: (number: string) => void
  onBack: () => void
}) {
  const [chosen, setChosen] = useState(numbers.length === 1 ? (numbers[0] ?? null) : null)
  return (
    <Dialog
      question={words.holdAsk({ number: chosen ?? numbers.join(', ') })}
      onBack={onBack}
      acts={
        <>
          <Button
            kind="hold"
            size="touch"
            shut={chosen === null && words.holdWhich}
            onClick={() => {
              if (chosen !== null) onHold(chosen)
            }}
          >
            {words.holdNow}
          </Button>
          <Button size="touch" onClick={onBack}>
            {words.keepRunning}
          </Button>
        </>
      }
    >
      <p>{words.holdBody}</p>
      {numbers.length > 1 ? (
        <ChoiceField
          label={words.holdWhich}
          segments={numbers.map((value) => ({ value, label: value }))}
          value={chosen}
          onChange={setChosen}
        />
      ) : null}
    </Dialog>
  )
}
