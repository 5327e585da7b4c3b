export { thing } from './inside.ts'
export type { Thing } from './inside.ts'
