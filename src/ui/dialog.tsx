import { useId, useState } from 'react'
import type { ReactNode } from 'react'
import { partWords } from '../../shared/messages/parts.ts'
import { Button } from './button.tsx'
import { classNames } from './class-names.ts'
import { useModal } from './use-modal.ts'

/**
 * A question that has to be answered before going on. Mount it to open it, take it away to close it. The first button
 * names the act, the second the way back; Esc goes back, and asks first when something was typed.
 *
 * @param question title, a question: "Stop order TO-0728?"
 * @param acts     buttons, the act first
 * @param typed    something was typed that going back would lose
 * @param alert    it interrupts, such as an entry that was not sent
 * @param covers   nothing of the page below is shown
 */
export function Dialog({
  question,
  children,
  acts,
  onBack,
  typed = false,
  alert = false,
  wide = false,
  covers = false,
}: {
  question: string
  children?: ReactNode
  acts?: ReactNode
  onBack: () => void
  typed?: boolean
  alert?: boolean
  wide?: boolean
  covers?: boolean
}) {
  const id = useId()
  const [asking, setAsking] = useState(false)
  const dialog = useModal(() => {
    if (typed && !asking) setAsking(true)
    else if (asking) setAsking(false)
    else onBack()
  })
  return (
    <dialog
      ref={dialog}
      className={classNames('dialog', wide && 'dialog-wide', covers && 'dialog-covers')}
      role={alert ? 'alertdialog' : undefined}
      aria-labelledby={id}
    >
      <div className="dialog-body">
        <h2 id={id} className="t-head">
          {question}
        </h2>
        {children}
        {asking ? (
          <div role="alert" className="unit-question">
            <p>{partWords.throwAway}</p>
            <Button size="small" onClick={onBack}>
              {partWords.throwAwayYes}
            </Button>
            <Button size="small" onClick={() => setAsking(false)}>
              {partWords.throwAwayNo}
            </Button>
          </div>
        ) : null}
        {acts ? <div className="dialog-acts">{acts}</div> : null}
      </div>
    </dialog>
  )
}
