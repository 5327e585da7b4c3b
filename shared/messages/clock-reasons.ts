import type { ClockReasonCode, ClockReasonParams } from '../domain/quarantine/clock-reason.ts'
import { counted, defineMessages } from './define-messages.ts'
import { sayWhoCame } from './say-who-came.ts'

type Sentences = { [Code in ClockReasonCode]: (params: ClockReasonParams[Code]) => string }

const days = (count: number) => counted(count, 'day', 'days')
const because = (cause: string) => (cause === '' ? '' : `: ${cause}`)
const pathogen = (name: string) => (name === '' ? 'the finding' : name)
const faults = {
  'life-support-failure': 'life support had failed',
  'temperature-out-of-range': 'the temperature was outside its range',
}
const breaches = {
  escape: 'an animal crossed over from a unit of lower status',
  splash: 'water splashed over from a unit of lower status',
  net: 'a net was shared with a unit of lower status',
  other: 'there was contact with a unit of lower status',
}
function hoursAndMinutes(minutes: number): string {
  const hours = Math.floor(minutes / 60)
  const rest = Math.round(minutes - hours * 60)
  if (hours === 0) return counted(rest, 'minute', 'minutes')
  return rest === 0
    ? counted(hours, 'hour', 'hours')
    : `${counted(hours, 'hour', 'hours')} ${counted(rest, 'minute', 'minutes')}`
}

