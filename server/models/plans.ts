import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optionalText, optionalWhole, rowId, text, version, whole } from '#server/models/columns.ts';
import type { Family } from '#shared/domain/section/types.ts';
import type { SolveOutcome } from '#shared/domain/solve.ts';

export class PlanRow extends Model<InferAttributes<PlanRow>, InferCreationAttributes<PlanRow>> {
  declare id: CreationOptional<number>;
  declare number: number;
  declare name: string;
  declare state: 'draft' | 'issued' | 'cutting' | 'finished' | 'withdrawn';
  declare stationId: CreationOptional<number | null>;
  declare seed: number;
  declare timeLimitMs: number;
  declare createdById: string;
  declare createdAt: string;
  declare issuedAt: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
}

export class PlanGroupRow extends Model<
  InferAttributes<PlanGroupRow>,
  InferCreationAttributes<PlanGroupRow>
> {
  declare id: CreationOptional<number>;
  declare planId: number;
  declare position: number;
  declare key: string;
  declare section: string;
  declare stockKey: string;
  declare family: Family;
  declare grade: string;
  declare mgPerM: number;
  declare kerfNm: number;
  declare headCropNm: number;
  declare tailCropNm: number;
  declare holdDownNm: number;
  declare keepFromNm: number;
  declare creditMinorPerM: number;
  declare scrapMinorPerM: number;
  declare outcome: SolveOutcome;
  declare netMillionths: number;
  declare boundMillionths: number;
  declare work: string;
}

export class PlanPieceRow extends Model<
  InferAttributes<PlanPieceRow>,
  InferCreationAttributes<PlanPieceRow>
> {
  declare id: CreationOptional<number>;
  declare groupId: number;
  declare partLineId: number;
  declare quantity: number;
  declare unplaced: CreationOptional<number>;
  declare reason: CreationOptional<string>;
}

export class PlanStockRow extends Model<
  InferAttributes<PlanStockRow>,
  InferCreationAttributes<PlanStockRow>
> {
  declare id: CreationOptional<number>;
  declare groupId: number;
  declare position: number;
  declare key: string;
  declare source: 'new' | 'drop';
  declare offerId: CreationOptional<number | null>;
  declare dropId: CreationOptional<number | null>;
  declare lengthNm: number;
  declare costMinor: number;
  declare supply: CreationOptional<number | null>;
}

export class PlanLayoutRow extends Model<
  InferAttributes<PlanLayoutRow>,
  InferCreationAttributes<PlanLayoutRow>
> {
  declare id: CreationOptional<number>;
  declare groupId: number;
  declare position: number;
  declare stockId: number;
  declare repeat: number;
  declare leftoverNm: number;
  declare keeps: number;
}

export class PlanCutRow extends Model<InferAttributes<PlanCutRow>, InferCreationAttributes<PlanCutRow>> {
  declare id: CreationOptional<number>;
  declare layoutId: number;
  declare position: number;
  declare partLineId: number;
  declare startNm: number;
  declare lengthNm: number;
}

export class BarRow extends Model<InferAttributes<BarRow>, InferCreationAttributes<BarRow>> {
  declare id: CreationOptional<number>;
  declare planId: number;
  declare layoutId: number;
  declare number: number;
  declare state: 'waiting' | 'cut';
  declare heat: CreationOptional<string | null>;
  declare makesTag: CreationOptional<number | null>;
  declare cutById: CreationOptional<string | null>;
  declare cutAt: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
}

export function initPlans(sequelize: Sequelize): void {
  PlanRow.init(
    {
      id: rowId(),
      number: whole(),
      name: text(),
      state: text(),
      stationId: optionalWhole(),
      seed: whole(),
      timeLimitMs: whole(),
      createdById: text(),
      createdAt: text(),
      issuedAt: optionalText(),
      version: version(),
    },
    { sequelize, timestamps: false, tableName: 'plans' },
  );
  PlanGroupRow.init(
    {
      id: rowId(),
      planId: whole(),
      position: whole(),
      key: text(),
      section: text(),
      stockKey: text(),
      family: text(),
      grade: text(),
      mgPerM: whole(),
      kerfNm: whole(),
      headCropNm: whole(),
      tailCropNm: whole(),
      holdDownNm: whole(),
      keepFromNm: whole(),
      creditMinorPerM: whole(),
      scrapMinorPerM: whole(),
      outcome: text(),
      netMillionths: whole(),
      boundMillionths: whole(),
      work: text(),
    },
    { sequelize, timestamps: false, tableName: 'plan_groups' },
  );
  PlanPieceRow.init(
    {
      id: rowId(),
      groupId: whole(),
      partLineId: whole(),
      quantity: whole(),
      unplaced: { ...whole(), defaultValue: 0 },
      reason: { ...text(), defaultValue: '' },
    },
    { sequelize, timestamps: false, tableName: 'plan_pieces' },
  );
  PlanStockRow.init(
    {
      id: rowId(),
      groupId: whole(),
      position: whole(),
      key: text(),
      source: text(),
      offerId: optionalWhole(),
      dropId: optionalWhole(),
      lengthNm: whole(),
      costMinor: whole(),
      supply: optionalWhole(),
    },
    { sequelize, timestamps: false, tableName: 'plan_stock' },
  );
  PlanLayoutRow.init(
    {
      id: rowId(),
      groupId: whole(),
      position: whole(),
      stockId: whole(),
      repeat: whole(),
      leftoverNm: whole(),
      keeps: whole(),
    },
    { sequelize, timestamps: false, tableName: 'plan_layouts' },
  );
  PlanCutRow.init(
    {
      id: rowId(),
      layoutId: whole(),
      position: whole(),
      partLineId: whole(),
      startNm: whole(),
      lengthNm: whole(),
    },
    { sequelize, timestamps: false, tableName: 'plan_cuts' },
  );
  BarRow.init(
    {
      id: rowId(),
      planId: whole(),
      layoutId: whole(),
      number: whole(),
      state: text(),
      heat: optionalText(),
      makesTag: optionalWhole(),
      cutById: optionalText(),
      cutAt: optionalText(),
      version: version(),
    },
    { sequelize, timestamps: false, tableName: 'bars' },
  );
}
