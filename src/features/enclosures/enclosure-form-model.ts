import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { correctEnclosure, Enclosure } from '../../../shared/contracts/enclosures.contract.ts'
import type { EnclosureKind } from '../../../shared/domain/places/enclosure-kind.ts'

/** The form of an enclosure: everything is text until it is sent. */
export interface EnclosureFields {
  code: string
  name: string
  kind: EnclosureKind | ''
  area: string
  boundary: string
  airSpace: string
  treatmentVessel: boolean
  mark: string
  markVolume: { value: string; unit: string }
  description: string
}

export const emptyFields: EnclosureFields = {
  code: '',
  name: '',
  kind: '',
  area: '',
  boundary: '',
  airSpace: '',
  treatmentVessel: false,
  mark: '',
  markVolume: { value: '', unit: 'L' },
  description: '',
}

/** The form filled with what is known of an enclosure. */
export function fieldsOf(enclosure: Enclosure): EnclosureFields {
  return {
    code: enclosure.code,
    name: enclosure.name,
    kind: enclosure.kind,
    area: enclosure.area,
    boundary: enclosure.boundary ?? '',
    airSpace: enclosure.airSpace ?? '',
    treatmentVessel: enclosure.treatmentVessel,
    mark: enclosure.fillMark?.mark ?? '',
    markVolume: enclosure.fillMark?.volume ?? emptyFields.markVolume,
    description: enclosure.description ?? '',
  }
}

type Description = Omit<BodyOf<typeof correctEnclosure>, 'expectedVersion'>

/** What a form says, as it is sent: an empty field is absent, and only a vessel has a mark. */
export function descriptionOf(fields: EnclosureFields): Description {
  const text = (typed: string) => typed.trim() || null
  return {
    name: fields.name.trim(),
    // An unchosen kind goes out as it is; the server says that it is missing
    kind: fields.kind as EnclosureKind,
    area: fields.area.trim(),
    boundary: text(fields.boundary),
    airSpace: text(fields.airSpace),
    treatmentVessel: fields.treatmentVessel,
    fillMark: fields.treatmentVessel
      ? { mark: fields.mark.trim(), volume: { ...fields.markVolume, value: fields.markVolume.value.trim() } }
      : null,
    description: text(fields.description),
  }
}

/** Pointers of the request and the fields that show their faults. */
export const fieldOfPointer: Readonly<Record<string, keyof EnclosureFields>> = {
  '/code': 'code',
  '/name': 'name',
  '/kind': 'kind',
  '/area': 'area',
  '/boundary': 'boundary',
  '/airSpace': 'airSpace',
  '/treatmentVessel': 'treatmentVessel',
  '/fillMark': 'markVolume',
  '/fillMark/mark': 'mark',
  '/fillMark/volume': 'markVolume',
  '/fillMark/volume/value': 'markVolume',
  '/description': 'description',
}
