import { type QuarantineKind, quarantineKinds } from '../quarantine/quarantine-kind.ts'

/** The kinds by which quarantine tells animals apart, under the name that contracts and tables of taxa use. */
export const quarantineKindNames = quarantineKinds
export type QuarantineKindName = QuarantineKind

/**
 * Groups of taxa as the rules of treatment and quarantine tell them apart: a group is what a caution asks for, not a
 * rank of the taxonomy. Salmonids and sturgeons stand apart from the other bony fish because label ceilings do.
 *
 * @source cfr-529-1030 (salmonid, Acipenseriformes, penaeid shrimp), project-default (the rest)
 */
export const taxonGroups = {
  teleost: 'fish',
  salmonid: 'fish',
  sturgeon: 'fish',
  elasmobranch: 'fish',
  'other-fish': 'fish',
  amphibian: 'amphibian',
  reptile: 'reptile',
  bird: 'bird',
  mammal: 'mammal',
  'penaeid-shrimp': 'invertebrate',
  crustacean: 'invertebrate',
  cephalopod: 'invertebrate',
  mollusc: 'invertebrate',
  coral: 'invertebrate',
  jelly: 'invertebrate',
  echinoderm: 'invertebrate',
  'other-invertebrate': 'invertebrate',
} as const satisfies Record<string, QuarantineKindName>

export type TaxonGroup = keyof typeof taxonGroups
export const taxonGroupNames = Object.keys(taxonGroups) as [TaxonGroup, ...TaxonGroup[]]

/** The quarantine kind of a group: fish of whatever order are one kind. */
export function quarantineKindOf(group: TaxonGroup): QuarantineKindName {
  return taxonGroups[group]
}
