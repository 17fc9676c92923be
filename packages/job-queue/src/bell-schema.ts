/** Schema that BullMQ's PostgreSQL backend keeps its tables in; it always takes this one with a pool that was handed to it. */
export const bellSchema = 'bullmq';

/** The only queue. A ring says that there is work; which work, the database decides. */
export const bellName = 'spinassay-bell';
