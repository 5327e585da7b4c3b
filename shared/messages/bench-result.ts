import { counted, defineMessages } from './define-messages.ts'

/** Words of the result of a calculator where it is said again: at the foot of a phone, and to readers of the screen. */
export const benchResultWords = defineMessages({
  figure: (p: { name: string; figure: string }) => `${p.name}: ${p.figure}`,
  warnings: (p: { count: number }) => counted(p.count, 'warning', 'warnings'),
  figureWithWarnings: (p: { figure: string; warnings: string }) => `${p.figure}, ${p.warnings}`,
  notYet: (p: { why: string }) => `No figure yet. ${p.why}`,
  toResult: 'Go to the result',
})
