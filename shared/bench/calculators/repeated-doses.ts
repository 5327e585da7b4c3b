import { ok, refuse, type Result } from '../../domain/result.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { concentrationAfterLoss, shareKept } from '../../domain/water/flow/losses.ts'
import { doseCourse, halfLifeOfReadings, type DoseCourse } from '../../domain/water/flow/repeated-doses.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type BenchLine, type Outcome } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'

const concentrations = ['mg/L', 'ug/L', 'g/L'] as const
const times = ['h', 'd', 'min', 'week'] as const
const longestMinutes = 60_000_000
const minutesPerHour = 60
const mostRows = 60
/** Two tests nearer to each other than this say more of the test than of the loss. @source project-default */
const closeShare = 0.8

/** Doses one after another with a loss between them: how high they climb; what a loss leaves; the half-life that tests show. */
export const repeatedDoses = defineCalculator({
  id: 'repeated-doses',
  group: 'dose',
  words: defineMessages({
    name: 'Repeated doses and loss',
    purpose:
      'How high doses climb when some of each is lost before the next, what a loss leaves, or the half-life that two tests show.',
    formula: 'left = now × 2 ^ (−time ÷ half-life); peak in the end = dose ÷ (1 − share left)',
    'input.find': 'What to find',
    'option.find.course': 'The course of several doses',
    'option.find.left': 'What a loss has left after a time',
    'option.find.half-life': 'The half-life that two tests show',
    'input.dose': 'What one dose adds',
    'help.dose': 'As a rise of the concentration, all doses on one basis.',
    'input.present': 'Concentration before the first dose',
    'input.interval': 'Time from one dose to the next',
    'input.doses': 'Number of doses',
    'input.changed': 'Share of the water changed between two doses',
    'input.halfLife': 'Half-life in this water',
    'help.halfLife': 'Left open in a course, nothing is lost but by water changes.',
    'input.most': 'Highest concentration that is allowed',
    'help.most': 'As the order says; a peak above it is said.',
    'input.initial': 'Concentration at the start',
    'input.second': 'Concentration at the end',
    'input.secondError': 'Error of the test at the end',
    'input.elapsed': 'Time between',
    'result.peak': 'After the last dose',
    'result.due': 'Left when one more would be due',
    'result.kept': 'Share left from one dose to the next',
    'result.steady-peak': 'Peak that doses without end come to',
    'result.steady-trough': 'Lowest between them',
    'result.left': 'Left after the time',
    'result.share-left': 'Share left',
    'result.half-life': 'Half-life',
    'column.dose': 'Dose',
    'column.hours': 'Hours',
    'column.before': 'Before it',
    'column.after': 'After it',
    'line.kept': 'Share left from one dose to the next',
    'line.dose': (p: { dose: string }) => `After dose ${p.dose}`,
    'line.due': 'Left when one more would be due',
    'line.steady-peak': 'Peak in the end',
    'line.steady-trough': 'Lowest in the end',
    'line.share-left': 'Share left',
    'line.left': 'Left after the time',
    'line.half-life': 'Half-life',
    'refusal.reading-did-not-fall':
      'The concentration did not fall between the two tests: there is no half-life in them. Check that nothing was added.',
    'caution.adds-up':
      'Nothing is lost in this: every dose stays and the concentration climbs without end. Test before each dose.',
    'caution.above-allowed':
      'A dose of this course goes above the highest concentration that is allowed. Give less, wait longer, or change water before it.',
    'caution.above-in-the-end':
      'These doses stay below the highest concentration that is allowed, but more of them would go above it.',
    'caution.close':
      'The two tests are so close that the error of the test decides. Wait longer, or test several times.',
    'caution.first-order':
      'A half-life holds for one water at one temperature, light and biofilter; a filter that learns a drug loses it faster each time. Test, and do not dose by this alone.',
  }),
  inputs: {
    find: choice(['course', 'left', 'half-life']),
    dose: quantity({
      units: concentrations,
      limits: { above: 0, max: 1_000_000 },
      when: { find: ['course'] },
    }),
    present: quantity({
      units: concentrations,
      limits: { min: 0, max: 1_000_000 },
      optional: true,
      when: { find: ['course'] },
    }),
    interval: quantity({
      units: times,
      limits: { above: 0, max: longestMinutes },
      when: { find: ['course'] },
    }),
    doses: quantity({
      units: ['ratio'],
      whole: true,
      limits: { min: 1, max: mostRows },
      when: { find: ['course'] },
    }),
    changed: quantity({
      units: ['percent'],
      limits: { min: 0, max: 100 },
      optional: true,
      when: { find: ['course'] },
    }),
    initial: quantity({
      units: concentrations,
      limits: { min: 0, max: 1_000_000 },
      when: { find: ['left', 'half-life'] },
    }),
    second: quantity({
      units: concentrations,
      limits: { above: 0, max: 1_000_000 },
      when: { find: ['half-life'] },
    }),
    secondError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'second',
      when: { find: ['half-life'] },
    }),
    halfLife: quantity({
      units: times,
      limits: { above: 0, max: longestMinutes },
      optional: true,
      when: { find: ['course', 'left'] },
    }),
    elapsed: quantity({
      units: times,
      limits: { above: 0, max: longestMinutes },
      when: { find: ['left', 'half-life'] },
    }),
    most: quantity({
      units: concentrations,
      limits: { above: 0 },
      optional: true,
      when: { find: ['course'] },
    }),
  },
  fields: {
    doseMgPerL: 'dose',
    changePercent: 'changed',
    halfLifeHours: 'halfLife',
    intervalHours: 'interval',
    initialMgPerL: 'initial',
    firstMgPerL: 'initial',
    secondMgPerL: 'second',
    hours: 'elapsed',
  },
  example: {
    find: 'course',
    dose: { value: '1', unit: 'mg/L' },
    interval: { value: '24', unit: 'h' },
    doses: { value: '4', unit: 'ratio' },
    changed: { value: '25', unit: 'percent' },
    halfLife: { value: '14', unit: 'h' },
    most: { value: '1.3', unit: 'mg/L' },
  },
  sources: ['stirred-tank'],
  cautions: [{ code: 'first-order', level: 'warning' }],
  plot: { across: 'hours', up: 'after' },
  published: ['repeat_dose_peak_steady_state', 'concentration_after_first_order_loss'],
  compute(given) {
    const { find, dose, interval, doses, initial, second, halfLife, elapsed } = given
    if (find === 'course') {
      if (!dose || !interval || !doses) return refuse('blank', 'dose', { unit: 'mg/L' })
      return course({ ...given, dose, interval, doses })
    }
    if (!initial || !elapsed) return refuse('blank', 'initial', { unit: 'mg/L' })
    if (find === 'left')
      return halfLife ? left(initial, halfLife, elapsed) : refuse('blank', 'halfLife', { unit: 'h' })
    return second ? halfLifeFound(initial, second, elapsed) : refuse('blank', 'second', { unit: 'mg/L' })
  },
})

