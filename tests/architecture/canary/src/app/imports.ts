// breaks: by-the-front-door: src/app does not import src/features but by its index.ts
export { thing as thing33 } from '../features/alpha/inside.ts'
