import type { Migration } from '#server/migrations/index.ts';
import { USUAL_CREDIT_PERCENT, usualKeepFromNm } from '#shared/domain/drop-rule.ts';
import { FAMILIES } from '#shared/domain/section/types.ts';

const METHODS = `'shear','saw','thermal'`;
/** The families as they were when these tables were made. */
export const FAMILY_LIST = FAMILIES.map((family) => `'${family}'`).join(',');

/** Stations, drop rules, suppliers and offers. Lengths are whole nanometres, money whole minor units. */
export const yard: Migration = {
  name: '010-yard',
  statements: [
    `CREATE TABLE "stations" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "name" TEXT NOT NULL UNIQUE,
      "method" TEXT NOT NULL CHECK ("method" IN (${METHODS})),
      "kerfNm" INTEGER NOT NULL CHECK ("kerfNm" >= 0 AND ("method" <> 'shear' OR "kerfNm" = 0)),
      "headCropNm" INTEGER NOT NULL CHECK ("headCropNm" >= 0),
      "tailCropNm" INTEGER NOT NULL CHECK ("tailCropNm" >= 0),
      "holdDownNm" INTEGER NOT NULL CHECK ("holdDownNm" >= 0),
      "longestStopNm" INTEGER CHECK ("longestStopNm" > 0),
      "families" TEXT NOT NULL,
      "note" TEXT NOT NULL DEFAULT '',
      "version" INTEGER NOT NULL DEFAULT 1
    )`,
    `CREATE TABLE "drop_rules" (
      "family" TEXT PRIMARY KEY NOT NULL CHECK ("family" IN (${FAMILY_LIST})),
      "keepFromNm" INTEGER NOT NULL CHECK ("keepFromNm" > 0),
      "creditPercent" INTEGER NOT NULL CHECK ("creditPercent" BETWEEN 0 AND 100),
      "version" INTEGER NOT NULL DEFAULT 1
    )`,
    ...FAMILIES.map(
      (family) =>
        `INSERT INTO "drop_rules" ("family", "keepFromNm", "creditPercent") VALUES ('${family}', ${usualKeepFromNm(family)}, ${USUAL_CREDIT_PERCENT})`,
    ),
    `CREATE TABLE "suppliers" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "name" TEXT NOT NULL UNIQUE,
      "email" TEXT NOT NULL DEFAULT '',
      "note" TEXT NOT NULL DEFAULT '',
      "version" INTEGER NOT NULL DEFAULT 1
    )`,
    `CREATE TABLE "offers" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "supplierId" INTEGER NOT NULL REFERENCES "suppliers" ("id"),
      "section" TEXT NOT NULL,
      "stockKey" TEXT NOT NULL,
      "grade" TEXT NOT NULL,
      "lengthNm" INTEGER NOT NULL CHECK ("lengthNm" > 0),
      "priceMinor" INTEGER NOT NULL CHECK ("priceMinor" >= 0),
      "pricedAt" TEXT NOT NULL,
      "withdrawn" INTEGER NOT NULL DEFAULT 0 CHECK ("withdrawn" IN (0, 1)),
      "version" INTEGER NOT NULL DEFAULT 1
    )`,
    `CREATE INDEX "offers_stock" ON "offers" ("stockKey", "grade")`,
  ],
};
