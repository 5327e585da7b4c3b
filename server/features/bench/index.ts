import { benchRoutes } from './bench.routes.ts'

/** The free-standing calculators. */
export const createBench = () => ({ routes: benchRoutes() })
