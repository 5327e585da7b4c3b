export { formularyKey, formularyQuery } from './queries.ts'
export { rangeOfLine, useOfLine } from './dose-line-text.ts'
