import { z } from 'zod';
import { route, type Route } from '#server/middleware/route.ts';
import { presentDropRule, presentOffer, presentStation, presentSupplier } from '#server/presenters/yard.ts';
import {
  changeDropRule,
  changeStation,
  changeSupplier,
  listDropRules,
  listStations,
  listSuppliers,
  makeStation,
  makeSupplier,
  removeStation,
  removeSupplier,
} from '#server/services/yard.ts';
import { changeOffer, listOffers, makeOffer, removeOffer } from '#server/services/offers.ts';
import { roleMay } from '#shared/permissions.ts';
import { Id } from '#shared/schemas/common.ts';
import {
  DropRule,
  DropRuleInput,
  DropRuleList,
  Offer,
  OfferInput,
  OfferList,
  Station,
  StationInput,
  StationList,
  Supplier,
  SupplierInput,
  SupplierList,
} from '#shared/schemas/yard.ts';

const ByStation = z.object({ stationId: Id });
const BySupplier = z.object({ supplierId: Id });
const ByOffer = z.object({ offerId: Id });

export const yardRoutes: Route[] = [
  route(
    { method: 'get', path: '/api/stations', allow: 'station:read', answer: StationList },
    async ({ actor }) => ({
      stations: (await listStations()).map((station) => presentStation(station, actor.role)),
    }),
  ),
  route(
    {
      method: 'post',
      path: '/api/stations',
      allow: 'station:edit',
      body: StationInput,
      answer: Station,
      status: 201,
    },
    async ({ body, actor }) => presentStation(await makeStation(body, actor), actor.role),
  ),
  route(
    {
      method: 'put',
      path: '/api/stations/:stationId',
      allow: 'station:edit',
      params: ByStation,
      body: StationInput,
      answer: Station,
    },
    async ({ params, body, actor }) =>
      presentStation(await changeStation(params.stationId, body, actor), actor.role),
  ),
  route(
    { method: 'delete', path: '/api/stations/:stationId', allow: 'station:edit', params: ByStation },
    async ({ params, actor }) => {
      await removeStation(params.stationId, actor);
      return undefined;
    },
  ),
  route(
    { method: 'get', path: '/api/drop-rules', allow: 'drop-rule:read', answer: DropRuleList },
    async ({ actor }) => ({
      rules: (await listDropRules()).map(presentDropRule),
      can: { 'drop-rule:edit': roleMay(actor.role, 'drop-rule:edit') },
    }),
  ),
  route(
    {
      method: 'put',
      path: '/api/drop-rules',
      allow: 'drop-rule:edit',
      body: DropRuleInput,
      answer: DropRule,
    },
    async ({ body, actor }) => presentDropRule(await changeDropRule(body, actor)),
  ),
  route(
    { method: 'get', path: '/api/suppliers', allow: 'supplier:read', answer: SupplierList },
    async ({ actor }) => ({
      suppliers: (await listSuppliers()).map((supplier) => presentSupplier(supplier, actor.role)),
    }),
  ),
  route(
    {
      method: 'post',
      path: '/api/suppliers',
      allow: 'supplier:edit',
      body: SupplierInput,
      answer: Supplier,
      status: 201,
    },
    async ({ body, actor }) => presentSupplier(await makeSupplier(body, actor), actor.role),
  ),
  route(
    {
      method: 'put',
      path: '/api/suppliers/:supplierId',
      allow: 'supplier:edit',
      params: BySupplier,
      body: SupplierInput,
      answer: Supplier,
    },
    async ({ params, body, actor }) =>
      presentSupplier(await changeSupplier(params.supplierId, body, actor), actor.role),
  ),
  route(
    { method: 'delete', path: '/api/suppliers/:supplierId', allow: 'supplier:edit', params: BySupplier },
    async ({ params, actor }) => {
      await removeSupplier(params.supplierId, actor);
      return undefined;
    },
  ),
  route(
    { method: 'get', path: '/api/offers', allow: 'offer:read', answer: OfferList },
    async ({ actor }) => ({
      offers: (await listOffers()).map((offer) => presentOffer(offer, actor.role)),
    }),
  ),
  route(
    {
      method: 'post',
      path: '/api/offers',
      allow: 'offer:edit',
      body: OfferInput,
      answer: Offer,
      status: 201,
    },
    async ({ body, actor }) => presentOffer(await makeOffer(body, actor), actor.role),
  ),
  route(
    {
      method: 'put',
      path: '/api/offers/:offerId',
      allow: 'offer:edit',
      params: ByOffer,
      body: OfferInput,
      answer: Offer,
    },
    async ({ params, body, actor }) =>
      presentOffer(await changeOffer(params.offerId, body, actor), actor.role),
  ),
  route(
    { method: 'delete', path: '/api/offers/:offerId', allow: 'offer:edit', params: ByOffer },
    async ({ params, actor }) => {
      await removeOffer(params.offerId, actor);
      return undefined;
    },
  ),
];
