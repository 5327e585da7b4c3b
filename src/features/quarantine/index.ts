export { QuarantineBoard } from './board.tsx'
export { CaseSheet } from './case-sheet.tsx'
export { caseQuery, quarantineKey } from './queries.ts'
