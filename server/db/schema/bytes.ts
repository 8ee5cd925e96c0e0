import { customType } from 'drizzle-orm/pg-core';

/** PostgreSQL's bytea. */
export const bytes = customType<{ data: Buffer; driverData: Buffer }>({ dataType: () => 'bytea' });
