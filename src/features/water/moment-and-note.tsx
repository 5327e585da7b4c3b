import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { MomentField } from '../../ui/moment-field.tsx'
import { TextField } from '../../ui/text-field.tsx'

/** When something happened, and a note: the two fields that every entry of a ledger ends with. */
export function MomentAndNote({
  moment,
  inWords,
  onMoment,
  momentWrong,
  note,
  onNote,
}: {
  moment: string
  /** The moment in words, below the control. */
  inWords: string | undefined
  onMoment: (next: string) => void
  momentWrong?: string | undefined
  /** Left out: this entry has no note. */
  note?: string
  onNote?: (next: string) => void
}) {
  return (
    <>
      <MomentField
        label={waterWords.when}
        hint={inWords}
        wrong={momentWrong}
        value={moment}
        onChange={onMoment}
      />
      {onNote ? (
        <TextField
          label={waterWords.note}
          optional
          maxLength={2000}
          value={note ?? ''}
          onChange={(event) => onNote(event.target.value)}
        />
      ) : null}
    </>
  )
}
