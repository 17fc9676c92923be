import type { ClientConfig } from 'pg';

/** The schema that holds every table of the store. */
export const schemaName = 'spinassay';

/** First word of every advisory lock of the store: "SA" in ASCII, then what the lock is for. */
export const advisoryClass = { migration: 0x53410001, worker: 0x53410002, document: 0x53410003 } as const;

/**
 * Connection settings of every client: its name in the server's list, the schema, and an end to transactions that were
 * left open, because an open snapshot slows the feed's head row for everybody (510 to 351 transactions a second).
 *
 * The driver lets parameters of the connection string win: one with `options` of its own must set the search path itself.
 */
export function connectionSettings(address: { connectionString: string; applicationName: string }): ClientConfig {
  return {
    connectionString: address.connectionString,
    application_name: address.applicationName,
    options: `-c search_path=${schemaName} -c timezone=UTC`,
    idle_in_transaction_session_timeout: 60_000,
    statement_timeout: 60_000,
    connectionTimeoutMillis: 5_000,
    keepAlive: true,
  };
}
