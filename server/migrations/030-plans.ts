import { FAMILY_LIST } from '#server/migrations/010-yard.ts';
import type { Migration } from '#server/migrations/index.ts';

/**
 * Plans as rows, so that a drop leads back to the row of the file. Net cost and bound are whole millionths of a minor unit: exact credits
 * are fractions, and no float reaches the database.
 */
export const plans: Migration = {
  name: '030-plans',
  statements: [
    `CREATE TABLE "counters" ("name" TEXT PRIMARY KEY NOT NULL, "next" INTEGER NOT NULL CHECK ("next" > 0))`,
    `INSERT INTO "counters" ("name", "next") VALUES ('plan', 101), ('tag', 1)`,
    `CREATE TABLE "plans" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "number" INTEGER NOT NULL UNIQUE CHECK ("number" > 0),
      "name" TEXT NOT NULL,
      "state" TEXT NOT NULL CHECK ("state" IN ('draft','issued','cutting','finished','withdrawn')),
      "stationId" INTEGER REFERENCES "stations" ("id"),
      "seed" INTEGER NOT NULL CHECK ("seed" >= 0),
      "timeLimitMs" INTEGER NOT NULL CHECK ("timeLimitMs" > 0),
      "createdById" TEXT NOT NULL REFERENCES "user" ("id"),
      "createdAt" TEXT NOT NULL,
      "issuedAt" TEXT,
      "version" INTEGER NOT NULL DEFAULT 1,
      CHECK ("state" IN ('draft','withdrawn') OR ("issuedAt" IS NOT NULL AND "stationId" IS NOT NULL))
    )`,
    `CREATE TABLE "plan_groups" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "planId" INTEGER NOT NULL REFERENCES "plans" ("id") ON DELETE CASCADE,
      "position" INTEGER NOT NULL,
      "key" TEXT NOT NULL,
      "section" TEXT NOT NULL,
      "stockKey" TEXT NOT NULL,
      "family" TEXT NOT NULL CHECK ("family" IN (${FAMILY_LIST})),
      "grade" TEXT NOT NULL,
      "mgPerM" INTEGER NOT NULL CHECK ("mgPerM" >= 0),
      "kerfNm" INTEGER NOT NULL CHECK ("kerfNm" >= 0),
      "headCropNm" INTEGER NOT NULL CHECK ("headCropNm" >= 0),
      "tailCropNm" INTEGER NOT NULL CHECK ("tailCropNm" >= 0),
      "holdDownNm" INTEGER NOT NULL CHECK ("holdDownNm" >= 0),
      "keepFromNm" INTEGER NOT NULL CHECK ("keepFromNm" >= 0),
      "creditMinorPerM" INTEGER NOT NULL CHECK ("creditMinorPerM" >= 0),
      "scrapMinorPerM" INTEGER NOT NULL CHECK ("scrapMinorPerM" >= 0),
      "outcome" TEXT NOT NULL CHECK ("outcome" IN ('proven','bounded','unplaceable')),
      "netMillionths" INTEGER NOT NULL CHECK (typeof("netMillionths") = 'integer' AND "netMillionths" >= 0),
      "boundMillionths" INTEGER NOT NULL
        CHECK (typeof("boundMillionths") = 'integer' AND "boundMillionths" BETWEEN 0 AND "netMillionths"),
      "work" TEXT NOT NULL,
      UNIQUE ("planId", "key")
    )`,
    `CREATE TABLE "plan_pieces" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "groupId" INTEGER NOT NULL REFERENCES "plan_groups" ("id") ON DELETE CASCADE,
      "partLineId" INTEGER NOT NULL REFERENCES "part_lines" ("id"),
      "quantity" INTEGER NOT NULL CHECK ("quantity" > 0),
      "unplaced" INTEGER NOT NULL DEFAULT 0 CHECK ("unplaced" BETWEEN 0 AND "quantity"),
      "reason" TEXT NOT NULL DEFAULT '',
      UNIQUE ("groupId", "partLineId")
    )`,
    `CREATE INDEX "plan_pieces_line" ON "plan_pieces" ("partLineId")`,
    `CREATE TABLE "plan_stock" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "groupId" INTEGER NOT NULL REFERENCES "plan_groups" ("id") ON DELETE CASCADE,
      "position" INTEGER NOT NULL,
      "key" TEXT NOT NULL,
      "source" TEXT NOT NULL CHECK ("source" IN ('new','drop')),
      "offerId" INTEGER REFERENCES "offers" ("id"),
      "dropId" INTEGER REFERENCES "drops" ("id"),
      "lengthNm" INTEGER NOT NULL CHECK ("lengthNm" > 0),
      "costMinor" INTEGER NOT NULL CHECK ("costMinor" >= 0),
      "supply" INTEGER CHECK ("supply" >= 0),
      UNIQUE ("groupId", "key"),
      CHECK (("source" = 'drop') = ("dropId" IS NOT NULL)),
      CHECK ("source" = 'new' OR ("supply" = 1 AND "offerId" IS NULL))
    )`,
    `CREATE TABLE "plan_layouts" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "groupId" INTEGER NOT NULL REFERENCES "plan_groups" ("id") ON DELETE CASCADE,
      "position" INTEGER NOT NULL,
      "stockId" INTEGER NOT NULL REFERENCES "plan_stock" ("id") ON DELETE CASCADE,
      "repeat" INTEGER NOT NULL CHECK ("repeat" > 0),
      "leftoverNm" INTEGER NOT NULL CHECK ("leftoverNm" >= 0),
      "keeps" INTEGER NOT NULL CHECK ("keeps" IN (0, 1))
    )`,
    `CREATE INDEX "plan_layouts_group" ON "plan_layouts" ("groupId")`,
    `CREATE TABLE "plan_cuts" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "layoutId" INTEGER NOT NULL REFERENCES "plan_layouts" ("id") ON DELETE CASCADE,
      "position" INTEGER NOT NULL,
      "partLineId" INTEGER NOT NULL REFERENCES "part_lines" ("id"),
      "startNm" INTEGER NOT NULL CHECK ("startNm" >= 0),
      "lengthNm" INTEGER NOT NULL CHECK ("lengthNm" > 0)
    )`,
    `CREATE INDEX "plan_cuts_layout" ON "plan_cuts" ("layoutId")`,
    `CREATE INDEX "plan_cuts_line" ON "plan_cuts" ("partLineId")`,
    `CREATE TABLE "bars" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "planId" INTEGER NOT NULL REFERENCES "plans" ("id"),
      "layoutId" INTEGER NOT NULL REFERENCES "plan_layouts" ("id"),
      "number" INTEGER NOT NULL CHECK ("number" > 0),
      "state" TEXT NOT NULL CHECK ("state" IN ('waiting','cut')),
      "heat" TEXT CHECK ("heat" <> ''),
      "makesTag" INTEGER UNIQUE CHECK ("makesTag" > 0),
      "cutById" TEXT REFERENCES "user" ("id"),
      "cutAt" TEXT,
      "version" INTEGER NOT NULL DEFAULT 1,
      UNIQUE ("planId", "number"),
      CHECK (("state" = 'cut') = ("cutAt" IS NOT NULL) AND ("state" = 'cut') = ("cutById" IS NOT NULL))
    )`,
    `CREATE INDEX "bars_layout" ON "bars" ("layoutId")`,
    `CREATE TABLE "drops" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "tag" INTEGER NOT NULL UNIQUE CHECK ("tag" > 0),
      "section" TEXT NOT NULL,
      "stockKey" TEXT NOT NULL,
      "family" TEXT NOT NULL CHECK ("family" IN (${FAMILY_LIST})),
      "grade" TEXT NOT NULL,
      "lengthNm" INTEGER NOT NULL CHECK ("lengthNm" > 0),
      "widthNm" INTEGER CHECK ("widthNm" > 0),
      "massMg" INTEGER NOT NULL CHECK ("massMg" >= 0),
      "slot" TEXT NOT NULL CHECK ("slot" <> ''),
      "heat" TEXT CHECK ("heat" <> ''),
      "note" TEXT NOT NULL DEFAULT '',
      "state" TEXT NOT NULL CHECK ("state" IN ('racked','held','cut','scrapped','missing')),
      "heldByPlanId" INTEGER REFERENCES "plans" ("id"),
      "fromBarId" INTEGER UNIQUE REFERENCES "bars" ("id"),
      "parentDropId" INTEGER REFERENCES "drops" ("id"),
      "loggedById" TEXT NOT NULL REFERENCES "user" ("id"),
      "loggedAt" TEXT NOT NULL,
      "version" INTEGER NOT NULL DEFAULT 1,
      CHECK (("state" = 'held') = ("heldByPlanId" IS NOT NULL))
    )`,
    `CREATE INDEX "drops_stock" ON "drops" ("stockKey", "grade", "state")`,
    `CREATE TABLE "drop_events" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "dropId" INTEGER NOT NULL REFERENCES "drops" ("id"),
      "at" TEXT NOT NULL,
      "who" TEXT NOT NULL,
      "what" TEXT NOT NULL,
      "why" TEXT NOT NULL DEFAULT ''
    )`,
    `CREATE INDEX "drop_events_drop" ON "drop_events" ("dropId")`,
  ],
};
