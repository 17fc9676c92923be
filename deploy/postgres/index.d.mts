/** A PostgreSQL that can be started: `binFolder` holds `postgres` and `initdb`. */
export type PostgresEngine = {
  readonly kind: 'installed' | 'embedded';
  readonly binFolder: string;
  readonly version: string;
  readonly major: number;
};

export type PostgresServer = {
  /** False when a server was already answering on the socket and was taken over. */
  readonly isStartedHere: boolean;
  connectionStringFor(database: string): string;
  /** Fast shutdown (open transactions are rolled back), then waits until the server is gone. */
  stop(): Promise<void>;
};

/**
 * Choose an engine: an installed PostgreSQL of major 15 or later, else the embedded one.
 *
 * @throws Error naming every place that was looked at
 */
export function findPostgres(wishes?: {
  /** Force one kind; an empty text counts as no wish. */
  readonly prefer?: string | undefined;
  /** When this folder holds data already, an engine of the same major is chosen if there is one. */
  readonly dataFolder?: string | undefined;
}): Promise<PostgresEngine>;

/**
 * Start the engine on the data folder, or take over the server that already answers on the socket.
 *
 * @throws Error when the folder was made by another major, or with the end of the log when the server does not come up
 */
export function startPostgres(order: {
  readonly engine: PostgresEngine;
  /** Made by `initdb` when it does not exist or is empty. */
  readonly dataFolder: string;
  /** 0700, and short: see `socketFolderFor`. */
  readonly socketFolder: string;
  /** Default: `postgres.log` beside the data folder. */
  readonly logFile?: string;
  /** Server settings on top of the house's own. */
  readonly settings?: Readonly<Record<string, string>>;
}): Promise<PostgresServer>;

/** A 0700 folder whose path leaves room for a Unix socket: inside the home folder, else in the system's temporary folder. */
export function socketFolderFor(homeFolder: string): Promise<string>;
