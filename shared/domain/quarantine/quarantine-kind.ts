/**
 * The kinds by which quarantine practice tells one group of animals from another (rule K01). A wrasse added to tangs is
 * the same kind, whatever its taxonomic order.
 *
 * @source quarantine-practice (the first five V), project-default (invertebrate)
 */
export const quarantineKinds = ['fish', 'amphibian', 'reptile', 'bird', 'mammal', 'invertebrate'] as const

export type QuarantineKind = (typeof quarantineKinds)[number]
