import 'server-only'
import { pino } from 'pino'
import { env } from './env'

/** The server's log: JSON lines. Never log bodies, cookies, tokens or names; ids and codes are enough. */
export const log = pino({
  level: env().logLevel,
  base: null,
  redact: ['req.headers.cookie', 'req.headers.authorization', 'password', 'token', 'claim'],
})
