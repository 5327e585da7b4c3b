export { BathSheet, DoseOfNow } from './bath-sheet.tsx'
