export { createTestDatabase, type TestDatabase } from './create-test-database.ts';
export { digestOf, madeUpAcquisition, type SeededLaboratory, seedLaboratory } from './seed-laboratory.ts';
export { type StoreForTests, storeForTests } from './store-for-tests.ts';
