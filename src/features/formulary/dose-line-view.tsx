import { useState } from 'react'
import { BadgeCheck } from 'lucide-react'
import type { DoseLine } from '../../../shared/contracts/formulary.contract.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { agentNames, basisNames } from '../../../shared/messages/formulary.ts'
import { formularyWords as words, markNames } from '../../../shared/messages/formulary-screens.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { useMay } from '../../lib/may.ts'
import { newId } from '../../lib/new-id.ts'
import { Button } from '../../ui/button.tsx'
import { Facts } from '../../ui/facts.tsx'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { rangeOfLine, useOfLine, waterOfLine } from './dose-line-text.ts'
import { LineState } from './line-state.tsx'
import { useConfirmLine } from './mutations.ts'

const markText = (mark: string) =>
  Object.hasOwn(markNames, mark) ? `${mark}: ${markNames[mark as keyof typeof markNames]}` : mark

/** One dose line in full. */
export function DoseLineFacts({ line, zone }: { line: DoseLine; zone: string }) {
  return (
    <Facts
      of={[
        [words.drug, <b key="drug">{agentNames[line.agent]}</b>],
        [words.lineUse, useOfLine(line)],
        [
          words.range,
          <b key="range" data-quantity="dose">
            {rangeOfLine(line)}
          </b>,
        ],
        [words.basis, basisNames[line.basis]],
        [words.water, waterOfLine(line)],
        [
          words.contact,
          line.longestContactMinutes === null
            ? words.noContact
            : formatDose(line.longestContactMinutes, 'min').text,
        ],
        [words.citation, line.citation],
        [words.mark, markText(line.mark)],
        [words.standing, <LineState key="state" state={line.state} />],
        [
          words.confirmedWho,
          line.confirmedAt === null
            ? words.notConfirmed
            : words.confirmedBy({ by: line.confirmedBy ?? '', at: sayInstant(line.confirmedAt, zone) }),
        ],
      ]}
    />
  )
}

/** A veterinarian with a valid licence confirms the line for this facility; others are told who may. */
export function ConfirmLine({ line }: { line: DoseLine }) {
  const may = useMay('formulary.confirm')
  const confirm = useConfirmLine(line.id)
  const [key, setKey] = useState<string | null>(null)
  const say = useToast()
  return (
    <>
      <Button
        icon={BadgeCheck}
        shut={line.state === 'confirmed' ? words.alreadyConfirmed : (may.why ?? false)}
        onClick={() => setKey(newId())}
      >
        {words.confirm}
      </Button>
      {key === null ? null : (
        <ReasonDialog
          question={words.confirmQuestion({ drug: agentNames[line.agent] })}
          body={words.confirmBody}
          label={words.confirmReason}
          act={words.confirm}
          back={words.confirmBack}
          onBack={() => setKey(null)}
          onAct={async (reason) => {
            await confirm.mutateAsync({ reason, key })
            setKey(null)
            say({ words: words.confirmed })
          }}
        />
      )}
    </>
  )
}
