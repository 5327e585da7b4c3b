// breaks: two-sides: server does not import src
export { thing as thing27 } from '../../src/lib/thing.ts'
// breaks: nothing-imports-tests: server does not import tests
export { thing as thing28 } from '../../tests/thing.ts'
// breaks: platform-below-features: server/platform does not import server/features
export { thing as thing29 } from '../features/alpha/index.ts'
// breaks: by-the-front-door: server/platform does not import server/features but by its index.ts
export { thing as thing30 } from '../features/alpha/inside.ts'
