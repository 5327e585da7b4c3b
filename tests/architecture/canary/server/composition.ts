// breaks: by-the-front-door: server/composition.ts does not import server/features but by its index.ts
export { thing as thing32 } from './features/alpha/inside.ts'
