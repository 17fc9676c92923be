import type { CompoundBody } from '@spinassay/contract';

/** A compound under the id by which methods and preparations name it. */
export type CatalogueEntry = { readonly id: string; readonly body: CompoundBody };
