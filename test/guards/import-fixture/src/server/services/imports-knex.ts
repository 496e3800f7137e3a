import knex from 'knex'

export const value = knex
