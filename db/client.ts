import { createHash } from 'node:crypto';
import { Kysely, PostgresDialect } from 'kysely';
import pg from 'pg';
import { env } from '@/lib/env';
import type { DB } from './tables';

const OID = { int8: 20, textArray: 1009, int8Array: 1016, date: 1082, dateArray: 1182 } as const;

function checkedInteger(text: string): number {
  const value = Number(text);
  if (!Number.isSafeInteger(value))
    throw new RangeError(`the database sent ${text}, which no number holds exactly`);
  return value;
}

type Parser = (text: string) => unknown;
const textArray: (text: string) => (string | null)[] = pg.types.getTypeParser(OID.textArray as number);

const parsers = new Map<number, Parser>([
  [OID.date, (text) => text],
  [OID.dateArray, textArray],
  [OID.int8, checkedInteger],
  [OID.int8Array, (text) => textArray(text).map((item) => (item === null ? null : checkedInteger(item)))],
]);

/** Days stay 'YYYY-MM-DD' strings, whole numbers become exact numbers or throw, numeric stays a string. */
const types = {
  getTypeParser: (oid: number, format?: 'text' | 'binary') =>
    (format !== 'binary' && parsers.get(oid)) || pg.types.getTypeParser(oid, format as 'text'),
};

export interface DatabaseOptions {
  url: string;
  /** Connections at most. */
  max?: number;
  /** Shown in pg_stat_activity. */
  applicationName?: string;
  /** Milliseconds a statement may take; 0 for no limit. */
  statementTimeoutMs?: number;
  /** Milliseconds a transaction may stand idle. */
  idleInTransactionTimeoutMs?: number;
}

/**
 * A pool of connections. Every wait has a limit: 5 s to connect, 15 s for a statement, 5 s for a lock, 30 s idle
 * inside a transaction. A lost connection fails its own query, not the process, and is told of unless
 * the pool is being ended. `end()` it.
 */
export function createPool(options: DatabaseOptions, config: pg.PoolConfig = {}): pg.Pool {
  const pool = new pg.Pool({
    connectionString: options.url,
    max: options.max ?? 10,
    application_name: options.applicationName ?? 'wakewright',
    connectionTimeoutMillis: 5_000,
    statement_timeout: options.statementTimeoutMs ?? 15_000,
    lock_timeout: 5_000,
    idle_in_transaction_session_timeout: options.idleInTransactionTimeoutMs ?? 30_000,
    options: '-c timezone=UTC',
    ...config,
  });
  const report = (error: Error) => {
    if (!pool.ending) console.warn(`database connection lost: ${error.message}`);
  };
  pool.on('error', report);
  // A client that is checked out reports to nobody else, and an 'error' nobody hears ends the process.
  pool.on('connect', (client) => client.on('error', report));
  return pool;
}

/** What a statement holds to be planned once a connection and not each time: for those of every check-in. */
const PREPARED = '/* prepared */';

/** Gives each statement of this connection that is to be prepared a name, under which the server keeps its plan. */
function prepareMarked(client: pg.PoolClient): void {
  const names = new Map<string, string>();
  const nameOf = (text: string) => {
    let name = names.get(text);
    if (!name) names.set(text, (name = createHash('sha256').update(text).digest('hex').slice(0, 40)));
    return name;
  };
  const query = client.query.bind(client) as (...given: unknown[]) => unknown;
  client.query = ((...given: unknown[]) => {
    const [text, values] = given;
    return typeof text === 'string' && text.includes(PREPARED)
      ? query({ name: nameOf(text), text, values })
      : query(...given);
  }) as typeof client.query;
}

/** A pool as of createPool behind Kysely, with our readings of days and whole numbers. `destroy()` it. */
export function createDatabase(options: DatabaseOptions): Kysely<DB> {
  const pool = createPool(options, { types });
  pool.on('connect', prepareMarked);
  return new Kysely<DB>({ dialect: new PostgresDialect({ pool }) });
}

const holder = globalThis as typeof globalThis & { wakewrightDatabase?: Kysely<DB> };

/** The one pool of this process, made at first use from env(); kept across the development server's reloads. */
export function getDatabase(): Kysely<DB> {
  const { DATABASE_URL, DB_POOL_MAX } = env();
  return (holder.wakewrightDatabase ??= createDatabase({ url: DATABASE_URL, max: DB_POOL_MAX }));
}
