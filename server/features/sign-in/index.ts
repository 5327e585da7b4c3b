export { createAuthenticator, personOf, signInRoutes } from './sign-in.routes.ts'
export { createMeReader } from './read-me.ts'
