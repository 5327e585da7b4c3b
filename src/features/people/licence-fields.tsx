import type { FieldErrors, UseFormRegister } from 'react-hook-form'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { enterLicence } from '../../../shared/contracts/people.contract.ts'
import { licenceClasses } from '../../../shared/domain/licences/licence-classes.ts'
import { peopleWords as words } from '../../../shared/messages/people.ts'
import { licenceClassNames } from '../../../shared/messages/signing.ts'
import { typedText } from '../../lib/typed-text.ts'
import { SelectField } from '../../ui/select-field.tsx'
import { TextField } from '../../ui/text-field.tsx'

export type LicenceFieldsBody = Omit<BodyOf<typeof enterLicence>, 'id'>

/** What was typed of a licence, without the space around it; a class that nobody chose stays missing. */
export const typedLicence = (typed: LicenceFieldsBody) => ({
  class: typed.class,
  jurisdiction: typedText(typed.jurisdiction),
  number: typedText(typed.number),
  validFrom: typedText(typed.validFrom),
  validUntil: typedText(typed.validUntil),
})

/** A licence as it stands on paper: what it is, who granted it, number, first and last day. */
export function LicenceFields({
  register,
  errors,
}: {
  register: UseFormRegister<LicenceFieldsBody>
  errors: FieldErrors<LicenceFieldsBody>
}) {
  return (
    <>
      <SelectField
        label={words.class}
        hint={words.classHint}
        wrong={errors.class?.message}
        options={licenceClasses.map((value) => ({ value, label: licenceClassNames[value] }))}
        {...register('class')}
      />
      <TextField
        label={words.jurisdiction}
        hint={words.jurisdictionHint}
        wrong={errors.jurisdiction?.message}
        {...register('jurisdiction')}
      />
      <TextField label={words.number} wrong={errors.number?.message} {...register('number')} />
      <TextField
        label={words.validFrom}
        type="date"
        wrong={errors.validFrom?.message}
        {...register('validFrom')}
      />
      <TextField
        label={words.validUntil}
        type="date"
        wrong={errors.validUntil?.message}
        {...register('validUntil')}
      />
    </>
  )
}
