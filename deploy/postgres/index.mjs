// Finds and starts a PostgreSQL for the launcher and for the tests. No dependencies: it runs before anything is installed.
export { findPostgres } from './find-postgres.mjs';
export { socketFolderFor } from './socket-folder.mjs';
export { startPostgres } from './start-postgres.mjs';
