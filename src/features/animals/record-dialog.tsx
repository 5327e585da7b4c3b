import type { ReactNode } from 'react'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { sayOffset } from '../../../shared/messages/say-date.ts'
import type { Moment } from '../../lib/use-moment.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { MomentField } from '../../ui/moment-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'

/** The frame of every form here: a question, its fields, what was refused as a whole, and the act. */
export function RecordDialog({
  question,
  act,
  shut,
  busy,
  refused,
  typed,
  onRecord,
  onBack,
  children,
}: {
  question: string
  act: string
  /** What has to be said first; nothing when it can be recorded. */
  shut: string | undefined
  busy: boolean
  refused: string | undefined
  typed: boolean
  onRecord: () => void
  onBack: () => void
  children: ReactNode
}) {
  return (
    <Dialog
      question={question}
      onBack={onBack}
      typed={typed}
      acts={
        <>
          <Button kind="primary" disabled={busy} shut={shut ?? false} onClick={onRecord}>
            {act}
          </Button>
          <Button onClick={onBack}>{words.back}</Button>
        </>
      }
    >
      <form
        className="stack"
        noValidate
        onSubmit={(event) => {
          event.preventDefault()
          if (shut === undefined && !busy) onRecord()
        }}
      >
        <WrongSummary fields={[]} general={refused} />
        {children}
      </form>
    </Dialog>
  )
}

/** When it happened: the last field of every form here. */
export function WhenField({ when, wrong }: { when: Moment; wrong: string | undefined }) {
  return (
    <MomentField
      label={words.when}
      hint={words.whenHint({ offset: sayOffset(new Date().toISOString(), when.zone) })}
      wrong={when.missing ?? wrong}
      value={when.moment}
      onChange={when.setMoment}
    />
  )
}

export const shortestReason = 3
