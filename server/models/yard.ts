import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optionalWhole, rowId, text, version, whole } from '#server/models/columns.ts';
import type { Family } from '#shared/domain/section/types.ts';

export class StationRow extends Model<InferAttributes<StationRow>, InferCreationAttributes<StationRow>> {
  declare id: CreationOptional<number>;
  declare name: string;
  declare method: 'shear' | 'saw' | 'thermal';
  declare kerfNm: number;
  declare headCropNm: number;
  declare tailCropNm: number;
  declare holdDownNm: number;
  declare longestStopNm: CreationOptional<number | null>;
  declare families: string;
  declare note: CreationOptional<string>;
  declare version: CreationOptional<number>;
}

export class DropRuleRow extends Model<InferAttributes<DropRuleRow>, InferCreationAttributes<DropRuleRow>> {
  declare family: Family;
  declare keepFromNm: number;
  declare creditPercent: number;
  declare version: CreationOptional<number>;
}

export class SupplierRow extends Model<InferAttributes<SupplierRow>, InferCreationAttributes<SupplierRow>> {
  declare id: CreationOptional<number>;
  declare name: string;
  declare email: CreationOptional<string>;
  declare note: CreationOptional<string>;
  declare version: CreationOptional<number>;
}

export class OfferRow extends Model<InferAttributes<OfferRow>, InferCreationAttributes<OfferRow>> {
  declare id: CreationOptional<number>;
  declare supplierId: number;
  declare section: string;
  declare stockKey: string;
  declare grade: string;
  declare lengthNm: number;
  declare priceMinor: number;
  declare pricedAt: string;
  declare withdrawn: CreationOptional<number>;
  declare version: CreationOptional<number>;
}

export function initYard(sequelize: Sequelize): void {
  StationRow.init(
    {
      id: rowId(),
      name: text(),
      method: text(),
      kerfNm: whole(),
      headCropNm: whole(),
      tailCropNm: whole(),
      holdDownNm: whole(),
      longestStopNm: optionalWhole(),
      families: text(),
      note: { ...text(), defaultValue: '' },
      version: version(),
    },
    { sequelize, timestamps: false, tableName: 'stations' },
  );
  DropRuleRow.init(
    {
      family: { ...text(), primaryKey: true },
      keepFromNm: whole(),
      creditPercent: whole(),
      version: version(),
    },
    { sequelize, timestamps: false, tableName: 'drop_rules' },
  );
  SupplierRow.init(
    {
      id: rowId(),
      name: text(),
      email: { ...text(), defaultValue: '' },
      note: { ...text(), defaultValue: '' },
      version: version(),
    },
    { sequelize, timestamps: false, tableName: 'suppliers' },
  );
  OfferRow.init(
    {
      id: rowId(),
      supplierId: whole(),
      section: text(),
      stockKey: text(),
      grade: text(),
      lengthNm: whole(),
      priceMinor: whole(),
      pricedAt: text(),
      withdrawn: { ...whole(), defaultValue: 0 },
      version: version(),
    },
    { sequelize, timestamps: false, tableName: 'offers' },
  );
}
