export { ObservationSheet } from './observation-sheet.tsx'
export { Rounds } from './rounds.tsx'
export { Unsent } from './unsent.tsx'
export { UrgentSheet } from './urgent-sheet.tsx'
