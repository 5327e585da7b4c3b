// breaks: by-the-front-door: server/features/alpha does not import server/features but by its index.ts
export { thing as thing40 } from '../beta/inside.ts'
// breaks: by-the-front-door: server/features/alpha does not import server/features but by its index.ts
export type { Thing as Thing41 } from '../beta/inside.ts'
// breaks: by-the-front-door: server/features/alpha does not import server/features but by its index.ts
export const later42 = () => import('../beta/inside.ts')
// breaks: consistent-type-imports
export const inline43 = (thing: import('../beta/inside.ts').Thing) => thing
