import { type Store, sqlDoor } from '../sql-door.ts';
import type { Laboratory } from './create-laboratory.ts';

/** Every laboratory, oldest first. For the launcher and the administrator. */
export function listLaboratories(store: Store): Promise<Laboratory[]> {
  return store[sqlDoor].query<Laboratory>('select id, name from laboratory order by created_at, id');
}
