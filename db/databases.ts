import pg from 'pg';

/** Runs statements on the server's maintenance database; CREATE DATABASE and its like want no transaction. */
async function onServer<T>(serverUrl: string, work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: serverUrl, connectionTimeoutMillis: 5_000 });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

const quote = (name: string) => pg.escapeIdentifier(name);

/** `serverUrl` with another database's name. */
export function withDatabase(serverUrl: string, name: string): string {
  const url = new URL(serverUrl);
  url.pathname = `/${name}`;
  return url.href;
}

export const databaseExists = (serverUrl: string, name: string): Promise<boolean> =>
  onServer(serverUrl, async (client) => {
    const { rowCount } = await client.query('select 1 from pg_database where datname = $1', [name]);
    return rowCount === 1;
  });

/** Makes an empty database, or a copy of `template` (which nobody may be using). */
export const makeDatabase = (serverUrl: string, name: string, template = 'template0'): Promise<void> =>
  onServer(serverUrl, async (client) => {
    await client.query(`create database ${quote(name)} template ${quote(template)}`);
  });

/** Removes a database, open connections and all; nothing happens when there is none. */
export const dropDatabase = (serverUrl: string, name: string): Promise<void> =>
  onServer(serverUrl, async (client) => {
    await client.query(`drop database if exists ${quote(name)} with (force)`);
  });

export const renameDatabase = (serverUrl: string, from: string, to: string): Promise<void> =>
  onServer(serverUrl, async (client) => {
    await client.query(`alter database ${quote(from)} rename to ${quote(to)}`);
  });
