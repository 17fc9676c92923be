export { createTestDatabase, type TestDatabase } from './create-test-database.ts';
export { type SeededLaboratory, seedLaboratory } from './seed-laboratory.ts';
