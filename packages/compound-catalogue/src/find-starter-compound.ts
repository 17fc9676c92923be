import type { CatalogueEntry } from './catalogue-entry.ts';
import { starterCatalogue } from './starter-catalogue.ts';

/** The entry with this id, or undefined. A copy: yours to change. */
export function findStarterCompound(id: string): CatalogueEntry | undefined {
  return starterCatalogue().find((entry) => entry.id === id);
}
