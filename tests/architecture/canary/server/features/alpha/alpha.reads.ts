import pg from 'pg'

export const used = pg
