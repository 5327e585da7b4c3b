import { Controller, useFormContext, useWatch } from 'react-hook-form'
import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { AnimalChooser, TaxonChooser, WaterInQuarantine } from '../animals/index.ts'
import { EnclosureChooser } from '../enclosures/index.ts'
import { useFormField } from './form-field.ts'
import { MoreAboutLine } from './more-about-line.tsx'
import type { TransactionValues } from './transaction-form-model.ts'

/** One animal or group that comes: new to the collection, or added to a group. */
export function LineInFields({ index }: { index: number }) {
  const { control } = useFormContext<TransactionValues>()
  const { wrong, field } = useFormField()
  const at = `lines.${index}` as const
  const [record, form, known, enclosureId] = useWatch({
    control,
    name: [`${at}.record`, `${at}.form`, `${at}.known`, `${at}.enclosureId`],
  })
  return (
    <div className="stack gap-3">
      <Controller
        control={control}
        name={`${at}.record`}
        render={({ field: choice }) => (
          <ChoiceField
            label={words.record}
            segments={[
              { value: 'new', label: words.newRecord },
              { value: 'existing', label: words.existingRecord },
            ]}
            value={choice.value}
            onChange={choice.onChange}
          />
        )}
      />
      {record === 'existing' ? (
        <>
          <Controller
            control={control}
            name={`${at}.animalId`}
            render={({ field: animal }) => (
              <AnimalChooser
                {...animal}
                id={`${at}.animalId`}
                form="group"
                label={words.group}
                wrong={wrong(`${at}.animalId`)}
              />
            )}
          />
          <TextField label={words.count} inputMode="numeric" {...field(`${at}.count`)} />
        </>
      ) : (
        <>
          <Controller
            control={control}
            name={`${at}.taxonId`}
            render={({ field: taxon }) => (
              <TaxonChooser
                {...taxon}
                id={`${at}.taxonId`}
                label={words.taxon}
                wrong={wrong(`${at}.taxonId`)}
              />
            )}
          />
          <Controller
            control={control}
            name={`${at}.form`}
            render={({ field: choice }) => (
              <ChoiceField
                label={words.form}
                wrong={wrong(`${at}.form`)}
                segments={[
                  { value: 'individual', label: words.individual },
                  { value: 'group', label: words.aGroup },
                ]}
                value={choice.value}
                onChange={choice.onChange}
              />
            )}
          />
          {form === 'group' ? <GroupCount at={at} known={known} /> : null}
          <Controller
            control={control}
            name={`${at}.enclosureId`}
            render={({ field: place }) => (
              <EnclosureChooser
                {...place}
                id={`${at}.enclosureId`}
                label={words.enclosure}
                wrong={wrong(`${at}.enclosureId`)}
              />
            )}
          />
          <WaterInQuarantine enclosureId={enclosureId} />
        </>
      )}
      <TextField
        label={words.deadOnArrival}
        hint={words.deadHint}
        optional
        inputMode="numeric"
        {...field(`${at}.deadOnArrival`)}
      />
      {record === 'new' ? <MoreAboutLine index={index} isIndividual={form === 'individual'} /> : null}
    </div>
  )
}

/** How many there are in a group, and how that is known. */
function GroupCount({
  at,
  known,
}: {
  at: `lines.${number}`
  known: TransactionValues['lines'][number]['known']
}) {
  const { control } = useFormContext<TransactionValues>()
  const { wrong, field } = useFormField()
  return (
    <>
      <TextField label={words.count} inputMode="numeric" {...field(`${at}.count`)} />
      <Controller
        control={control}
        name={`${at}.known`}
        render={({ field: choice }) => (
          <ChoiceField
            label={words.known}
            wrong={wrong(`${at}.known`)}
            segments={[
              { value: 'counted', label: words.counted },
              { value: 'estimated', label: words.estimated },
            ]}
            value={choice.value}
            onChange={choice.onChange}
          />
        )}
      />
      {known === 'estimated' ? (
        <div className="pair">
          <TextField label={words.low} inputMode="numeric" {...field(`${at}.estimate.low`)} />
          <TextField label={words.high} inputMode="numeric" {...field(`${at}.estimate.high`)} />
          {wrong(`${at}.estimate`) ? <p className="wrong">{wrong(`${at}.estimate`)}</p> : null}
        </div>
      ) : null}
    </>
  )
}
