import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optionalWhole, rowId, text, version, whole } from '#server/models/columns.ts';
import type { Family } from '#shared/domain/section/types.ts';
import type { LengthUnit } from '#shared/domain/units.ts';

export class JobRow extends Model<InferAttributes<JobRow>, InferCreationAttributes<JobRow>> {
  declare id: CreationOptional<number>;
  declare number: string;
  declare name: string;
  declare customer: CreationOptional<string>;
  declare createdAt: string;
  declare version: CreationOptional<number>;
}

export class PartListRow extends Model<InferAttributes<PartListRow>, InferCreationAttributes<PartListRow>> {
  declare id: CreationOptional<number>;
  declare jobId: number;
  declare name: string;
  declare revision: CreationOptional<string>;
  declare fileName: string;
  declare fileSha256: string;
  declare file: Buffer;
  declare fileBytes: number;
  declare encoding: string;
  declare unit: LengthUnit;
  declare choices: string;
  declare skippedRows: CreationOptional<number>;
  declare uploadedById: string;
  declare uploadedAt: string;
  declare version: CreationOptional<number>;
}

export class PartLineRow extends Model<InferAttributes<PartLineRow>, InferCreationAttributes<PartLineRow>> {
  declare id: CreationOptional<number>;
  declare partListId: number;
  declare row: number;
  declare mark: string;
  declare quantity: number;
  declare section: string;
  declare stockKey: string;
  declare family: Family;
  declare sectionText: string;
  declare grade: string;
  declare lengthNm: number;
  declare widthNm: CreationOptional<number | null>;
  declare pieceMassMg: number;
  declare note: CreationOptional<string>;
  declare finish: CreationOptional<string>;
  declare neededBy: CreationOptional<string>;
  declare remarks: CreationOptional<string>;
}

export function initJobs(sequelize: Sequelize): void {
  JobRow.init(
    {
      id: rowId(),
      number: text(),
      name: text(),
      customer: { ...text(), defaultValue: '' },
      createdAt: text(),
      version: version(),
    },
    { sequelize, timestamps: false, tableName: 'jobs' },
  );
  PartListRow.init(
    {
      id: rowId(),
      jobId: whole(),
      name: text(),
      revision: { ...text(), defaultValue: '' },
      fileName: text(),
      fileSha256: text(),
      file: { type: DataTypes.BLOB, allowNull: false },
      fileBytes: whole(),
      encoding: text(),
      unit: text(),
      choices: text(),
      skippedRows: { ...whole(), defaultValue: 0 },
      uploadedById: text(),
      uploadedAt: text(),
      version: version(),
    },
    { sequelize, timestamps: false, tableName: 'part_lists' },
  );
  PartLineRow.init(
    {
      id: rowId(),
      partListId: whole(),
      row: whole(),
      mark: text(),
      quantity: whole(),
      section: text(),
      stockKey: text(),
      family: text(),
      sectionText: text(),
      grade: text(),
      lengthNm: whole(),
      widthNm: optionalWhole(),
      pieceMassMg: whole(),
      note: { ...text(), defaultValue: '' },
      finish: { ...text(), defaultValue: '' },
      neededBy: { ...text(), defaultValue: '' },
      remarks: { ...text(), defaultValue: '' },
    },
    { sequelize, timestamps: false, tableName: 'part_lines' },
  );
}
