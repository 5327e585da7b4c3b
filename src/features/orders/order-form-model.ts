import { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import type { BenchAsked } from '../../../shared/contracts/order-primitives.ts'
import { nothingStated } from '../../../shared/domain/orders/bath-order-draft.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { instantOfMoment, localMomentOf } from '../../lib/local-moment.ts'
import type { LocalMoment } from '../../lib/local-moment.ts'
import { typedNumber } from '../../lib/typed-text.ts'
import type { TypedQuantity } from '../../ui/use-quantity-field.ts'

/** The form as it is being filled in: text as typed, and null for a choice that nobody made. */
export interface OrderValues {
  enclosureId: string | null
  animalIds: string[]
  productId: string | null
  lotId: string | null
  doseLineId: string | null
  problem: string
  use: BathOrderFields['use']
  target: TypedQuantity
  basis: BathOrderFields['basis']
  timing: BathOrderFields['timing']
  contactMinutes: string
  doses: string
  intervalHours: string
  startsAt: LocalMoment
  setting: BathOrderFields['setting']
  division: TypedQuantity
  stopIf: string
  instructions: string
  drift: string
  stated: BathOrderFields['stated']
  /** What was asked on the bench; undefined: something is kept with the order that is not shown, and stays. */
  bench: BathOrderFields['bench']
}

/** How far a volume may have moved since the signature unless the order says otherwise, in percent. */
const usualDriftPercent = '5'

/**
 * An order on which nothing is chosen yet. The allowed drift opens on the project's default, which the treatments
 * reference marks P.
 */
export const emptyOrder = (): OrderValues => ({
  enclosureId: null,
  animalIds: [],
  productId: null,
  lotId: null,
  doseLineId: null,
  problem: '',
  use: null,
  target: { value: '', unit: 'mg/L' },
  basis: null,
  timing: null,
  contactMinutes: '',
  doses: '1',
  intervalHours: '',
  startsAt: '',
  setting: null,
  division: { value: '', unit: 'g' },
  stopIf: '',
  instructions: '',
  drift: usualDriftPercent,
  stated: nothingStated,
  bench: null,
})

/** The parts of an order that the bench can fill in. */
export type CarriedPart = 'enclosureId' | 'target' | 'basis' | 'division'
export type CarriedParts = Pick<BathOrderFields, 'target' | 'basis' | 'division'> & {
  enclosureId: string | null
  bench: BenchAsked | null
}

/** A new order with what came from the bench; everything else is open. */
export function carriedOrder({ enclosureId, target, basis, division, bench }: CarriedParts): OrderValues {
  const start = emptyOrder()
  return {
    ...start,
    enclosureId,
    target: target ?? start.target,
    basis,
    division: division ?? start.division,
    bench,
  }
}

const numberText = (value: number | null) => (value === null ? '' : String(value))

/** A draft as the server keeps it, back in the form. */
export function valuesOf(fields: BathOrderFields, zone: string): OrderValues {
  const start = emptyOrder()
  return {
    ...start,
    enclosureId: fields.enclosureId,
    animalIds: [...fields.animalIds],
    productId: fields.productId,
    lotId: fields.lotId,
    doseLineId: fields.doseLineId,
    problem: fields.problem,
    use: fields.use,
    target: fields.target ?? start.target,
    basis: fields.basis,
    timing: fields.timing,
    contactMinutes: numberText(fields.contactMinutes),
    doses: String(fields.doses),
    intervalHours: numberText(fields.intervalHours),
    startsAt: fields.startsAt === null ? '' : localMomentOf(fields.startsAt, zone),
    setting: fields.setting,
    division: fields.division ?? start.division,
    stopIf: fields.stopIf,
    instructions: fields.instructions,
    drift: String(fields.allowedVolumeDriftPercent),
    stated: fields.stated,
    bench: fields.bench,
  }
}

/** A field at fault, by its name in the form. */
export interface OrderFault {
  name: keyof OrderValues
  says: string
}

const entered = ({ value, unit }: TypedQuantity) =>
  value.trim() === '' ? null : { value: value.trim(), unit }

/**
 * The order that a form says. A part that cannot be read stays out of it and is a fault; only an enclosure is needed
 * for a draft.
 *
 * @returns the fields for judging, null without an enclosure; and what has to change before they can be kept
 */
export function fieldsOf(
  values: OrderValues,
  zone: string,
): { fields: BathOrderFields | null; faults: OrderFault[] } {
  const faults: OrderFault[] = []
  const number = (name: 'contactMinutes' | 'doses' | 'intervalHours' | 'drift', text: string) => {
    const value = typedNumber(text)
    if (value === undefined) return null
    const parsed = shapes[name].safeParse(value)
    if (parsed.success) return value
    faults.push({
      name,
      says: name === 'doses' && !Number.isNaN(value) ? formWords.wholeNumber : formWords.number,
    })
    return null
  }
  const isSingle = typedNumber(values.doses) === 1
  const contactMinutes = values.timing === 'timed' ? number('contactMinutes', values.contactMinutes) : null
  const doses = number('doses', values.doses) ?? 1
  const intervalHours = isSingle ? null : number('intervalHours', values.intervalHours)
  const allowedVolumeDriftPercent = number('drift', values.drift)
  if (values.doses.trim() === '') faults.push({ name: 'doses', says: formWords.needed })
  if (values.drift.trim() === '') faults.push({ name: 'drift', says: formWords.needed })
  if (values.enclosureId === null) return { fields: null, faults }
  return {
    fields: {
      enclosureId: values.enclosureId,
      animalIds: values.animalIds,
      productId: values.productId,
      lotId: values.lotId,
      doseLineId: values.doseLineId,
      problem: values.problem.trim(),
      use: values.use,
      target: entered(values.target),
      basis: values.basis,
      timing: values.timing,
      contactMinutes,
      doses,
      intervalHours,
      startsAt: instantOfMoment(values.startsAt, zone),
      setting: values.setting,
      division: entered(values.division),
      stopIf: values.stopIf.trim(),
      instructions: values.instructions.trim(),
      allowedVolumeDriftPercent: allowedVolumeDriftPercent ?? Number(usualDriftPercent),
      stated: values.stated,
      ...(values.bench === undefined ? {} : { bench: values.bench }),
    },
    faults,
  }
}

const { contactMinutes, doses, intervalHours, allowedVolumeDriftPercent: drift } = BathOrderFields.shape
const shapes = { contactMinutes, doses, intervalHours, drift }

/** The form shows minutes; what differs by seconds is the same to whoever reads it. */
const minuteOf = (at: string | null) => (at === null ? null : Math.floor(Date.parse(at) / 60_000))

/** Names of the fields in which two orders differ, in the order of the form. */
export function differences(a: BathOrderFields, b: BathOrderFields): (keyof BathOrderFields)[] {
  const text = (value: unknown) => JSON.stringify(value)
  return (Object.keys(BathOrderFields.shape) as (keyof BathOrderFields)[]).filter((name) => {
    if (name === 'bench') return text(a.bench ?? null) !== text(b.bench ?? null)
    if (name === 'startsAt') return minuteOf(a.startsAt) !== minuteOf(b.startsAt)
    if (name === 'animalIds') return text([...a.animalIds].sort()) !== text([...b.animalIds].sort())
    return text(a[name]) !== text(b[name])
  })
}
