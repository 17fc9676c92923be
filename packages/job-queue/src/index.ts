export { type Bell, type BellOptions, createBell } from './create-bell.ts';
export { migrateBell } from './migrate-bell.ts';
