import { doseOf, readingOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { copperConcentration } from '../copper-concentration.ts'
import { exceeds, isBelow } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { freshReading } from '../fresh-reading.ts'

/**
 * Free copper in sea water has a narrow margin: too low does not treat, too high kills. The low side sleeps until the
 * last step of the ramp is reached.
 */
export const copperMarineLevel = defineRule({
  id: 'R12',
  levels: ['warning', 'stop'],
  when: 'both',
  overridable: true,
  parameters: {
    lowMgPerL: { default: 0.15, unit: 'mg/L', source: 'ufifas-fa165', mark: 'V2', tighter: 'higher' },
    highMgPerL: { default: 0.2, unit: 'mg/L', source: 'ufifas-fa165', mark: 'V2', tighter: 'lower' },
    stopMgPerL: { default: 0.25, unit: 'mg/L', source: 'project-default', mark: 'P', tighter: 'lower' },
    maxAgeHours: { default: 24, unit: 'h', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['order.target', 'order.copperCourse', 'water.kind', 'water.freeCopperMgPerL'],
  findings: {
    'copper-target-high': ['lower-target', 'choose-one-copper'],
    'copper-high': ['hold-copper'],
    'copper-very-high': ['hold-copper'],
    'copper-low': ['add-copper'],
    'copper-reading-missing': ['read-copper'],
  },
  sources: [
    { source: 'ufifas-fa165', mark: 'V2' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: ({ agent, water }) => agent === 'copper-sulfate' && valueOf(water.kind) !== 'fresh',
  judge(facts, { lowMgPerL, highMgPerL, stopMgPerL, maxAgeHours }, stage) {
    const found: CautionFinding[] = []
    const strength = copperConcentration(valueOf(facts.order.target))
    // A target of chelated copper typed into a course of ionic copper is ten times too high.
    if (valueOf(facts.water.kind) === 'marine' && strength && exceeds(strength.copperMgPerL, stopMgPerL))
      found.push({
        code: 'copper-target-high',
        level: 'stop',
        params: { target: doseOf(strength.copperMgPerL, 'mg/L'), limit: doseOf(stopMgPerL, 'mg/L') },
        resolvedBy: ['lower-target', 'choose-one-copper'],
      })
    const course = valueOf(facts.order.copperCourse)
    const level = freshReading(facts.water.freeCopperMgPerL, facts.at, maxAgeHours * 60)
    const isUnderWay = stage === 'start' || course === 'ramp' || course === 'hold'
    if (level.state !== 'fresh' && isUnderWay) {
      found.push({
        code: 'copper-reading-missing',
        level: 'stop',
        params: { maxAgeHours },
        resolvedBy: ['read-copper'],
        unknown: ['water.freeCopperMgPerL'],
      })
      return found
    }
    // Before the first dose is planned nobody has to have read copper; an old reading still tells what is in the water.
    if (level.state === 'unknown') return found
    const reading = readingOf(level.value, 'mg/L', level.digits)
    if (exceeds(level.value, stopMgPerL))
      found.push({
        code: 'copper-very-high',
        level: 'stop',
        params: { reading, limit: readingOf(stopMgPerL, 'mg/L') },
        resolvedBy: ['hold-copper'],
      })
    else if (exceeds(level.value, highMgPerL))
      found.push({
        code: 'copper-high',
        level: 'warning',
        params: { reading, limit: readingOf(highMgPerL, 'mg/L') },
        resolvedBy: ['hold-copper'],
      })
    else if (course === 'hold' && isBelow(level.value, lowMgPerL))
      found.push({
        code: 'copper-low',
        level: 'warning',
        params: { reading, limit: readingOf(lowMgPerL, 'mg/L') },
        resolvedBy: ['add-copper'],
      })
    return found
  },
})
