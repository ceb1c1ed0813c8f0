/** Stations, drop rules and suppliers: what a plan draws its defaults from. */
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import type { Actor } from '#server/policies/actor.ts';
import { DropRuleRow, OfferRow, PlanRow, StationRow, SupplierRow } from '#server/models/index.ts';
import { expectFound, expectVersion } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { refuseTwin } from '#server/services/refuse-twin.ts';
import type { DropRuleInput, StationInput, SupplierInput } from '#shared/schemas/yard.ts';

const named = <T>(what: string, name: string, work: () => Promise<T>): Promise<T> =>
  refuseTwin(
    `There is already a ${what} called ${name}.`,
    [{ path: 'name', message: `${name} is taken` }],
    work,
  );

export const listStations = (): Promise<StationRow[]> => StationRow.findAll({ order: [['name', 'ASC']] });

export function makeStation(input: StationInput, actor: Actor | null): Promise<StationRow> {
  return write(() =>
    named('station', input.name, async () => {
      const { version: _version, families, ...details } = input;
      const station = await StationRow.create({
        ...details,
        families: JSON.stringify([...new Set(families)]),
      });
      await record(actor, 'station:make', `station ${station.name}`, input);
      return station;
    }),
  );
}

export function changeStation(stationId: number, input: StationInput, actor: Actor): Promise<StationRow> {
  return write(() =>
    named('station', input.name, async () => {
      const station = expectFound(await StationRow.findByPk(stationId), 'station');
      expectVersion(station, input.version, `the station ${station.name}`);
      const { version: _version, families, ...details } = input;
      await station.update({
        ...details,
        families: JSON.stringify([...new Set(families)]),
        version: station.version + 1,
      });
      await record(actor, 'station:edit', `station ${station.name}`, input);
      return station;
    }),
  );
}

export function removeStation(stationId: number, actor: Actor): Promise<void> {
  return write(async () => {
    const station = expectFound(await StationRow.findByPk(stationId), 'station');
    if (await PlanRow.findOne({ where: { stationId } }))
      throw new ShopError('wrong-state', `Plans were made for ${station.name}, so it stays.`);
    await station.destroy();
    await record(actor, 'station:remove', `station ${station.name}`, {});
  });
}

export const listDropRules = (): Promise<DropRuleRow[]> =>
  DropRuleRow.findAll({ order: [['family', 'ASC']] });

export function changeDropRule(input: DropRuleInput, actor: Actor): Promise<DropRuleRow> {
  return write(async () => {
    const rule = expectFound(await DropRuleRow.findByPk(input.family), 'rule');
    expectVersion(rule, input.version, `the rule for ${input.family}`);
    await rule.update({
      keepFromNm: input.keepFromNm,
      creditPercent: input.creditPercent,
      version: rule.version + 1,
    });
    await record(actor, 'drop-rule:edit', `rule for ${input.family}`, input);
    return rule;
  });
}

export const listSuppliers = (): Promise<SupplierRow[]> => SupplierRow.findAll({ order: [['name', 'ASC']] });

export function makeSupplier(input: SupplierInput, actor: Actor | null): Promise<SupplierRow> {
  return write(() =>
    named('supplier', input.name, async () => {
      const { version: _version, ...details } = input;
      const supplier = await SupplierRow.create(details);
      await record(actor, 'supplier:make', `supplier ${supplier.name}`, details);
      return supplier;
    }),
  );
}

export function changeSupplier(supplierId: number, input: SupplierInput, actor: Actor): Promise<SupplierRow> {
  return write(() =>
    named('supplier', input.name, async () => {
      const supplier = expectFound(await SupplierRow.findByPk(supplierId), 'supplier');
      const { version, ...details } = input;
      expectVersion(supplier, version, `the supplier ${supplier.name}`);
      await supplier.update({ ...details, version: supplier.version + 1 });
      await record(actor, 'supplier:edit', `supplier ${supplier.name}`, details);
      return supplier;
    }),
  );
}

export function removeSupplier(supplierId: number, actor: Actor): Promise<void> {
  return write(async () => {
    const supplier = expectFound(await SupplierRow.findByPk(supplierId), 'supplier');
    if (await OfferRow.findOne({ where: { supplierId } }))
      throw new ShopError('wrong-state', `${supplier.name} has made offers, so the name stays.`);
    await supplier.destroy();
    await record(actor, 'supplier:remove', `supplier ${supplier.name}`, {});
  });
}
