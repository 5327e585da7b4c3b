/**
 * The header with which a client says for whom it writes: the id of the person who typed it. Two people may share a
 * browser, and a page left open must never write in the name of whoever signed in after it.
 */
export const personHeader = 'Pratique-Person'
