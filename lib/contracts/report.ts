import * as z from 'zod/mini'
import { contract, FILE } from './contract'

const params = z.strictObject({ event: z.uuid() })

/** `GET /api/events/[event]/report/json`: the whole log as it was signed, with what is needed to read it. */
export const reportJson = contract({
  name: 'report-json',
  method: 'GET',
  path: '/api/events/[event]/report/json',
  auth: 'session',
  action: 'report:see',
  limitBytes: 0,
  rate: { times: 20, perSeconds: 60 },
  params,
  response: FILE,
})

/** `GET /api/events/[event]/report/csv`: one line a record, in words. */
export const reportCsv = contract({
  name: 'report-csv',
  method: 'GET',
  path: '/api/events/[event]/report/csv',
  auth: 'session',
  action: 'report:see',
  limitBytes: 0,
  rate: { times: 20, perSeconds: 60 },
  params,
  response: FILE,
})
