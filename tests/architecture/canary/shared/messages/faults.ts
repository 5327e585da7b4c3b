// breaks: shared-is-pure: shared does not import server
export { thing as thing1 } from '../../server/platform/thing.ts'
// breaks: shared-is-pure: shared does not import src
export type { Thing as Thing2 } from '../../src/lib/thing.ts'
// breaks: nothing-imports-tests: shared does not import tests
export { thing as thing3 } from '../../tests/thing.ts'
