import type { ChemistryDocument } from '@wetside/chemistry';
import { sql } from 'drizzle-orm';
import { check, foreignKey, integer, jsonb, pgTable, primaryKey, unique, uuid } from 'drizzle-orm/pg-core';
import { darkroomId, instant, ownDarkroomOnly } from './columns.js';
import { memberships } from './people.js';

/** A kind of solution that the darkroom uses. What it is stands in its versions. */
export const chemistries = pgTable(
  'chemistries',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    createdAt: instant('created_at').notNull(),
    archivedAt: instant('archived_at'),
  },
  (t) => [
    primaryKey({ name: 'chemistries_pk', columns: [t.darkroomId, t.id] }),
    ownDarkroomOnly('chemistries'),
  ],
);

/** An immutable document. A bottle keeps the version that it was mixed under. */
export const chemistryVersions = pgTable(
  'chemistry_versions',
  {
    darkroomId: darkroomId(),
    id: uuid('id').notNull(),
    chemistryId: uuid('chemistry_id').notNull(),
    number: integer('number').notNull(),
    document: jsonb('document').$type<ChemistryDocument>().notNull(),
    createdAt: instant('created_at').notNull(),
    /** Null: it came with the starter catalogue. */
    createdBy: uuid('created_by'),
  },
  (t) => [
    primaryKey({ name: 'chemistry_versions_pk', columns: [t.darkroomId, t.id] }),
    unique('chemistry_versions_number_uq').on(t.darkroomId, t.chemistryId, t.number),
    foreignKey({
      name: 'chemistry_versions_chemistry_fk',
      columns: [t.darkroomId, t.chemistryId],
      foreignColumns: [chemistries.darkroomId, chemistries.id],
    }),
    foreignKey({
      name: 'chemistry_versions_created_by_fk',
      columns: [t.darkroomId, t.createdBy],
      foreignColumns: [memberships.darkroomId, memberships.id],
    }),
    check('chemistry_versions_number', sql`${t.number} > 0`),
    check('chemistry_versions_schema', sql`(${t.document} ->> 'schema') = '1'`),
    ownDarkroomOnly('chemistry_versions'),
  ],
);
