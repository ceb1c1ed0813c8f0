import { z } from 'zod';
import { route, type Route } from '#server/middleware/route.ts';
import { presentPlan, presentPlanWhole } from '#server/presenters/plans.ts';
import { cutBar } from '#server/services/cut-bar.ts';
import { issuePlan, removeDraft, withdrawPlan } from '#server/services/issue-plan.ts';
import { describePlanning } from '#server/services/planning.ts';
import { findBar } from '#server/services/bar-views.ts';
import { findPlanFacts, listPlans } from '#server/services/plan-facts.ts';
import { findPlanWhole } from '#server/services/read-plan.ts';
import { savePlan } from '#server/services/save-plan.ts';
import { roleMay, type Role } from '#shared/permissions.ts';
import { Id } from '#shared/schemas/common.ts';
import {
  CutBarAnswer,
  CutBarInput,
  IssuePlanInput,
  PlanList,
  PlanningInput,
  PlanningView,
  PlanView,
  SavePlanInput,
  WithdrawPlanInput,
} from '#shared/schemas/plans.ts';

const ByPlan = z.object({ planId: Id });
const ByBar = z.object({ barId: Id });

const viewPlan = async (planId: number, role: Role) => presentPlanWhole(await findPlanWhole(planId), role);

export const planRoutes: Route[] = [
  route(
    { method: 'post', path: '/api/planning', allow: 'plan:draft', body: PlanningInput, answer: PlanningView },
    ({ body }) => describePlanning(body.partLineIds),
  ),
  route({ method: 'get', path: '/api/plans', allow: 'plan:read', answer: PlanList }, async ({ actor }) => ({
    plans: (await listPlans()).map((plan) => presentPlan(plan, actor.role)),
    can: { 'plan:draft': roleMay(actor.role, 'plan:draft') },
  })),
  route(
    {
      method: 'post',
      path: '/api/plans',
      allow: 'plan:draft',
      body: SavePlanInput,
      answer: PlanView,
      status: 201,
    },
    async ({ body, actor }) => viewPlan(await savePlan(body, actor), actor.role),
  ),
  route(
    { method: 'get', path: '/api/plans/:planId', allow: 'plan:read', params: ByPlan, answer: PlanView },
    ({ params, actor }) => viewPlan(params.planId, actor.role),
  ),
  route(
    { method: 'delete', path: '/api/plans/:planId', allow: 'plan:draft', params: ByPlan },
    async ({ params, actor }) => {
      await removeDraft(params.planId, actor);
      return undefined;
    },
  ),
  route(
    {
      method: 'post',
      path: '/api/plans/:planId/issue',
      allow: 'plan:issue',
      params: ByPlan,
      body: IssuePlanInput,
      answer: PlanView,
    },
    async ({ params, body, actor }) => {
      await issuePlan(params.planId, body, actor);
      return viewPlan(params.planId, actor.role);
    },
  ),
  route(
    {
      method: 'post',
      path: '/api/plans/:planId/withdraw',
      allow: 'plan:withdraw',
      params: ByPlan,
      body: WithdrawPlanInput,
      answer: PlanView,
    },
    async ({ params, body, actor }) => {
      await withdrawPlan(params.planId, body, actor);
      return viewPlan(params.planId, actor.role);
    },
  ),
  route(
    {
      method: 'post',
      path: '/api/bars/:barId/cut',
      allow: 'bar:cut',
      params: ByBar,
      body: CutBarInput,
      answer: CutBarAnswer,
    },
    async ({ params, body, actor }) => {
      const { planId, barId } = await cutBar(params.barId, body, actor);
      const [facts, bar] = await Promise.all([findPlanFacts(planId), findBar(barId)]);
      return { plan: presentPlan(facts, actor.role), bar };
    },
  ),
];
