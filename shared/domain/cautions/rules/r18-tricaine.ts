import { readingOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds, isBelow } from '../exceeds.ts'
import { known } from '../fact.ts'
import { freshReading } from '../fresh-reading.ts'

/**
 * Tricaine is a strong acid: the bath is buffered, and its pH is that of the water that the animals come from. While the
 * order is written there is no bath to measure; then only the buffer is asked for.
 */
export const tricaine = defineRule({
  id: 'R18',
  levels: ['stop'],
  when: 'both',
  overridable: true,
  parameters: {
    lowestPh: { default: 6.8, unit: 'pH', source: 'project-default', mark: 'P', tighter: 'higher' },
    differsPh: {
      default: 0.3,
      unit: 'pH',
      source: 'project-default',
      mark: 'P',
      tighter: 'lower',
      least: 0.05,
      most: 2,
    },
    temperatureAndPhHours: {
      default: 4,
      unit: 'h',
      source: 'project-default',
      mark: 'P',
      tighter: 'lower',
    },
  },
  uses: ['order.isBuffered', 'water.pH', 'water.homePh'],
  findings: {
    'tricaine-unbuffered': ['buffer-the-bath'],
    'tricaine-buffer-unknown': ['say-whether-buffered'],
    'tricaine-ph-unknown': ['read-water'],
    'tricaine-acid': ['buffer-the-bath', 'correct-water'],
    'tricaine-home-ph-unknown': ['read-water'],
    'tricaine-ph-differs': ['buffer-the-bath', 'correct-water'],
  },
  sources: [
    { source: 'tricaine-ph-study', mark: 'V' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: ({ agent }) => agent === 'tricaine',
  judge(
    { at, order: { isBuffered }, water },
    { lowestPh, differsPh, temperatureAndPhHours: maxAgeHours },
    stage,
  ) {
    const found: CautionFinding[] = []
    if (isBuffered.state !== 'known')
      found.push({
        code: 'tricaine-buffer-unknown',
        level: 'stop',
        params: {},
        resolvedBy: ['say-whether-buffered'],
        unknown: ['order.isBuffered'],
      })
    else if (!isBuffered.value)
      found.push({
        code: 'tricaine-unbuffered',
        level: 'stop',
        params: {},
        resolvedBy: ['buffer-the-bath'],
      })
    if (stage === 'design') return found

    const limit = readingOf(lowestPh, 'pH')
    const bath = freshReading(water.pH, at, maxAgeHours * 60)
    if (bath.state !== 'fresh')
      found.push({
        code: 'tricaine-ph-unknown',
        level: 'stop',
        params: { limit, maxAgeHours },
        resolvedBy: ['read-water'],
        unknown: ['water.pH'],
      })
    else if (isBelow(bath.value, lowestPh))
      found.push({
        code: 'tricaine-acid',
        level: 'stop',
        params: { reading: readingOf(bath.value, 'pH', bath.digits), limit },
        resolvedBy: ['buffer-the-bath', 'correct-water'],
      })

    const { homePh } = water
    if (homePh.state === 'not-applicable') return found
    const homes = homePh.state === 'known' ? homePh.value : []
    const fresh = homes.flatMap((home) => {
      const reading = freshReading(known(home.value, home.at), at, maxAgeHours * 60)
      return reading.state === 'fresh' ? [reading.value] : []
    })
    const most = readingOf(differsPh, 'pH')
    if (homes.length === 0 || fresh.length < homes.length)
      found.push({
        code: 'tricaine-home-ph-unknown',
        level: 'stop',
        params: { limit: most, maxAgeHours },
        resolvedBy: ['read-water'],
        unknown: ['water.homePh'],
      })
    if (bath.state !== 'fresh') return found
    const apart = (home: number) => Math.abs(home - bath.value)
    const [farthest] = [...fresh].sort((a, b) => apart(b) - apart(a))
    if (farthest !== undefined && exceeds(apart(farthest), differsPh))
      found.push({
        code: 'tricaine-ph-differs',
        level: 'stop',
        params: {
          reading: readingOf(bath.value, 'pH', bath.digits),
          home: readingOf(farthest, 'pH'),
          limit: most,
        },
        resolvedBy: ['buffer-the-bath', 'correct-water'],
      })
    return found
  },
})
