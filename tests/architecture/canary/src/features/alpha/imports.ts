// breaks: below-app: src/features does not import src/app
export { thing as thing34 } from '../../app/thing.ts'
// breaks: by-the-front-door: src/features/alpha does not import src/features but by its index.ts
export { thing as thing35 } from '../beta/inside.ts'
// breaks: by-the-front-door: src/features/alpha does not import src/features but by its index.ts
export type { Thing as Thing36 } from '../beta/inside.ts'
// breaks: by-the-front-door: src/features/alpha does not import src/features but by its index.ts
export const later37 = () => import('../beta/inside.ts')
// breaks: consistent-type-imports
export const inline38 = (thing: import('../beta/inside.ts').Thing) => thing
