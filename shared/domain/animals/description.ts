/** An individual, or a group managed as one. */
export const animalForms = ['individual', 'group'] as const
export type AnimalForm = (typeof animalForms)[number]

export const sexes = ['female', 'male', 'hermaphrodite', 'mixed', 'unknown'] as const
export type Sex = (typeof sexes)[number]

/** Stages of life that labels and plausible weights tell apart. */
export const lifeStages = [
  'egg',
  'larva',
  'fry',
  'juvenile',
  'subadult',
  'adult',
  'mixed',
  'unknown',
] as const
export type LifeStage = (typeof lifeStages)[number]

/** What the day on which an animal began is called. */
export const birthKinds = ['hatched', 'born', 'propagated'] as const
export type BirthKind = (typeof birthKinds)[number]

export const identifierKinds = [
  'transponder',
  'ring',
  'flipper-tag',
  'external-tag',
  'visible-implant',
  'fin-clip',
  'natural-marks',
  'other',
] as const
export type IdentifierKind = (typeof identifierKinds)[number]

/** How a dead animal was found, and what became of the body; for whoever examines it. */
export const deathKinds = ['found-dead', 'died-seen', 'euthanised'] as const
export type DeathKind = (typeof deathKinds)[number]
export const carcassStates = ['fresh', 'softening', 'decomposed', 'not-seen'] as const
export type CarcassState = (typeof carcassStates)[number]
export const carcassPlaces = ['cooled', 'frozen', 'fixed', 'discarded', 'not-recovered'] as const
export type CarcassPlace = (typeof carcassPlaces)[number]
