import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { FlagWords } from '../../ui/flag-mark.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import type { MoveAsks } from './move-form-model.ts'
import { shortestReason } from './record-dialog.tsx'

export interface MoveRuleAnswer {
  transfer: string
  happened: boolean
  reason: string
}

export const noAnswer: MoveRuleAnswer = { transfer: '', happened: false, reason: '' }

/** What has to be said before the move can be recorded; nothing when it can. */
export function missingAnswer(asks: MoveAsks, answer: MoveRuleAnswer): string | undefined {
  if (asks === 'nothing') return undefined
  const open = answer.happened ? answer.reason : asks === 'documented-transfer' ? answer.transfer : ''
  if (open.trim().length >= shortestReason) return undefined
  return answer.happened || asks === 'documented-transfer' ? words.typeReason : words.happenedAnyway
}

/** The answer as the server takes it. */
export function sentAnswer(asks: MoveAsks, answer: MoveRuleAnswer) {
  if (asks === 'nothing') return {}
  if (answer.happened) return { alreadyHappened: answer.reason.trim() }
  return asks === 'documented-transfer' ? { documentedTransfer: answer.transfer.trim() } : {}
}

/** Why a move is not simply allowed, and what the person can say to it. */
export function MoveRuleFields({
  animal,
  to,
  asks,
  isTold,
  answer,
  onAnswer,
}: {
  animal: Animal
  /** Code of the enclosure it goes to. */
  to: string
  asks: MoveAsks
  /** The server has said why; the reason is not said again. */
  isTold: boolean
  answer: MoveRuleAnswer
  onAnswer: (next: MoveRuleAnswer) => void
}) {
  if (asks === 'nothing') return null
  const held = animal.locks.some((lock) => lock.kind === 'all')
  const who = asks === 'documented-transfer' ? words.crossesVet : words.crossesOthers
  return (
    <>
      {isTold ? null : (
        <div role="status">
          <FlagWords flag={held ? 'L' : 'Q'}>
            {held ? words.heldNow : `${words.crossesBoundary({ to, from: animal.place?.code ?? '' })} ${who}`}
          </FlagWords>
        </div>
      )}
      {asks === 'documented-transfer' && !answer.happened ? (
        <TextareaField
          label={words.documented}
          hint={words.documentedHint}
          rows={2}
          maxLength={2000}
          value={answer.transfer}
          onChange={(event) => onAnswer({ ...answer, transfer: event.target.value })}
        />
      ) : null}
      <Tick
        label={words.happenedAnyway}
        checked={answer.happened}
        onChange={(event) => onAnswer({ ...answer, happened: event.target.checked })}
      />
      {answer.happened ? (
        <TextareaField
          label={words.happenedReason}
          rows={2}
          maxLength={2000}
          value={answer.reason}
          onChange={(event) => onAnswer({ ...answer, reason: event.target.value })}
        />
      ) : null}
    </>
  )
}
