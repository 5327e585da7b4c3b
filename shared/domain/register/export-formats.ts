/**
 * Forms in which a history leaves the house: pages, one event a row (literal, or guarded against spreadsheets that run
 * cells as formulas), everything with totals, and rows in the terms of Darwin Core.
 */
export const exportFormats = ['pdf', 'csv', 'csv-guarded', 'json', 'darwin-core'] as const
export type ExportFormat = (typeof exportFormats)[number]
