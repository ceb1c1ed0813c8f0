import type { Migration } from '#server/migrations/index.ts';

/** How a stored file was decoded, one price an offer, and the ways the rack and the plans are looked up. */
export const encodingsAndIndexes: Migration = {
  name: '040-encodings-and-indexes',
  statements: [
    // Empty for a list that was stored before its encoding was noted.
    `ALTER TABLE "part_lists" ADD COLUMN "encoding" TEXT NOT NULL DEFAULT ''`,
    // A supplier has one price for a bar; withdrawn ones stay for the plans made with them.
    `CREATE UNIQUE INDEX "offers_one_price" ON "offers" ("supplierId", "stockKey", "grade", "lengthNm") WHERE "withdrawn" = 0`,
    `CREATE INDEX "drops_held" ON "drops" ("heldByPlanId") WHERE "heldByPlanId" IS NOT NULL`,
    `CREATE INDEX "drops_parent" ON "drops" ("parentDropId") WHERE "parentDropId" IS NOT NULL`,
    `CREATE INDEX "plan_stock_offer" ON "plan_stock" ("offerId") WHERE "offerId" IS NOT NULL`,
    `CREATE INDEX "plan_stock_drop" ON "plan_stock" ("dropId") WHERE "dropId" IS NOT NULL`,
    `CREATE INDEX "plan_layouts_stock" ON "plan_layouts" ("stockId")`,
    `CREATE INDEX "plans_station" ON "plans" ("stationId")`,
  ],
};
