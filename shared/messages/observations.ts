import type { Breathing, CountBasis, Feeding, SignCode, Skin } from '../domain/observations/observation.ts'
import { capital } from './capital.ts'
import { counted, defineMessages } from './define-messages.ts'

export const feedingWords = defineMessages({
  all: 'All ate',
  some: 'Some ate',
  none: 'None ate',
} satisfies Record<Feeding, string>)

export const breathingWords = defineMessages({
  normal: 'Breathing normal',
  fast: 'Breathing fast',
  'not-seen': 'Breathing not seen',
} satisfies Record<Breathing, string>)

export const skinWords = defineMessages({
  clean: 'Skin and fins clean',
  marks: 'Marks on skin or fins',
  'not-seen': 'Skin not seen',
} satisfies Record<Skin, string>)

export const countBasisWords = defineMessages({
  counted: 'Counted',
  estimated: 'Estimated',
  'not-counted': 'Not counted',
} satisfies Record<CountBasis, string>)

export const signWords = defineMessages({
  rubbing: 'rubs on things',
  gasping: 'gasps at the surface',
  'lying-down': 'lies on the floor',
  'off-balance': 'off balance',
  listless: 'listless',
  hiding: 'hides',
  'white-spots': 'white spots',
  mucus: 'much mucus',
  sores: 'sores',
  'torn-fins': 'torn fins',
  'cloudy-eye': 'cloudy eye',
  'bulging-eye': 'bulging eye',
  'swollen-body': 'swollen body',
  thin: 'thin',
  pale: 'pale',
  dark: 'dark',
  regurgitating: 'brings up food',
  shedding: 'sheds skin',
  'tissue-loss': 'loses tissue',
} satisfies Record<SignCode, string>)

export const observationSentences = defineMessages({
  lookedAt: 'All looked at',
  countedSome: (p: { animals: string }) => `${p.animals} counted`,
  estimatedSome: (p: { low: number; high: number }) => `${p.low} to ${p.high} animals estimated`,
  noneDead: 'No dead seen',
  foundDead: (p: { count: number }) => `${counted(p.count, 'animal', 'animals')} found dead`,
  noneUnwell: 'None moribund or off its food',
  unwell: (p: { count: number }) => `${counted(p.count, 'animal', 'animals')} moribund or not eating`,
  handled: 'Handled in the last 24 h',
  notHandled: 'None handled in the last 24 h',
  whose: (p: { count: number }) => `${p.count} of them not known whose`,
})

interface Said {
  lookedAt: boolean
  feeding: Feeding | null
  breathing: Breathing | null
  skin: Skin | null
  signs: readonly SignCode[]
  words: string | null
  count: { basis: CountBasis; low?: number; high?: number } | null
  foundDead: number | null
  /** Absent in an entry that a device kept since before it could be said. */
  unwell?: number | null
  handled?: boolean | null
}

/** How many are weak and whether any were handled, as far as it was said. */
export function sayStrength({ unwell = null, handled = null }: Pick<Said, 'unwell' | 'handled'>): string[] {
  const parts: string[] = []
  if (unwell !== null)
    parts.push(
      unwell === 0 ? observationSentences.noneUnwell : observationSentences.unwell({ count: unwell }),
    )
  if (handled !== null) parts.push(handled ? observationSentences.handled : observationSentences.notHandled)
  return parts
}

/** What was said in an observation, one part a piece, in the order of the form; what was not said is not there. */
export function sayObservation(said: Said): string[] {
  const { count, foundDead } = said
  const parts: string[] = []
  if (said.feeding !== null) parts.push(feedingWords[said.feeding])
  if (said.breathing !== null) parts.push(breathingWords[said.breathing])
  if (said.skin !== null) parts.push(skinWords[said.skin])
  if (said.signs.length > 0) parts.push(capital(said.signs.map((sign) => signWords[sign]).join(', ')))
  if (count?.basis === 'counted')
    parts.push(observationSentences.countedSome({ animals: counted(count.low ?? 0, 'animal', 'animals') }))
  else if (count?.basis === 'estimated')
    parts.push(observationSentences.estimatedSome({ low: count.low ?? 0, high: count.high ?? 0 }))
  else if (count) parts.push(countBasisWords['not-counted'])
  if (foundDead !== null)
    parts.push(
      foundDead === 0 ? observationSentences.noneDead : observationSentences.foundDead({ count: foundDead }),
    )
  parts.push(...sayStrength(said))
  if (parts.length === 0 && said.words === null && said.lookedAt) parts.push(observationSentences.lookedAt)
  if (said.words !== null) parts.push(said.words)
  return parts
}
