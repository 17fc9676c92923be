/**
 * One step of the schema, forward only. It is never edited once it was released: the ledger keeps its digest.
 *
 * `sql` opens with `-- compatible` (the release before may still run on the new schema) or `-- breaking`, and the reason.
 */
export type Migration = { readonly number: number; readonly name: string; readonly sql: string };
