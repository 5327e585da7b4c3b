import { counted, defineMessages } from './define-messages.ts'

/** Words of the sheet of the rules: what each asks and why, and the thresholds of this facility. */
export const ruleSheetWords = defineMessages({
  title: 'Rules of the cautions',
  place: 'Settings',
  source:
    'What an order and a dose are checked against, why, and by which figures. A project default works until a veterinarian confirms it or another for this facility.',
  what: 'the rules',
  search: 'Rule, finding, source or threshold',
  count: (p: { shown: number; all: number }) => `${String(p.shown)} of ${counted(p.all, 'rule', 'rules')}`,
  none: 'There are no rules',
  noneBody: 'The server has sent none. Tell the administrator: no caution can be judged without them.',
  openAll: 'Open every rule',
  closeAll: 'Close every rule',
  print: 'Print the rules shown',

  level: 'Level',
  anyLevel: 'Every level',
  when: 'Judged',
  anyWhen: 'At any time',
  override: 'Override',
  anyOverride: 'May be overridden or not',
  overridable: 'A veterinarian may override it with a signed reason',
  notOverridable: 'Nobody may override it',
  overridableInShort: 'May be overridden',
  notOverridableInShort: 'No override',
  standing: 'Thresholds',
  anyStanding: 'Any standing',
  waitsInShort: (p: { count: number }) => counted(p.count, 'proposal waits', 'proposals wait'),

  routes: 'Asked for',
  effects: 'Brings',
  sources: 'Sources',
  sourceAndMark: (p: { citation: string; mark: string }) => `${p.citation} (${p.mark})`,
  findings: 'What it can find',
  resolves: 'Any one of these resolves it:',
  thresholds: 'Thresholds',
  noThresholds: 'It has no threshold that a facility could set.',

  inForce: 'In force',
  defaultIs: 'Project default',
  range: 'May be confirmed',
  rangeIs: (p: { least: string; most: string }) => `${p.least} to ${p.most}`,
  freely: 'Freely moved',
  freelyLower: 'down; higher loosens the rule',
  freelyHigher: 'up; lower loosens the rule',
  origin: 'Source of the default',
  notConfirmed: 'Project default, not confirmed here',
  confirmedBy: (p: { by: string; on: string; where: string; why: string }) =>
    `Confirmed by ${p.by} on ${p.on} for ${p.where}: ${p.why}`,
  loosened: 'Loosened here',
  waiting: (p: { value: string; by: string; at: string; why: string }) =>
    `Waits for confirmation: ${p.value}, proposed by ${p.by}, ${p.at}: ${p.why}`,
  history: (p: { count: number; name: string }) =>
    `History of ${p.name}: ${counted(p.count, 'value', 'values')}`,
  historyProposed: (p: { by: string; at: string; why: string }) => `proposed by ${p.by}, ${p.at}: ${p.why}`,
  historyConfirmed: (p: { by: string; at: string; where: string; why: string }) =>
    `confirmed by ${p.by}, ${p.at}, for ${p.where}: ${p.why}`,
  historyNotConfirmed: 'never confirmed',
  historyLoosens: 'It loosens the rule.',

  propose: 'Propose another value',
  proposeFor: (p: { rule: string; name: string }) => `Propose another value for ${p.rule}, ${p.name}`,
  proposeQuestion: (p: { rule: string; name: string }) => `Which value for ${p.rule}, ${p.name}?`,
  proposeBody: 'It is not in force until a veterinarian with a valid licence confirms it.',
  value: (p: { unit: string }) => (p.unit === '' ? 'New value' : `New value, in ${p.unit}`),
  valueHint: (p: { least: string; most: string; standard: string }) =>
    `From ${p.least} to ${p.most}; the project default is ${p.standard}.`,
  reason: 'Why',
  proposeAct: 'Propose it',
  proposed: 'Proposed. It is in force once it is confirmed.',
  back: 'Back',

  confirm: 'Confirm',
  confirmFor: (p: { rule: string; name: string; value: string }) =>
    `Confirm ${p.value} for ${p.rule}, ${p.name}`,
  confirmQuestion: (p: { rule: string; name: string; value: string }) =>
    `Put ${p.value} in force for ${p.rule}, ${p.name}?`,
  confirmBody: (p: { now: string }) =>
    `Now ${p.now}. Orders and doses are judged by the new value from the moment you confirm it; your name and the day stand beside it.`,
  confirmLoosens:
    'It loosens the rule: it lets through what the project default would not. Every caution it touches will say so.',
  confirmLegal:
    'The default was read at its source, a law or a label. Say which jurisdiction allows the value you confirm.',
  jurisdiction: 'Jurisdiction',
  jurisdictionHint: 'As the facility’s list of accepted jurisdictions has it.',
  confirmReason: 'How it was checked',
  password: 'Your password, again',
  confirmed: 'Confirmed and in force.',
})

/** How a threshold stands. */
export const thresholdStandings = defineMessages({
  default: 'Project default, not confirmed here',
  confirmed: 'Confirmed here',
  waiting: 'A proposal waits',
  loosened: 'Loosened here',
})

/** What became of a value that was proposed. */
export const thresholdVersionStates = defineMessages({
  proposed: 'Waits for confirmation',
  confirmed: 'In force',
  superseded: 'Another has taken its place',
})