/** One sentence for each change of a quarantine clock. Dates, instants and names come in already written out. */
export const clockReasons = defineMessages({
  started: (p) => `Day 0 is ${p.day0On}, the day the last of the batch came in.`,
  'restarted-animals': (p) =>
    `Restarted on ${p.happenedOn} because ${sayWhoCame(p)} entered ${p.water === 'same-water' ? 'the same' : 'connected'} water.`,
  'restarted-wet-material': (p) =>
    `Restarted on ${p.happenedOn} because wet material (rock, plants or media) entered the water.`,
  'restarted-same-room': (p) =>
    `Restarted on ${p.happenedOn} because ${sayWhoCame(p)} of the same kind came into the same room.`,
  'restarted-gear': (p) => `Restarted on ${p.happenedOn} because gear was shared without being disinfected.`,
  'restarted-breach': (p) => `Restarted on ${p.happenedOn} because ${breaches[p.how]}.`,
  'restarted-after-positive': (p) =>
    `Restarted on ${p.endedOn}, the day the treatment of ${pathogen(p.pathogenName)} ended.`,
  'restarted-shared-water': (p) =>
    `Day 0 has been ${p.day0On} since ${p.happenedOn}, because cases on one water count from the latest day 0 among them, here that of ${p.otherCaseId}.`,
  'no-restart-other-kind': (p) =>
    `No restart on ${p.happenedOn}: ${sayWhoCame(p)} came into the same room, but of another kind and in other water.`,
  'no-restart-other-water': (p) =>
    `No restart on ${p.happenedOn}: wet material came into the same room, but into other water.`,
  'no-restart-status': (p) =>
    `No restart on ${p.happenedOn}: the contact was with a unit of the same or higher status.`,
  'no-restart-counted': (p) => `No restart for ${p.happenedOn}: day 0 is ${p.day0On}, which is not earlier.`,
  'shared-water': (p) =>
    `Shares water with ${p.otherCaseId} since ${p.happenedOn}. This day 0 is the latest on that water, so it stays.`,
  'extended-death': (p) =>
    `Extended to ${p.untilOn}: ${days(p.days)} from ${p.happenedOn}, when ${p.deathCount === 1 ? 'an animal' : counted(p.deathCount, 'animal', 'animals')} died without a known cause.`,
  'extended-transmissible-death': (p) =>
    `Extended to ${p.untilOn}: ${days(p.days)} from the death of ${p.happenedOn}, signed as transmissible${because(p.cause)}.`,
  'death-explained': (p) =>
    `The death of ${p.happenedOn} no longer extends: its cause was signed on ${p.signedOn} as explained and not transmissible${because(p.cause)}.`,
  'transport-death': (p) =>
    `The death of ${p.happenedOn}, ${counted(p.hours, 'hour', 'hours')} after arrival, is put down to the journey (up to ${counted(p.limitHours, 'hour', 'hours')}) and does not extend.`,
  'extended-signs': (p) =>
    `Extended to ${p.untilOn}: ${days(p.days)} from ${p.happenedOn}, when new clinical signs were seen${because(p.signs)}.`,
  'extended-masking': (p) =>
    `Extended to ${p.untilOn}: ${p.agentName} ended on ${p.endedOn} and can hide what the tests look for during ${days(p.days)}.`,
  'extended-masking-running': (p) =>
    `Extended at least to ${p.untilOn}: ${p.agentName}, begun on ${p.startedOn}, still runs and can hide what the tests look for until ${days(p.days)} after its end.`,
  'not-masking': (p) => `${p.agentName} on ${p.happenedOn} hides nothing from the tests and changes nothing.`,
  'masking-continues': (p) =>
    `${p.agentName} on ${p.happenedOn} changes nothing: a veterinarian lets it run on past clearance.`,
  'extended-not-feeding': (p) =>
    `Extended until a veterinarian ends it: ${p.subject} was reported not feeding on ${p.happenedOn} and did not feed by half way, ${p.halfWayOn}.`,
  'extended-positive': (p) =>
    `Extended until its criterion is met again: ${pathogen(p.pathogenName)} was found in the sample of ${p.takenOn}.`,
  'extension-ended': (p) => `A veterinarian ended the extension on ${p.endedOn}.`,
  paused: (p) =>
    `Stood still for ${hoursAndMinutes(p.minutes)}, from ${p.fromAt} to ${p.untilAt}, because ${faults[p.cause]}.`,
  'pause-running': (p) =>
    `Stands still since ${p.fromAt}, ${hoursAndMinutes(p.minutes)} so far, because ${faults[p.cause]}.`,
  'paused-shared-water': (p) =>
    `Stood still for ${hoursAndMinutes(p.minutes)}, from ${p.fromAt} to ${p.untilAt}, with ${p.otherCaseId} on the same water.`,
  'no-pause-short': (p) =>
    `The temperature was outside its range from ${p.fromAt} to ${p.untilAt}. A spell of up to ${counted(p.limitHours, 'hour', 'hours')} does not count.`,
  'locked-positive': (p) =>
    `Locked on ${p.reportedOn}, when ${pathogen(p.pathogenName)} was reported, until its treatment ends or a veterinarian decides.`,
  'locked-suspicion': (p) => `Locked on ${p.happenedOn} on suspicion of a notifiable disease.`,
  'locked-by-vet': (p) => `Locked on ${p.happenedOn} by a veterinarian.`,
  held: (p) => `Held on ${p.happenedOn}. A veterinarian lifts the hold.`,
  'locked-shared-water': (p) => `Locked since ${p.happenedOn} with ${p.otherCaseId}, whose water it shared.`,
  recalled: (p) =>
    `Recalled on ${p.reportedOn}: ${pathogen(p.pathogenName)} was found in a sample taken before clearance, on ${p.takenOn}.`,
  unlocked: (p) => `Lifted on ${p.happenedOn} by a veterinarian.`,
  'negatives-counted': (p) => `Negative ${p.testKey} of ${p.takenOn}: ${p.count} of ${p.wanted} in a row.`,
  'negative-not-counted': (p) =>
    `Negative ${p.testKey} of ${p.takenOn} does not add to the row: it was taken less than ${days(p.daysApart)} after the one before.`,
  'negative-before-day0': (p) =>
    `Negative ${p.testKey} of ${p.takenOn} does not count: it was taken before day 0, ${p.day0On}.`,
  'negatives-reset': (p) => `Positive ${p.testKey} of ${p.takenOn}: the row of negatives begins again at 0.`,
  'repeat-due': (p) =>
    `${p.testKey} of ${p.takenOn} was ${p.result === 'inconclusive' ? 'inconclusive' : 'not enough to test'}: it neither counts nor resets, and has to be repeated.`,
  'criterion-met': (p) => `${p.criterionId}: met on ${p.metOn}.`,
  'criterion-not-met': (p) => `${p.criterionId}: declared not met on ${p.happenedOn}.`,
  'cleared-animals-exposed': (p) =>
    `On ${p.happenedOn} this water became connected to water of cleared animals${p.animalCount > 0 ? ` (${p.animalCount})` : ''}. They are marked exposed until a veterinarian decides.`,
  'exposure-decided': (p) =>
    `A veterinarian decided on ${p.happenedOn} about the exposed animals: ${p.decision === 'new-case' ? 'a new case' : 'no new case'}.`,
  'protocol-changed': (p) =>
    `The protocol was changed on ${p.happenedOn}: ${days(p.toDays)} instead of ${days(p.fromDays)}.`,
  cleared: (p) => `Cleared on ${p.happenedOn}.`,
  'transferred-out': (p) => `The whole batch was transferred to another quarantine on ${p.happenedOn}.`,
} satisfies Sentences)
