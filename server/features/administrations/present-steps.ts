import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { cautionRules } from '../../../shared/domain/cautions/caution-rules.ts'
import { changedParameters } from '../../../shared/domain/cautions/changed-parameters.ts'
import type { ChangedParameter } from '../../../shared/domain/cautions/changed-parameters.ts'
import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import type { Caution } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { sayLoosened, sayParameterName, sayParameterValue } from '../../../shared/messages/say-parameter.ts'
import type { DoseSituation } from './dose-situation.ts'
import { answeredStop } from './judge-dose.ts'
import { placesToResolve } from './places-to-resolve.ts'
import { secondStands } from './second-person.ts'
import type { Calculations } from './second-person.ts'

type Step = BathSheet['steps'][number]

const textsOf = (cautions: readonly Caution[], zone: string) => [
  ...new Set(cautions.map((one) => sayCaution(one, zone).text)),
]

/** Whether every one of some stops was answered with a signed reason. */
const isAnswered = (situation: DoseSituation, stops: readonly Caution[]) =>
  stops.length > 0 && stops.every((one) => answeredStop(situation, one) !== null)

function changedOf({ content, facts, settings }: DoseSituation, ruleId: string): ChangedParameter[] {
  const rule = cautionRules.find(({ id }) => id === ruleId)
  if (!rule || !facts) return []
  return changedParameters(rule, { facts, stage: 'start', then: content.settings ?? {}, now: settings })
}

/** What the rule of a step would find by the limits of the signature. */
function foundAsSigned({ content, facts }: DoseSituation, ruleId: string): Caution[] {
  if (!facts) return []
  return evaluateCautions({
    facts,
    stage: 'start',
    settings: content.settings ?? {},
    factsAtSigning: content.facts as unknown as CautionFacts,
  }).cautions.filter((one) => one.ruleId === ruleId)
}

/**
 * What a step says of what was found. A step shows the limit that was signed, and no other: where the facility has another
 * one by now, that stands in sentences of its own, with what only it finds. What stops is judged by the one in force.
 */
function wordsOf(
  situation: DoseSituation,
  ruleId: string,
  fired: readonly Caution[],
  zone: string,
): Pick<Step, 'help' | 'changed'> {
  const changes = changedOf(situation, ruleId)
  // a rule may find several things: whoever resolves one of them knows of the other
  const said = (cautions: readonly Caution[]) => textsOf(cautions, zone).join(' ') || null
  if (changes.length === 0) return { help: said(fired), changed: [] }
  const signed = foundAsSigned(situation, ruleId)
  const found = new Set(signed.map(({ code }) => code))
  const both = fired.filter(({ code }) => found.has(code))
  return {
    help: said(signed.filter(({ code }) => both.some((one) => one.code === code))),
    changed: [
      ...changes.map(({ now }) =>
        doseWords.limitChanged({
          limit: sayParameterValue(now.value, now.unit),
          name: sayParameterName(now.key),
        }),
      ),
      ...textsOf(
        fired.filter(({ code }) => !found.has(code)),
        zone,
      ),
      ...new Set(both.flatMap((one) => sayLoosened(one.settings))),
    ],
  }
}

/** The conditions of the signature, each judged by the limits in force. */
export function presentSteps(situation: DoseSituation, calculations: Calculations, zone: string): Step[] {
  const cautions = situation.answer?.cautions ?? []
  const agreed = secondStands(calculations)
  return situation.content.conditions.map(({ ruleId, level, text, secondCalculation }) => {
    const step = { ruleId, level, text, help: null, changed: [], resolve: [], place: null, overridden: false }
    if (secondCalculation)
      return {
        ...step,
        state: agreed ? ('met' as const) : ('unmet' as const),
        place: 'second-calculation' as const,
      }
    const fired = cautions.filter((one) => one.ruleId === ruleId)
    const words = wordsOf(situation, ruleId, fired, zone)
    if (fired.length === 0) return { ...step, ...words, state: 'met' as const }
    return {
      ...step,
      ...words,
      state: fired.every((one) => one.unknownFacts.length > 0) ? ('unknown' as const) : ('unmet' as const),
      resolve: [...new Set(fired.flatMap((one) => sayCaution(one, zone).resolves))],
      overridden: isAnswered(
        situation,
        fired.filter((one) => one.level === 'stop'),
      ),
      place:
        fired
          .flatMap((one) => one.resolvedBy.map((code) => placesToResolve[code]))
          .find((place) => place !== undefined) ?? null,
    }
  })
}
