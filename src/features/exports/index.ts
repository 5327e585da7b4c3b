export { historyQuery } from './queries.ts'
export { HistoryFacts, HistoryView } from './history-view.tsx'
export { ExportPanel } from './export-panel.tsx'
export { ExportsList } from './exports-list.tsx'
