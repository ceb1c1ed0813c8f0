/**
 * better-auth on Sequelize. Dates are ISO 8601 text, booleans 0 and 1, as everywhere in this database. Every write is one
 * statement or joins a running `write`, so that sign-ins stand in the same queue as everybody else.
 */
import { createAdapterFactory, type AdapterFactoryOptions, type CleanedWhere } from 'better-auth/adapters';
import type { BetterAuthOptions } from 'better-auth';
import { QueryTypes, type Sequelize } from 'sequelize';
import { write } from '#server/database.ts';

type Value = string | number | boolean | null | Date | string[] | number[] | undefined;
type Row = Record<string, unknown>;

const quote = (name: string) => `"${name.replaceAll('"', '""')}"`;

/** A `where` list as SQL: AND-joined ones together with one OR-joined group, the library's own reading. */
function whereSql(where: readonly CleanedWhere[], bind: unknown[]): string {
  const put = (value: unknown) => `$${bind.push(value instanceof Date ? value.toISOString() : value)}`;
  const one = ({ field, operator, value, mode }: CleanedWhere): string => {
    const fold = mode === 'insensitive' && (typeof value === 'string' || Array.isArray(value));
    const lower = (v: Value) => (typeof v === 'string' ? v.toLowerCase() : v);
    const column = fold ? `lower(${quote(field)})` : quote(field);
    const v = fold && typeof value === 'string' ? value.toLowerCase() : value;
    const list = () => {
      if (!Array.isArray(value)) throw new Error(`${operator} wants a list`);
      return value.map((entry) => put(fold ? lower(entry) : entry)).join(', ');
    };
    switch (operator) {
      case 'in':
        return `${column} IN (${list()})`;
      case 'not_in':
        return `${column} NOT IN (${list()})`;
      case 'contains':
        return `instr(${column}, ${put(v)}) > 0`;
      case 'starts_with':
        return `substr(${column}, 1, length(${put(v)})) = ${put(v)}`;
      case 'ends_with':
        return `substr(${column}, -length(${put(v)})) = ${put(v)}`;
      case 'gt':
        return `${column} > ${put(v)}`;
      case 'gte':
        return `${column} >= ${put(v)}`;
      case 'lt':
        return `${column} < ${put(v)}`;
      case 'lte':
        return `${column} <= ${put(v)}`;
      case 'ne':
        return v === null ? `${column} IS NOT NULL` : `${column} IS NOT ${put(v)}`;
      case 'eq':
        return v === null ? `${column} IS NULL` : `${column} = ${put(v)}`;
    }
  };
  const and = where.filter(({ connector }) => connector !== 'OR').map(one);
  const or = where.filter(({ connector }) => connector === 'OR').map(one);
  if (or.length > 0) and.push(`(${or.join(' OR ')})`);
  return and.length > 0 ? ` WHERE ${and.join(' AND ')}` : '';
}