const hoursIn = (time: ParsedQuantity) => time.value / minutesPerHour

interface Course {
  dose: ParsedQuantity
  interval: ParsedQuantity
  doses: ParsedQuantity
  present: ParsedQuantity | undefined
  changed: ParsedQuantity | undefined
  halfLife: ParsedQuantity | undefined
  most: ParsedQuantity | undefined
}

function course(given: Course): Result<Outcome> {
  const { dose, interval, doses, present, changed, halfLife, most } = given
  const found = doseCourse({
    doseMgPerL: dose.value,
    initialMgPerL: present?.value ?? 0,
    changePercent: changed?.value ?? 0,
    ...(halfLife ? { halfLifeHours: hoursIn(halfLife) } : {}),
    intervalHours: hoursIn(interval),
    doses: doses.value,
  })
  if (!found.ok) {
    const { refusal } = found
    return refusal.field === 'hours' ? { ok: false, refusal: { ...refusal, field: 'interval' } } : found
  }
  const { steps, keptPercent, afterLastMgPerL, steady } = found.value
  const peak = steps.at(-1)?.afterMgPerL ?? 0
  return ok({
    figures: [
      { key: 'peak', value: peak, unit: 'mg/L', kind: 'reading' },
      { key: 'due', value: afterLastMgPerL, unit: 'mg/L', kind: 'reading' },
      { key: 'kept', value: keptPercent, unit: 'percent', kind: 'reading' },
      ...(steady
        ? ([
            { key: 'steady-peak', value: steady.peakMgPerL, unit: 'mg/L', kind: 'reading' },
            { key: 'steady-trough', value: steady.troughMgPerL, unit: 'mg/L', kind: 'reading' },
          ] as const)
        : []),
    ],
    working: courseLines(given, found.value),
    schedule: {
      columns: [
        { key: 'dose', unit: 'ratio', whole: true },
        { key: 'hours', unit: 'h' },
        { key: 'before', unit: 'mg/L' },
        { key: 'after', unit: 'mg/L' },
      ],
      rows: steps.map((step) => [step.dose, step.hours, step.beforeMgPerL, step.afterMgPerL]),
    },
    cautions: courseCautions(found.value, most?.value),
  })
}

