/** Key under which the store keeps its way to the database; not exported from the room, so nobody else can write SQL. */
export const sqlDoor: unique symbol = Symbol('sql');

/** Something that runs one statement with parameters. Rows come as the driver maps them: timestamptz is Date, int8 is text. */
export type Sql = {
  query<Row>(text: string, values?: readonly unknown[]): Promise<Row[]>;
};

/** A wake-up for whoever waits; sent after the commit, and lossy by design. */
export type Notice = { readonly topic: NoticeTopic; readonly id: string };

/**
 * What a notice is about: any change of a fit that a reader sees (id of the fit), new events in a feed (id of the laboratory),
 * or the wish to cancel a running fit (id of the fit).
 */
export type NoticeTopic = 'fit' | 'feed' | 'cancel';

/** A transaction in which the rows of one laboratory may be read and written. Made by `Store.withLaboratory` only. */
export type LaboratoryTransaction = {
  readonly laboratoryId: string;
  readonly [sqlDoor]: Sql & { readonly notices: Notice[] };
};

/** The store of one process: a pool of connections. */
export type Store = {
  /**
   * Do work on the rows of one laboratory in one READ COMMITTED transaction.
   *
   * A serialisation failure or deadlock runs `work` again, up to three more times: it must have no effect outside the transaction.
   */
  withLaboratory<T>(laboratoryId: string, work: (transaction: LaboratoryTransaction) => Promise<T>): Promise<T>;
  /** Give back every connection. */
  close(): Promise<void>;
  readonly [sqlDoor]: StoreSql;
};

/** What reaches across laboratories: claims, sweeps, keys. Kept to the files of this room. */
export type StoreSql = Sql & {
  transaction<T>(work: (sql: Sql & { readonly notices: Notice[] }) => Promise<T>): Promise<T>;
  notify(notices: readonly Notice[]): Promise<void>;
};
