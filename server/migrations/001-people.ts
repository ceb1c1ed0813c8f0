import type { Migration } from '#server/migrations/index.ts';

/** People and sessions (the sign-in library's tables), the shop, invitations, the trial's mail, the audit trail. */
export const people: Migration = {
  name: '001-people',
  statements: [
    `CREATE TABLE "user" (
      "id" TEXT PRIMARY KEY NOT NULL,
      "name" TEXT NOT NULL,
      "email" TEXT NOT NULL UNIQUE,
      "emailVerified" INTEGER NOT NULL DEFAULT 0,
      "image" TEXT,
      "role" TEXT NOT NULL CHECK ("role" IN ('detailer','purchaser','operator','yard','manager')),
      "closed" INTEGER NOT NULL DEFAULT 0 CHECK ("closed" IN (0, 1)),
      "createdAt" TEXT NOT NULL,
      "updatedAt" TEXT NOT NULL
    )`,
    `CREATE TABLE "session" (
      "id" TEXT PRIMARY KEY NOT NULL,
      "expiresAt" TEXT NOT NULL,
      "token" TEXT NOT NULL UNIQUE,
      "createdAt" TEXT NOT NULL,
      "updatedAt" TEXT NOT NULL,
      "ipAddress" TEXT,
      "userAgent" TEXT,
      "userId" TEXT NOT NULL REFERENCES "user" ("id") ON DELETE CASCADE
    )`,
    `CREATE INDEX "session_user" ON "session" ("userId")`,
    `CREATE TABLE "account" (
      "id" TEXT PRIMARY KEY NOT NULL,
      "accountId" TEXT NOT NULL,
      "providerId" TEXT NOT NULL,
      "userId" TEXT NOT NULL REFERENCES "user" ("id") ON DELETE CASCADE,
      "accessToken" TEXT, "refreshToken" TEXT, "idToken" TEXT,
      "accessTokenExpiresAt" TEXT, "refreshTokenExpiresAt" TEXT, "scope" TEXT,
      "password" TEXT,
      "createdAt" TEXT NOT NULL,
      "updatedAt" TEXT NOT NULL
    )`,
    `CREATE INDEX "account_user" ON "account" ("userId")`,
    `CREATE TABLE "verification" (
      "id" TEXT PRIMARY KEY NOT NULL,
      "identifier" TEXT NOT NULL,
      "value" TEXT NOT NULL,
      "expiresAt" TEXT NOT NULL,
      "createdAt" TEXT,
      "updatedAt" TEXT
    )`,
    `CREATE TABLE "rateLimit" (
      "id" TEXT PRIMARY KEY NOT NULL,
      "key" TEXT NOT NULL UNIQUE,
      "count" INTEGER NOT NULL,
      "lastRequest" INTEGER NOT NULL
    )`,
    `CREATE TABLE "invitations" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "personId" TEXT NOT NULL REFERENCES "user" ("id") ON DELETE CASCADE,
      "tokenHash" TEXT NOT NULL UNIQUE,
      "expiresAt" TEXT NOT NULL,
      "usedAt" TEXT
    )`,
    `CREATE TABLE "shop" (
      "id" INTEGER PRIMARY KEY CHECK ("id" = 1),
      "name" TEXT NOT NULL,
      "units" TEXT NOT NULL CHECK ("units" IN ('imperial','metric')),
      "inchDenominator" INTEGER NOT NULL CHECK ("inchDenominator" IN (16, 32, 64)),
      "currency" TEXT NOT NULL CHECK (length("currency") = 3),
      "paper" TEXT NOT NULL CHECK ("paper" IN ('a4','letter')),
      "handlingMassMg" INTEGER NOT NULL CHECK ("handlingMassMg" > 0),
      "scrapMinorPerTonne" INTEGER NOT NULL CHECK ("scrapMinorPerTonne" >= 0),
      "demo" INTEGER NOT NULL DEFAULT 0,
      "version" INTEGER NOT NULL DEFAULT 1
    )`,
    `CREATE TABLE "mails" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "sender" TEXT NOT NULL, "recipient" TEXT NOT NULL, "subject" TEXT NOT NULL, "text" TEXT NOT NULL, "at" TEXT NOT NULL
    )`,
    `CREATE TABLE "audit_entries" (
      "id" INTEGER PRIMARY KEY AUTOINCREMENT,
      "at" TEXT NOT NULL,
      "actorId" TEXT REFERENCES "user" ("id"),
      "who" TEXT NOT NULL,
      "action" TEXT NOT NULL,
      "subject" TEXT NOT NULL,
      "detail" TEXT NOT NULL
    )`,
  ],
};