function courseLines({ dose, interval, present, changed, halfLife }: Course, found: DoseCourse): BenchLine[] {
  const { keptPercent, steps, afterLastMgPerL, steady } = found
  const factors = [
    ...(changed ? [`(1 - ${enteredTerm(changed)} / 100)`] : []),
    ...(halfLife ? [`2^(-${enteredTerm(interval)} / (${enteredTerm(halfLife)}))`] : []),
    '100',
  ]
  const [kept, added] = [valueTerm(keptPercent, 'percent'), enteredTerm(dose)]
  const before = (at: number) => {
    const earlier = steps[at - 1]
    if (earlier) return `${valueTerm(earlier.afterMgPerL, 'mg/L')} * ${kept} / 100`
    return present ? enteredTerm(present) : '0 mg/L'
  }
  const keyOf = (at: number) => `dose-${String(at + 1)}`
  const last = steps.length
  return [
    line('kept', factors.join(' * '), keptPercent, 'percent'),
    ...steps.map((step, at) =>
      line(
        keyOf(at),
        `${before(at)} + ${added} to mg/L`,
        step.afterMgPerL,
        'mg/L',
        at === 0 ? [] : ['kept', keyOf(at - 1)],
        { code: 'dose', params: { dose: step.dose } },
      ),
    ),
    line('due', `${before(last)} to mg/L`, afterLastMgPerL, 'mg/L', ['kept', keyOf(last - 1)]),
    ...(steady
      ? [
          line('steady-peak', `${added} / (1 - ${kept} / 100) to mg/L`, steady.peakMgPerL, 'mg/L', ['kept']),
          line(
            'steady-trough',
            `${valueTerm(steady.peakMgPerL, 'mg/L')} * ${kept} / 100 to mg/L`,
            steady.troughMgPerL,
            'mg/L',
            ['steady-peak', 'kept'],
          ),
        ]
      : []),
  ]
}

function courseCautions({ steps, steady }: DoseCourse, mostMgPerL: number | undefined): BenchCaution[] {
  const cautions: BenchCaution[] = steady ? [] : [{ code: 'adds-up', level: 'warning' }]
  if (mostMgPerL === undefined) return cautions
  if (steps.some((step) => step.afterMgPerL > mostMgPerL))
    return [...cautions, { code: 'above-allowed', level: 'warning' }]
  const inTheEnd = steady === undefined || steady.peakMgPerL > mostMgPerL
  return inTheEnd ? [...cautions, { code: 'above-in-the-end', level: 'warning' }] : cautions
}

function left(initial: ParsedQuantity, halfLife: ParsedQuantity, elapsed: ParsedQuantity): Result<Outcome> {
  const time = { halfLifeHours: hoursIn(halfLife), hours: hoursIn(elapsed) }
  const kept = shareKept(time)
  if (!kept.ok) return kept
  const rest = concentrationAfterLoss({ ...time, initialMgPerL: initial.value })
  if (!rest.ok) return rest
  const percent = kept.value * 100
  const power = `2^(-${enteredTerm(elapsed)} / (${enteredTerm(halfLife)}))`
  return ok({
    figures: [
      { key: 'left', value: rest.value, unit: 'mg/L', kind: 'reading' },
      { key: 'share-left', value: percent, unit: 'percent', kind: 'reading' },
    ],
    working: [
      line('share-left', `${power} * 100`, percent, 'percent'),
      line(
        'left',
        `${enteredTerm(initial)} * ${valueTerm(percent, 'percent')} / 100 to mg/L`,
        rest.value,
        'mg/L',
        ['share-left'],
      ),
    ],
  })
}

function halfLifeFound(
  first: ParsedQuantity,
  second: ParsedQuantity,
  elapsed: ParsedQuantity,
): Result<Outcome> {
  const found = halfLifeOfReadings({
    firstMgPerL: first.value,
    secondMgPerL: second.value,
    hours: hoursIn(elapsed),
  })
  if (!found.ok) return found
  const expression = `${enteredTerm(elapsed)} * log(2) / log((${enteredTerm(first)}) / (${enteredTerm(second)})) to hour`
  return ok({
    figures: [{ key: 'half-life', value: found.value, unit: 'h', figures: 3, kind: 'reading' }],
    working: [line('half-life', expression, found.value, 'h')],
    cautions: second.value > first.value * closeShare ? [{ code: 'close', level: 'warning' }] : [],
  })
}
