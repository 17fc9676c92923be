export type { CatalogueEntry } from './catalogue-entry.ts';
export { findStarterCompound } from './find-starter-compound.ts';
export { starterCatalogue } from './starter-catalogue.ts';
