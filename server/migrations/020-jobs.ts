import { FAMILY_LIST } from '#server/migrations/010-yard.ts';
import type { Migration } from '#server/migrations/index.ts';

/** Jobs, part lists with the very bytes that were uploaded, and their lines. */
export const jobs: Migration = {
  name: '020-jobs',
  statements: [
    `CREATE TABLE "jobs" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "number" TEXT NOT NULL UNIQUE,
      "name" TEXT NOT NULL,
      "customer" TEXT NOT NULL DEFAULT '',
      "createdAt" TEXT NOT NULL,
      "version" INTEGER NOT NULL DEFAULT 1
    )`,
    `CREATE TABLE "part_lists" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "jobId" INTEGER NOT NULL REFERENCES "jobs" ("id"),
      "name" TEXT NOT NULL,
      "revision" TEXT NOT NULL DEFAULT '',
      "fileName" TEXT NOT NULL,
      "fileSha256" TEXT NOT NULL CHECK (length("fileSha256") = 64),
      "file" BLOB NOT NULL,
      "fileBytes" INTEGER NOT NULL CHECK ("fileBytes" = length("file")),
      "unit" TEXT NOT NULL CHECK ("unit" IN ('in','mm','ft','m','cm')),
      "choices" TEXT NOT NULL,
      "skippedRows" INTEGER NOT NULL DEFAULT 0 CHECK ("skippedRows" >= 0),
      "uploadedById" TEXT NOT NULL REFERENCES "user" ("id"),
      "uploadedAt" TEXT NOT NULL,
      "version" INTEGER NOT NULL DEFAULT 1,
      UNIQUE ("jobId", "fileSha256", "revision")
    )`,
    `CREATE INDEX "part_lists_job" ON "part_lists" ("jobId")`,
    `CREATE TABLE "part_lines" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "partListId" INTEGER NOT NULL REFERENCES "part_lists" ("id") ON DELETE CASCADE,
      "row" INTEGER NOT NULL CHECK ("row" > 0),
      "mark" TEXT NOT NULL,
      "quantity" INTEGER NOT NULL CHECK ("quantity" > 0),
      "section" TEXT NOT NULL,
      "stockKey" TEXT NOT NULL,
      "family" TEXT NOT NULL CHECK ("family" IN (${FAMILY_LIST})),
      "sectionText" TEXT NOT NULL,
      "grade" TEXT NOT NULL,
      "lengthNm" INTEGER NOT NULL CHECK ("lengthNm" > 0),
      "widthNm" INTEGER CHECK ("widthNm" > 0),
      "pieceMassMg" INTEGER NOT NULL CHECK ("pieceMassMg" >= 0),
      "note" TEXT NOT NULL DEFAULT '',
      "finish" TEXT NOT NULL DEFAULT '',
      "neededBy" TEXT NOT NULL DEFAULT '',
      "remarks" TEXT NOT NULL DEFAULT '[]',
      UNIQUE ("partListId", "row")
    )`,
    `CREATE INDEX "part_lines_stock" ON "part_lines" ("stockKey", "grade")`,
  ],
};
