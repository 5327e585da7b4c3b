import { newId } from '../../lib/new-id.ts'
import { typedNumber, typedText } from '../../lib/typed-text.ts'

/** A permit as the form holds it: text as typed, nothing chosen beforehand. */
export interface PermitValues {
  id: string
  permitNumber: string
  authority: string
  kind: string
  validFrom: string
  validUntil: string
  quantityAllowed: string
  taxonIds: string[]
  counterpartyId: string | null
  purposeCode: string
  conditions: string
}

export const blankPermit = (): PermitValues => ({
  id: newId(),
  permitNumber: '',
  authority: '',
  kind: '',
  validFrom: '',
  validUntil: '',
  quantityAllowed: '',
  taxonIds: [],
  counterpartyId: null,
  purposeCode: '',
  conditions: '',
})

/** The body that the form sends. */
export function permitBody(values: PermitValues) {
  return {
    id: values.id,
    permitNumber: typedText(values.permitNumber),
    authority: typedText(values.authority),
    kind: typedText(values.kind),
    validFrom: typedText(values.validFrom),
    validUntil: typedText(values.validUntil),
    quantityAllowed: typedNumber(values.quantityAllowed),
    taxonIds: values.taxonIds,
    counterpartyId: values.counterpartyId,
    purposeCode: typedText(values.purposeCode) ?? null,
    conditions: typedText(values.conditions) ?? null,
  }
}
