// breaks: domain-is-pure: process is not for the domain
export const processUsed = () => process
// breaks: domain-is-pure: console is not for the domain
export const consoleUsed = () => console
// breaks: domain-is-pure: crypto is not for the domain
export const cryptoUsed = () => crypto
// breaks: domain-is-pure: performance is not for the domain
export const performanceUsed = () => performance
// breaks: domain-is-pure: globalThis is not for the domain
export const globalThisUsed = () => globalThis
// breaks: domain-is-pure: Buffer is not for the domain
export const bufferUsed = () => Buffer
// breaks: domain-is-pure: fetch is not for the domain
export const fetchUsed = () => fetch
// breaks: domain-is-pure: Temporal is not for the domain
export const temporalUsed = () => Temporal
// breaks: domain-is-pure: setTimeout is not for the domain
export const setTimeoutUsed = () => setTimeout
// breaks: domain-is-pure: setInterval is not for the domain
export const setIntervalUsed = () => setInterval
// breaks: domain-is-pure: setImmediate is not for the domain
export const setImmediateUsed = () => setImmediate
// breaks: domain-is-pure: queueMicrotask is not for the domain
export const queueMicrotaskUsed = () => queueMicrotask
// breaks: domain-is-pure: take the instant as a parameter, no Date.now
export const now = () => Date.now()
// breaks: domain-is-pure: take the instant as a parameter, no new Date()
export const newDate = () => new Date()
// breaks: domain-is-pure: take the instant as a parameter, no Date()
export const date = () => Date()
// breaks: domain-is-pure: take ids and seeds as parameters
export const random = () => Math.random()
// breaks: domain-is-pure: the zone of the machine is not the zone of the house (use getUTC… or Intl)
export const hour = (at: Date) => at.getHours()
// breaks: domain-is-pure: the zone of the machine is not the zone of the house (use getUTC… or Intl)
export const midnight = (at: Date) => at.setHours(0)
// breaks: domain-is-pure: how this machine writes a number or a date is no rule of ours
export const written = (n: number) => n.toLocaleString()
