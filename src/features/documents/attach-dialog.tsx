import { useState } from 'react'
import { paperWords as words } from '../../../shared/messages/documents-sheet.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useAttachPaper } from './mutations.ts'
import type { PaperGiven, PaperParent } from './mutations.ts'
import { paperFaults, PaperFields } from './paper-fields.tsx'
import type { PaperFaults } from './paper-fields.tsx'

/** The record that papers are attached to, and what is read again afterwards. */
export type AttachTarget = PaperParent & { readAgain: readonly string[] }

export const blankPaper = (): PaperGiven => ({ id: newId(), title: '', kind: '', file: null })

export function AttachDialog({ target, onBack }: { target: AttachTarget; onBack: () => void }) {
  const [paper, setPaper] = useState(blankPaper)
  const [faults, setFaults] = useState<PaperFaults>({})
  const attach = useAttachPaper(target, target.readAgain)
  const say = useToast()
  const send = () => {
    const missing = paperFaults(paper)
    setFaults(missing)
    if (Object.keys(missing).length > 0) return
    attach.mutate(paper, {
      onSuccess: () => {
        say({ words: words.attached })
        onBack()
      },
    })
  }
  return (
    <Dialog
      question={words.attach}
      typed={paper.title !== '' || paper.file !== null}
      onBack={onBack}
      acts={
        <>
          <Button kind="primary" shut={attach.isPending && formWords.sending} onClick={send}>
            {words.attachAct}
          </Button>
          <Button onClick={onBack}>{words.back}</Button>
        </>
      }
    >
      <WrongSummary fields={[]} general={isProblem(attach.error) ? attach.error.says : undefined} />
      <PaperFields
        paper={paper}
        faults={faults}
        onChange={(next) => {
          setPaper(next)
          setFaults({})
        }}
      />
    </Dialog>
  )
}
