import { Controller, useForm } from 'react-hook-form'
import { Link } from 'react-router-dom'
import { enclosureKinds } from '../../../shared/domain/places/enclosure-kind.ts'
import { enclosureFormWords, enclosureKindNames } from '../../../shared/messages/enclosures.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { useLeaveGuard } from '../../lib/use-leave-guard.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { LeaveQuestion } from '../../ui/leave-question.tsx'
import { fieldOfPointer } from './enclosure-form-model.ts'
import type { EnclosureFields } from './enclosure-form-model.ts'

/**
 * The description of an enclosure, for a new one and for correcting one.
 *
 * @param codeIsFixed it has a code already, which never changes
 * @param onSend      sends it; a refusal is thrown and shown at its fields
 */
export function EnclosureForm({
  title,
  start,
  codeIsFixed,
  act,
  backTo,
  storedNow = [],
  onSend,
}: {
  title: string
  start: EnclosureFields
  codeIsFixed: boolean
  act: string
  backTo: string
  /** What somebody else saved meanwhile, where it differs; saving again puts this form's text over it. */
  storedNow?: readonly string[]
  onSend: (fields: EnclosureFields) => Promise<void>
}) {
  const form = useForm<EnclosureFields>({ defaultValues: start })
  const { register, control, watch, formState } = form
  const { errors, isDirty, isSubmitting } = formState
  // while it is being sent, what follows may lead away
  const { blocker } = useLeaveGuard(isDirty && !isSubmitting)
  const isVessel = watch('treatmentVessel')

  const send = form.handleSubmit(async (fields) => {
    try {
      await onSend(fields)
    } catch (error) {
      if (!isProblem(error)) throw error
      const known = error.errors.filter((one) => one.pointer in fieldOfPointer)
      known.forEach((one, i) => {
        const field = fieldOfPointer[one.pointer]
        if (field) form.setError(field, { type: 'server', message: one.detail }, { shouldFocus: i === 0 })
      })
      if (known.length === 0) form.setError('root', { message: error.says })
    }
  })
  const says = (field: keyof EnclosureFields) => errors[field]?.message

  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche
          place={<Link to={paths.water()}>{enclosureFormWords.water}</Link>}
          title={title}
          source={enclosureFormWords.source}
        />
      </Area>
      <Area className="pane">
        <form className="tank-form" noValidate onSubmit={(event) => void send(event)}>
          <WrongSummary fields={[]} general={errors.root?.message} />
          {storedNow.length > 0 ? (
            <ul className="list-disc pl-5">
              {storedNow.map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
          ) : null}
          <TextField
            label={enclosureFormWords.code}
            hint={codeIsFixed ? enclosureFormWords.codeFixed : enclosureFormWords.codeHint}
            wrong={says('code')}
            disabled={codeIsFixed}
            maxLength={20}
            {...register('code')}
          />
          <TextField
            label={enclosureFormWords.name}
            wrong={says('name')}
            maxLength={120}
            {...register('name')}
          />
          <SelectField
            label={enclosureFormWords.kind}
            wrong={says('kind')}
            options={enclosureKinds.map((value) => ({ value, label: enclosureKindNames[value] }))}
            {...register('kind')}
          />
          <TextField
            label={enclosureFormWords.area}
            hint={enclosureFormWords.areaHint}
            wrong={says('area')}
            maxLength={120}
            {...register('area')}
          />
          <TextField
            label={enclosureFormWords.boundary}
            hint={enclosureFormWords.boundaryHint}
            optional
            wrong={says('boundary')}
            maxLength={120}
            {...register('boundary')}
          />
          <TextField
            label={enclosureFormWords.airSpace}
            hint={enclosureFormWords.airSpaceHint}
            optional
            wrong={says('airSpace')}
            maxLength={120}
            {...register('airSpace')}
          />
          <Tick
            label={enclosureFormWords.treatmentVessel}
            hint={says('treatmentVessel') ?? enclosureFormWords.treatmentVesselHint}
            {...register('treatmentVessel')}
          />
          {isVessel ? (
            <>
              <TextField
                label={enclosureFormWords.mark}
                hint={enclosureFormWords.markHint}
                wrong={says('mark')}
                maxLength={120}
                {...register('mark')}
              />
              <Controller
                control={control}
                name="markVolume"
                render={({ field }) => (
                  <QuantityField
                    label={enclosureFormWords.markVolume}
                    units={[{ unit: 'L' }, { unit: 'gal_us', label: enclosureFormWords.usGallons }]}
                    quantity={field.value}
                    onChange={field.onChange}
                    onBlur={field.onBlur}
                    ref={field.ref}
                    wrong={says('markVolume')}
                  />
                )}
              />
            </>
          ) : null}
          <TextareaField
            label={enclosureFormWords.description}
            hint={enclosureFormWords.descriptionHint}
            optional
            wrong={says('description')}
            maxLength={2000}
            {...register('description')}
          />
          <div className="form-foot">
            <Button kind="primary" type="submit" disabled={formState.isSubmitting}>
              {act}
            </Button>
            <ButtonLink to={backTo}>{enclosureFormWords.back}</ButtonLink>
          </div>
        </form>
        <LeaveQuestion blocker={blocker} />
      </Area>
    </Sheet>
  )
}
