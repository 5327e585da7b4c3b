// breaks: by-the-front-door: server/features/beta does not import server/features but by its index.ts
export { thing as thing44 } from '../alpha/inside.ts'
