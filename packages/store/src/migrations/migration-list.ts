import { laboratories } from './0001-laboratories.ts';
import { acquisitionsAndDocuments } from './0002-acquisitions-and-documents.ts';
import { jobs } from './0003-jobs.ts';
import { fitsAndFeed } from './0004-fits-and-feed.ts';
import type { Migration } from './migration.ts';

/** Every step of the schema in the order in which it is applied. */
export const migrationList: readonly Migration[] = [laboratories, acquisitionsAndDocuments, jobs, fitsAndFeed];