export const sequelizeAdapter = (sequelize: Sequelize) => {
  const all = (sql: string, bind: unknown[]) => sequelize.query<Row>(sql, { bind, type: QueryTypes.SELECT });
  const change = (sql: string, bind: unknown[]) => write(() => all(sql, bind));
  const firstRow = (table: string, filter: string) =>
    `rowid = (SELECT rowid FROM ${quote(table)}${filter} LIMIT 1)`;

  const statements: AdapterFactoryOptions = {
    config: {
      adapterId: 'sequelize',
      adapterName: 'Sequelize adapter',
      supportsDates: false,
      supportsBooleans: false,
      supportsJSON: false,
      supportsArrays: false,
      supportsNumericIds: false,
    },
    adapter: ({ getFieldName }) => {
      const columnsOf = (model: string, select: string[] | undefined) =>
        select?.length ? select.map((field) => quote(getFieldName({ model, field }))).join(', ') : '*';
      return {
        async create({ model, data }) {
          const bind: unknown[] = [];
          const fields = Object.entries(data as Row).filter(([, value]) => value !== undefined);
          const names = fields.map(([name]) => quote(name)).join(', ');
          const values = fields.map(([, value]) => `$${bind.push(value)}`).join(', ');
          // `OR ABORT` is SQLite's default; spelled out, because Sequelize runs a bare `INSERT INTO` without reading its rows.
          const [row] = await change(
            `INSERT OR ABORT INTO ${quote(model)} (${names}) VALUES (${values}) RETURNING *`,
            bind,
          );
          return row as never;
        },
        async findOne({ model, where, select }) {
          const bind: unknown[] = [];
          const [row] = await all(
            `SELECT ${columnsOf(model, select)} FROM ${quote(model)}${whereSql(where, bind)} LIMIT 1`,
            bind,
          );
          return (row ?? null) as never;
        },
        async findMany({ model, where, limit, select, sortBy, offset }) {
          const bind: unknown[] = [];
          const filter = whereSql(where ?? [], bind);
          const order = sortBy
            ? ` ORDER BY ${quote(getFieldName({ model, field: sortBy.field }))} ${sortBy.direction === 'desc' ? 'DESC' : 'ASC'}`
            : '';
          const page = ` LIMIT ${limit ?? 100}${offset ? ` OFFSET ${offset}` : ''}`;
          return (await all(
            `SELECT ${columnsOf(model, select)} FROM ${quote(model)}${filter}${order}${page}`,
            bind,
          )) as never;
        },
        async count({ model, where }) {
          const bind: unknown[] = [];
          const [row] = await all(
            `SELECT count(*) AS n FROM ${quote(model)}${whereSql(where ?? [], bind)}`,
            bind,
          );
          return Number(row?.n ?? 0);
        },
        async update({ model, where, update }) {
          const bind: unknown[] = [];
          const sets = Object.entries(update as Row).map(
            ([name, value]) => `${quote(name)} = $${bind.push(value)}`,
          );
          const filter = whereSql(where, bind);
          const [row] = await change(
            `UPDATE ${quote(model)} SET ${sets.join(', ')} WHERE ${firstRow(model, filter)} RETURNING *`,
            bind,
          );
          return (row ?? null) as never;
        },
        async updateMany({ model, where, update }) {
          const bind: unknown[] = [];
          const sets = Object.entries(update).map(([name, value]) => `${quote(name)} = $${bind.push(value)}`);
          return (
            await change(
              `UPDATE ${quote(model)} SET ${sets.join(', ')}${whereSql(where, bind)} RETURNING rowid`,
              bind,
            )
          ).length;
        },
        async delete({ model, where }) {
          const bind: unknown[] = [];
          await change(
            `DELETE FROM ${quote(model)} WHERE ${firstRow(model, whereSql(where, bind))} RETURNING rowid`,
            bind,
          );
        },
        async deleteMany({ model, where }) {
          const bind: unknown[] = [];
          return (await change(`DELETE FROM ${quote(model)}${whereSql(where, bind)} RETURNING rowid`, bind))
            .length;
        },
        async consumeOne({ model, where }) {
          const bind: unknown[] = [];
          const [row] = await change(
            `DELETE FROM ${quote(model)} WHERE ${firstRow(model, whereSql(where, bind))} RETURNING *`,
            bind,
          );
          return (row ?? null) as never;
        },
        async incrementOne({ model, where, increment, set }) {
          const bind: unknown[] = [];
          const sets = [
            ...Object.entries(increment).map(
              ([name, by]) => `${quote(name)} = coalesce(${quote(name)}, 0) + $${bind.push(by)}`,
            ),
            ...Object.entries(set ?? {}).map(([name, value]) => `${quote(name)} = $${bind.push(value)}`),
          ];
          const filter = whereSql(where, bind);
          const [row] = await change(
            `UPDATE ${quote(model)} SET ${sets.join(', ')} WHERE ${firstRow(model, filter)} RETURNING *`,
            bind,
          );
          return (row ?? null) as never;
        },
      };
    },
  };
  // Inside a write every query joins the running transaction by itself, so the plain adapter serves there.
  return (options: BetterAuthOptions) => {
    const plain = createAdapterFactory(statements)(options);
    return createAdapterFactory({
      ...statements,
      config: { ...statements.config, transaction: (work) => write(() => work(plain)) },
    })(options);
  };
};
