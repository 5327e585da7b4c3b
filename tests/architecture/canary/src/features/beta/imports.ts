// breaks: by-the-front-door: src/features/beta does not import src/features but by its index.ts
export { thing as thing39 } from '../alpha/inside.ts'
