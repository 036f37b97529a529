import type { Db } from './open.ts'

/** What a transaction's callback gets: the same door to the tables, valid until it returns. */
export type Tx = Db['orm']

/** A promise cannot be given back: an `await` would let other writes into the transaction. */
type NotPromise<T> = T extends PromiseLike<unknown> ? never : T

/**
 * The only door for writing. Takes the write lock at once (`BEGIN IMMEDIATE`), runs `work` synchronously,
 * commits; a throw rolls everything back. Refuses to nest: an inner "commit" would only be a savepoint.
 */
export function inTransaction<T>(db: Db, work: (tx: Tx) => NotPromise<T>): NotPromise<T> {
  if (db.raw.inTransaction) throw new Error('A transaction is already open on this handle')
  return db.raw.transaction(() => work(db.orm)).immediate() as NotPromise<T>
}
