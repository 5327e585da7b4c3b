export { RulesSheet } from './rules-sheet.tsx'
