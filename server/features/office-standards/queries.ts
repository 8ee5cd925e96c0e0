import { asc, eq, sql } from 'drizzle-orm';
import type { OfficeStandard } from '#shared/contract/office-standard.ts';
import type { Database } from '../../db/client.ts';
import { officeStandards } from '../../db/schema/office-standards.ts';
import { people } from '../../db/schema/people.ts';

/** By name. */
export async function listOfficeStandards(db: Database): Promise<OfficeStandard[]> {
  const rows = await db
    .select({ row: officeStandards, updatedBy: people.name })
    .from(officeStandards)
    .innerJoin(people, eq(people.id, officeStandards.updatedBy))
    .orderBy(asc(sql`lower(${officeStandards.name})`));
  return rows.map(({ row, updatedBy }) => ({
    ...row.standard,
    id: row.id,
    name: row.name,
    units: row.units,
    barStandard: row.barStandard,
    updatedBy: { id: row.updatedBy, name: updatedBy },
    updatedAt: row.updatedAt.toISOString(),
  }));
}
