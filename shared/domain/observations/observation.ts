/** What a keeper can say of an enclosure at a look. Nothing is said by default: null is "not said", never "none". */
export const feedings = ['all', 'some', 'none'] as const
export type Feeding = (typeof feedings)[number]

export const breathings = ['normal', 'fast', 'not-seen'] as const
export type Breathing = (typeof breathings)[number]

export const skins = ['clean', 'marks', 'not-seen'] as const
export type Skin = (typeof skins)[number]

export const countBases = ['counted', 'estimated', 'not-counted'] as const
export type CountBasis = (typeof countBases)[number]

/**
 * Signs with a code, so that they can be counted; everything else is said in words.
 * @source common practice, no published list
 */
export const signCodes = [
  'rubbing',
  'gasping',
  'lying-down',
  'off-balance',
  'listless',
  'hiding',
  'white-spots',
  'mucus',
  'sores',
  'torn-fins',
  'cloudy-eye',
  'bulging-eye',
  'swollen-body',
  'thin',
  'pale',
  'dark',
  'regurgitating',
  'shedding',
  'tissue-loss',
] as const
export type SignCode = (typeof signCodes)[number]

/** How many animals were seen; `low` and `high` are the same when they were counted. */
export type CountSaid =
  { basis: 'counted' | 'estimated'; low: number; high: number } | { basis: 'not-counted' } | null

/** The facts of one observation. */
export interface ObservationSaid {
  lookedAt: boolean
  feeding: Feeding | null
  breathing: Breathing | null
  skin: Skin | null
  signs: readonly SignCode[]
  words: string | null
  count: CountSaid
  /** Bodies found; null when nobody said, which is not 0. */
  foundDead: number | null
  /** How many are moribund or not eating; null when nobody said, which is not 0. */
  unwell: number | null
  /** Whether animals were netted, moved, examined or sampled within the last day; null when nobody said. */
  handled: boolean | null
  forVeterinarian: boolean
  urgent: boolean
}

/** An observation of which nothing has been said yet. */
export const nothingSaid: ObservationSaid = {
  lookedAt: false,
  feeding: null,
  breathing: null,
  skin: null,
  signs: [],
  words: null,
  count: null,
  foundDead: null,
  unwell: null,
  handled: null,
  forVeterinarian: false,
  urgent: false,
}

/**
 * What "all well" says, and nothing beyond it: looked at, feeding, breathing normal, no dead seen. Never a count, a
 * reading or a sign.
 */
export const allWell: ObservationSaid = {
  ...nothingSaid,
  lookedAt: true,
  feeding: 'all',
  breathing: 'normal',
  foundDead: 0,
}
