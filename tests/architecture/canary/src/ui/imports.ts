// breaks: below-app: src/ui does not import src/app
export { thing as thing8 } from '../app/thing.ts'
// breaks: below-features: src/ui does not import src/features
export { thing as thing9 } from '../features/alpha/index.ts'
// breaks: by-the-front-door: src/ui does not import src/features but by its index.ts
export { thing as thing10 } from '../features/alpha/inside.ts'
