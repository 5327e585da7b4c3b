/** Kinds of places that hold animals; transport is one, so that an animal on the road is somewhere. */
export const enclosureKinds = ['tank', 'pool', 'pen', 'tub', 'dip-bucket', 'land-area', 'transport'] as const
export type EnclosureKind = (typeof enclosureKinds)[number]

/** Whether a place of this kind has water of its own. A land area has none; whatever else holds animals does. */
export function hasWater(kind: EnclosureKind): boolean {
  return kind !== 'land-area'
}
