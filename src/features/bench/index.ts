export { CalculatorList } from './calculator-list.tsx'
export { CalculatorSheet } from './calculator-sheet.tsx'
export { loadCalculator } from './load-calculator.ts'
