export { dueItemsOf } from './due-items.ts'
export { TodaySheet } from './today-sheet.tsx'
