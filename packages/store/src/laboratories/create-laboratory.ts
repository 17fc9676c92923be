import { oneRow } from '../one-row.ts';
import { type Store, sqlDoor } from '../sql-door.ts';

export type Laboratory = { readonly id: string; readonly name: string };

/** Found a laboratory with an empty feed. Its name is unique; a second of the same name is refused by the database. */
export async function createLaboratory(store: Store, { name }: { readonly name: string }): Promise<Laboratory> {
  const rows = await store[sqlDoor].query<Laboratory>(
    `with founded as (insert into laboratory (name) values ($1) returning id, name),
      feed as (insert into feed_head (laboratory_id) select id from founded),
      noted as (insert into audit (laboratory_id, action, subject) select id, 'laboratory-created', id::text from founded)
    select id, name from founded`,
    [name],
  );
  return oneRow(rows, 'laboratory');
}
