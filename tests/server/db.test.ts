import Database from 'better-sqlite3'
import { afterEach, beforeEach, describe, expect, test } from 'vitest'
import { assertDatabase, UnfitDatabaseError } from '@/db/assert-database'
import { type Db, openDatabase } from '@/db/client'
import * as schema from '@/db/schema'
import { transaction } from '@/db/transaction'
import { freshDatabase } from '../support/fresh-database'

let fresh: ReturnType<typeof freshDatabase>
let database: Db

beforeEach(() => {
  fresh = freshDatabase()
  database = fresh.database
})
afterEach(() => fresh.close())

const run = (sql: string) => database.$client.prepare(sql).run()

function anEventWithOneOfEach() {
  run("INSERT INTO club VALUES ('c', 'Marram Track Days')")
  run("INSERT INTO checklist_text VALUES ('h', '{}')")
  run("INSERT INTO limits_text VALUES ('h', '{}')")
  run(
    "INSERT INTO event (id, club_id, code, name, venue, time_zone, first_day, last_day, checklist_hash, limits_hash, default_depth, depth_policy, list_stale_minutes, next_kid, next_entry_code, snapshot_version, created_at) VALUES ('e', 'c', 1, 'Day', 'Ottermere Ring', 'Europe/London', '2026-05-09', '2026-05-10', 'h', 'h', 'standard', 'all', 30, 1, 1, 1, 0)",
  )
  run("INSERT INTO run_group VALUES ('g', 'c', 'e', 'Novice', 1, NULL)")
  run("INSERT INTO car (id, club_id, model, colour, plate) VALUES ('car', 'c', 'Halden', 'red', 'AB12CDE')")
  run(
    "INSERT INTO entry (id, club_id, event_id, car_id, code, number, plate, group_id, facts, note, passenger_seats, withdrawn) VALUES ('en', 'c', 'e', 'car', 1, '47', 'AB12 CDE', 'g', '{}', '', 0, 0)",
  )
  run(record('r1', 1))
  run("INSERT INTO scan VALUES ('s', 'c', 'e', 'd', 0, 'HOLD', 'dead-pass', NULL, NULL, 'camera', '[]')")
  run("INSERT INTO audit VALUES ('a', 'c', 'e', 0, NULL, 'x', '{}')")
  run("INSERT INTO declaration VALUES ('d', 'c', 'en', 1, '{}', 0)")
}

function record(id: string, seq: number, verb = 'INSERT') {
  return `${verb} INTO record VALUES ('e', ${seq}, 'c', '${id}', 'jws', 'hash', 'chain', 'accepted', NULL, 'comment', 'event:e', 'd', ${seq}, 0)`
}

describe('the served database', () => {
  test('a migrated file is fit to serve', () => {
    expect(() => assertDatabase(database)).not.toThrow()
  })

  test('commits are durable: WAL with synchronous FULL, foreign keys on', () => {
    expect(database.$client.pragma('journal_mode', { simple: true })).toBe('wal')
    expect(database.$client.pragma('synchronous', { simple: true })).toBe(2)
    expect(() => run("INSERT INTO car (id, club_id, model, colour, plate) VALUES ('x', 'nobody', 'm', 'c', 'p')")).toThrow(/FOREIGN KEY/)
  })

  test('a text in a number column is refused: every table is STRICT', () => {
    run("INSERT INTO club VALUES ('c', 'Marram Track Days')")
    expect(() => run("INSERT INTO account VALUES ('a', 'c', 'e', 'n', 'h', '[]', 'yesterday')")).toThrow(/cannot store TEXT/)
  })

  test.each(['record', 'scan', 'audit', 'declaration'])('[S3] %s refuses update, delete and replace', (table) => {
    anEventWithOneOfEach()
    const before = database.$client.prepare(`SELECT * FROM ${table}`).all()
    expect(before).toHaveLength(1)
    expect(() => run(`UPDATE ${table} SET club_id = 'c'`)).toThrow(/append-only/)
    expect(() => run(`DELETE FROM ${table}`)).toThrow(/append-only/)
    expect(() => run(`INSERT OR REPLACE INTO ${table} SELECT * FROM ${table}`)).toThrow(/append-only|without gaps/)
    expect(database.$client.prepare(`SELECT * FROM ${table}`).all()).toEqual(before)
  })

  test('[S3] a replace is refused even on a connection without recursive triggers', () => {
    anEventWithOneOfEach()
    const other = new Database(fresh.file)
    expect(() => other.prepare(record('r1', 2, 'INSERT OR REPLACE')).run()).toThrow(/append-only/)
    other.close()
  })

  test('[S3] a record that would leave a gap is refused', () => {
    anEventWithOneOfEach()
    expect(() => run(record('r3', 3))).toThrow(/without gaps/)
    expect(() => run(record('r2', 2))).not.toThrow()
  })

  test.each([
    ['a dropped trigger', 'DROP TRIGGER audit_no_delete', 'trigger audit_no_delete is missing'],
    ['a table that lost STRICT', 'CREATE TABLE loose (a text)', 'table loose is not STRICT'],
    ['weaker durability', 'PRAGMA synchronous = NORMAL', 'pragma synchronous is 1, must be 2'],
  ])('%s keeps it from serving, in words', (_, sql, fault) => {
    database.$client.exec(sql)
    const error = catching(() => assertDatabase(database))
    expect(error).toBeInstanceOf(UnfitDatabaseError)
    expect((error as UnfitDatabaseError).faults).toEqual([fault])
    expect((error as Error).message).toMatch(/Restore the last good backup/)
  })

  test('a file without tables does not serve', () => {
    const empty = openDatabase(':memory:')
    expect(() => assertDatabase(empty)).toThrow(/no tables/)
    empty.$client.close()
  })
})

describe('a transaction', () => {
  test('keeps nothing when its work throws', () => {
    const work = () =>
      transaction(database, (tx) => {
        tx.insert(schema.club).values({ id: 'c', name: 'Marram Track Days' }).run()
        throw new Error('no')
      })
    expect(work).toThrow('no')
    expect(database.select().from(schema.club).all()).toEqual([])
  })

  test('takes the write lock before it reads', () => {
    const other = openDatabase(fresh.file)
    other.$client.pragma('busy_timeout = 0')
    transaction(database, () => {
      expect(() => transaction(other, () => 1)).toThrow(/locked/)
      return 1
    })
    other.$client.close()
  })
})

function catching(work: () => void): unknown {
  try {
    work()
  } catch (error) {
    return error
  }
  return null
}
