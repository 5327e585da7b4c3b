// breaks: below-app: src/lib does not import src/app
export { thing as thing11 } from '../app/thing.ts'
// breaks: below-features: src/lib does not import src/features
export { thing as thing12 } from '../features/alpha/index.ts'
// breaks: by-the-front-door: src/lib does not import src/features but by its index.ts
export { thing as thing13 } from '../features/alpha/inside.ts'
// breaks: two-sides: src does not import server
export type { Thing as Thing14 } from '../../server/platform/thing.ts'
// breaks: nothing-imports-tests: src does not import tests
export { thing as thing15 } from '../../tests/thing.ts'
