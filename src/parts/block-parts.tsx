import { useState } from 'react'
import { formatDose } from '../../shared/domain/quantities/format-dose.ts'
import { formatReading } from '../../shared/domain/quantities/format-reading.ts'
import { formatVolumeWithError } from '../../shared/domain/quantities/format-volume-with-error.ts'
import { partsPageWords as words } from '../../shared/messages/parts-page.ts'
import { Button } from '../ui/button.tsx'
import { CautionBlock } from '../ui/caution-block.tsx'
import { Conditions } from '../ui/condition-row.tsx'
import { FlagWords } from '../ui/flag-mark.tsx'
import { PairOfAmounts } from '../ui/pair-of-amounts.tsx'
import { PasswordField } from '../ui/password-field.tsx'
import { Quantity } from '../ui/quantity.tsx'
import { SignatureBlock } from '../ui/signature-block.tsx'
import { TextareaField } from '../ui/textarea-field.tsx'
import { WorkingBlock } from '../ui/working-block.tsx'
import { PartGroup } from './part-group.tsx'

export function CautionParts() {
  return (
    <PartGroup heading={words.cautions}>
      <CautionBlock level="stop" title={words.stopTitle} cannotOverride>
        {words.stopBody}
      </CautionBlock>
      <CautionBlock
        level="stop"
        title={words.overriddenTitle}
        override={
          <>
            <TextareaField label={words.overrideReason} rows={2} />
            <Button size="small">{words.override}</Button>
          </>
        }
      >
        {words.overriddenBody}
      </CautionBlock>
      <CautionBlock level="stop" title={words.overriddenTitle} answer={words.overridden}>
        {words.overriddenBody}
      </CautionBlock>
      <div className="grid gap-3 sm:grid-cols-2">
        <CautionBlock level="warning" title={words.warningTitle}>
          {words.warningBody}
        </CautionBlock>
        <CautionBlock level="note" title={words.noteTitle}>
          {words.noteBody}
        </CautionBlock>
      </div>
      <div className="bg-land p-4">
        <Conditions
          heading={words.conditions}
          note={words.conditionsNote}
          conditions={[
            { key: '1', state: 'unmet', what: words.oxygen, known: words.oxygenKnown },
            { key: '2', state: 'met', what: words.carbonOut, known: words.carbonKnown },
            { key: '3', state: 'open', what: words.secondCalculation, known: words.secondKnown },
          ]}
        />
      </div>
    </PartGroup>
  )
}

export function AmountParts() {
  const [password, setPassword] = useState('')
  const rows = [
    { key: '1', what: words.tank, formula: words.tankFormula, result: volume(1958.4) },
    { key: '2', what: words.sump, formula: words.sumpFormula, result: volume(264) },
    { key: '3', what: words.net, formula: words.netFormula, result: volume(2222.4), kind: 'sum' as const },
  ]
  return (
    <PartGroup heading={words.amounts}>
      <p className="t-label">{words.dose}</p>
      <p className="row row-wrap gap-6 items-end">
        <Quantity of={formatDose('0.440', 'g')} size="dose" />
        <Quantity of={formatVolumeWithError(2217.6, 2)} size="mid" />
        <Quantity of={formatReading({ value: '0.00', unit: 'mg/L' })} size="strong" />
        <Quantity of={formatReading({ value: '7.0', unit: 'pH' })} />
        <Quantity of={formatReading({ value: '0.36', unit: 'mg/L' })} size="strong" late />
      </p>
      <PairOfAmounts
        signed={<Quantity of={{ ...formatDose('876', 'mg'), text: '876' }} />}
        signedWords={words.mgSigned}
        recomputed={<Quantity of={{ ...formatDose('832', 'mg'), text: '832' }} />}
        recomputedWords={words.mgByWeight}
        reason={words.amountReason}
      />
      <WorkingBlock label={words.volumeWorking} rows={rows} />
      <SignatureBlock
        meaning={words.signAs}
        who={
          <>
            {words.signer}
            {', '}
            <FlagWords flag="C">{words.licence}</FlagWords>
            <br />
            {words.willStand}
          </>
        }
      >
        <PasswordField
          label={words.password}
          autoComplete="off"
          value={password}
          onChange={(event) => setPassword(event.target.value)}
        />
        <div className="row row-wrap">
          <Button kind="primary">{words.signOrder}</Button>
          <Button>{words.keepDraft}</Button>
        </div>
      </SignatureBlock>
    </PartGroup>
  )
}

const volume = (litres: number) => <Quantity of={formatVolumeWithError(litres, 0)} />
