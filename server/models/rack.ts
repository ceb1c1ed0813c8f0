import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optionalText, optionalWhole, rowId, text, version, whole } from '#server/models/columns.ts';
import type { Family } from '#shared/domain/section/types.ts';
import type { DropState } from '#shared/schemas/rack.ts';

export class DropRow extends Model<InferAttributes<DropRow>, InferCreationAttributes<DropRow>> {
  declare id: CreationOptional<number>;
  declare tag: number;
  declare section: string;
  declare stockKey: string;
  declare family: Family;
  declare grade: string;
  declare lengthNm: number;
  declare widthNm: CreationOptional<number | null>;
  declare massMg: number;
  declare slot: string;
  declare heat: CreationOptional<string | null>;
  declare note: CreationOptional<string>;
  declare state: DropState;
  declare heldByPlanId: CreationOptional<number | null>;
  declare fromBarId: CreationOptional<number | null>;
  declare parentDropId: CreationOptional<number | null>;
  declare loggedById: string;
  declare loggedAt: string;
  declare version: CreationOptional<number>;
}

export class DropEventRow extends Model<
  InferAttributes<DropEventRow>,
  InferCreationAttributes<DropEventRow>
> {
  declare id: CreationOptional<number>;
  declare dropId: number;
  declare at: string;
  declare who: string;
  declare what: string;
  declare why: CreationOptional<string>;
}

export function initRack(sequelize: Sequelize): void {
  DropRow.init(
    {
      id: rowId(),
      tag: whole(),
      section: text(),
      stockKey: text(),
      family: text(),
      grade: text(),
      lengthNm: whole(),
      widthNm: optionalWhole(),
      massMg: whole(),
      slot: text(),
      heat: optionalText(),
      note: { ...text(), defaultValue: '' },
      state: text(),
      heldByPlanId: optionalWhole(),
      fromBarId: optionalWhole(),
      parentDropId: optionalWhole(),
      loggedById: text(),
      loggedAt: text(),
      version: version(),
    },
    { sequelize, timestamps: false, tableName: 'drops' },
  );
  DropEventRow.init(
    {
      id: rowId(),
      dropId: whole(),
      at: text(),
      who: text(),
      what: text(),
      why: { ...text(), defaultValue: '' },
    },
    { sequelize, timestamps: false, tableName: 'drop_events' },
  );
}
