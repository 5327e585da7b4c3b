import { FieldGroup } from './field.tsx'
import type { FieldProps } from './field.tsx'
import { SegmentedChoice } from './segmented-choice.tsx'
import type { SegmentedChoiceProps } from './segmented-choice.tsx'

/** A segmented choice with its label and its line below, as a field of a form. */
export function ChoiceField<V extends string>({
  label,
  hint,
  wrong,
  ...choice
}: FieldProps & Omit<SegmentedChoiceProps<V>, 'label' | 'labelledBy' | 'describedBy'>) {
  return (
    <FieldGroup {...{ label, hint, wrong }}>
      {({ labelId, describedBy }) => (
        <SegmentedChoice {...choice} labelledBy={labelId} describedBy={describedBy} />
      )}
    </FieldGroup>
  )
}
