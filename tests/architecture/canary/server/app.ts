
export { thing } from './features/alpha/index.ts'
// breaks: by-the-front-door: server/app.ts does not import server/features but by its index.ts
export { thing as thing31 } from './features/alpha/inside.ts'
