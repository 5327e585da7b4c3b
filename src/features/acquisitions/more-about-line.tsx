import { Controller, useFormContext } from 'react-hook-form'
import { birthKinds, lifeStages, sexes } from '../../../shared/domain/animals/description.ts'
import { sourceCodes } from '../../../shared/domain/register/permit-kinds.ts'
import { birthKindNames, lifeStageNames, sexNames } from '../../../shared/messages/history.ts'
import { sourceCodeNames } from '../../../shared/messages/register-kinds.ts'
import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { useFormField } from './form-field.ts'
import type { TransactionValues } from './transaction-form-model.ts'

/** What may be known of a new animal and need not be: folded away until it is asked for. */
export function MoreAboutLine({ index, isIndividual }: { index: number; isIndividual: boolean }) {
  const { control } = useFormContext<TransactionValues>()
  const { field } = useFormField()
  const at = `lines.${index}` as const
  return (
    <details className="fold">
      <summary>{words.more}</summary>
      <div className="stack gap-3">
        {isIndividual ? (
          <>
            <TextField label={words.name} optional {...field(`${at}.name`)} />
            <TextField
              label={words.transponder}
              optional
              inputMode="numeric"
              {...field(`${at}.transponder`)}
            />
          </>
        ) : null}
        <div className="pair">
          <SelectField
            label={words.sex}
            optional
            options={sexes.map((value) => ({ value, label: sexNames[value] }))}
            {...field(`${at}.sex`)}
          />
          <SelectField
            label={words.lifeStage}
            optional
            options={lifeStages.map((value) => ({ value, label: lifeStageNames[value] }))}
            {...field(`${at}.lifeStage`)}
          />
        </div>
        <div className="pair">
          <SelectField
            label={words.birthKind}
            optional
            options={birthKinds.map((value) => ({ value, label: birthKindNames[value] }))}
            {...field(`${at}.birthKind`)}
          />
          <TextField label={words.birthDate} hint={words.onHint} optional {...field(`${at}.birthDate`)} />
        </div>
        <Controller
          control={control}
          name={`${at}.birthApproximate`}
          render={({ field: { value, onChange } }) => (
            <Tick
              label={words.birthApproximate}
              checked={value}
              onChange={(event) => onChange(event.target.checked)}
            />
          )}
        />
        <TextField label={words.theirNumber} optional {...field(`${at}.theirNumber`)} />
        <SelectField
          label={words.sourceCode}
          optional
          options={sourceCodes.map((value) => ({ value, label: sourceCodeNames[value] }))}
          {...field(`${at}.sourceCode`)}
        />
      </div>
    </details>
  )
}
