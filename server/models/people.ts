import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optionalText, rowId, text, version, whole } from '#server/models/columns.ts';
import type { Role } from '#shared/permissions.ts';

/** The person's row of the sign-in library, with the shop's own columns. Times are ISO 8601 text. */
export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: string;
  declare name: string;
  declare email: string;
  declare emailVerified: CreationOptional<number>;
  declare image: CreationOptional<string | null>;
  declare role: Role;
  declare closed: CreationOptional<number>;
  declare createdAt: string;
  declare updatedAt: string;
}

export class Invitation extends Model<InferAttributes<Invitation>, InferCreationAttributes<Invitation>> {
  declare id: CreationOptional<number>;
  declare personId: string;
  declare tokenHash: string;
  declare expiresAt: string;
  declare usedAt: CreationOptional<string | null>;
}

export class ShopRow extends Model<InferAttributes<ShopRow>, InferCreationAttributes<ShopRow>> {
  declare id: number;
  declare name: string;
  declare units: 'imperial' | 'metric';
  declare inchDenominator: 16 | 32 | 64;
  declare currency: string;
  declare paper: 'a4' | 'letter';
  declare handlingMassMg: number;
  declare scrapMinorPerTonne: number;
  declare demo: CreationOptional<number>;
  declare version: CreationOptional<number>;
}

export class Mail extends Model<InferAttributes<Mail>, InferCreationAttributes<Mail>> {
  declare id: CreationOptional<number>;
  declare sender: string;
  declare recipient: string;
  declare subject: string;
  declare text: string;
  declare at: string;
}

export class AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
  declare id: CreationOptional<number>;
  declare at: string;
  declare actorId: string | null;
  declare who: string;
  declare action: string;
  declare subject: string;
  declare detail: string;
}

export function initPeople(sequelize: Sequelize): void {
  const options = { sequelize, timestamps: false } as const;
  Person.init(
    {
      id: { ...text(), primaryKey: true },
      name: text(),
      email: text(),
      emailVerified: { ...whole(), defaultValue: 0 },
      image: optionalText(),
      role: text(),
      closed: { ...whole(), defaultValue: 0 },
      createdAt: text(),
      updatedAt: text(),
    },
    { ...options, tableName: 'user' },
  );
  Invitation.init(
    { id: rowId(), personId: text(), tokenHash: text(), expiresAt: text(), usedAt: optionalText() },
    { ...options, tableName: 'invitations' },
  );
  ShopRow.init(
    {
      id: { ...whole(), primaryKey: true },
      name: text(),
      units: text(),
      inchDenominator: whole(),
      currency: text(),
      paper: text(),
      handlingMassMg: whole(),
      scrapMinorPerTonne: whole(),
      demo: { ...whole(), defaultValue: 0 },
      version: version(),
    },
    { ...options, tableName: 'shop' },
  );
  Mail.init(
    { id: rowId(), sender: text(), recipient: text(), subject: text(), text: text(), at: text() },
    { ...options, tableName: 'mails' },
  );
  AuditEntry.init(
    {
      id: rowId(),
      at: text(),
      actorId: optionalText(),
      who: text(),
      action: text(),
      subject: text(),
      detail: text(),
    },
    { ...options, tableName: 'audit_entries' },
  );
}
