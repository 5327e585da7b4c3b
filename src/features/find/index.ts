export { FindResults } from './find-results.tsx'
