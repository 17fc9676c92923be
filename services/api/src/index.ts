export type { ApiDependencies } from './api-dependencies.ts';
export { createApi } from './create-api.ts';
