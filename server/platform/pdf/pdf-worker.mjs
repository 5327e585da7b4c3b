/**
 * Entry of a PDF worker thread. It loads the TypeScript loader itself, because a thread started under vitest or from
 * a plain Node process does not have one.
 */
import { register } from 'tsx/esm/api'

register()
await import('./pdf-worker.ts')
