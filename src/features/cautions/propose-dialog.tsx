import { useState } from 'react'
import type { ListedParameter } from '../../../shared/contracts/caution-rules.contract.ts'
import type { CautionRuleId } from '../../../shared/domain/cautions/caution-rule.ts'
import { ruleSheetWords as words } from '../../../shared/messages/caution-rules-sheet.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { usePropose } from './mutations.ts'
import { sayLimits } from './threshold-text.ts'

const shortestReason = 3

/** Asks for a value of this facility and why. Nothing is filled in. */
export function ProposeDialog({
  ruleId,
  parameter,
  onBack,
}: {
  ruleId: CautionRuleId
  parameter: ListedParameter
  onBack: () => void
}) {
  const propose = usePropose({ ruleId, key: parameter.key })
  const refusal = useRefusal()
  const say = useToast()
  const [id] = useState(newId)
  const [value, setValue] = useState('')
  const [reason, setReason] = useState('')
  const [isMissing, setMissing] = useState(false)
  const send = async () => {
    const given = { value: value.trim(), reason: reason.trim() }
    if (given.value === '' || given.reason.length < shortestReason) return setMissing(true)
    setMissing(false)
    const supersedesId = parameter.versions[0]?.id ?? null
    const done = await refusal.attempt(() =>
      propose.mutateAsync({ id, ...given, unit: parameter.unit, supersedesId }),
    )
    if (!done) return
    say({ words: words.proposed })
    onBack()
  }
  return (
    <Dialog
      question={words.proposeQuestion({ rule: ruleId, name: parameter.label })}
      typed={value !== '' || reason !== ''}
      onBack={onBack}
      acts={
        <>
          <Button kind="primary" disabled={refusal.busy} onClick={() => void send()}>
            {words.proposeAct}
          </Button>
          <Button onClick={onBack}>{words.back}</Button>
        </>
      }
    >
      <div className="stack">
        <p>{words.proposeBody}</p>
        <WrongSummary fields={[]} general={refusal.general(['/value', '/reason'])} />
        <TextField
          label={words.value({ unit: parameter.unitText })}
          hint={words.valueHint({ ...sayLimits(parameter), standard: parameter.defaultText })}
          inputMode="decimal"
          maxLength={40}
          value={value}
          wrong={refusal.at('/value') ?? (isMissing && value.trim() === '' ? formWords.needed : undefined)}
          onChange={(event) => setValue(event.target.value)}
        />
        <TextareaField
          label={words.reason}
          maxLength={2000}
          value={reason}
          wrong={
            refusal.at('/reason') ??
            (isMissing && reason.trim().length < shortestReason ? formWords.needed : undefined)
          }
          onChange={(event) => setReason(event.target.value)}
        />
      </div>
    </Dialog>
  )
}
