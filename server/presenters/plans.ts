import type { PlanFacts } from '#server/services/plan-facts.ts';
import type { PlanWhole } from '#server/services/read-plan.ts';
import { roleMay, type Role } from '#shared/permissions.ts';
import type { PlanSummary, PlanView } from '#shared/schemas/plans.ts';

export function presentPlan(
  { plan, netMillionths, boundMillionths, ...facts }: PlanFacts,
  role: Role,
): PlanSummary {
  return {
    id: plan.id,
    number: plan.number,
    name: plan.name,
    state: plan.state,
    stationId: plan.stationId ?? null,
    ...facts,
    netMinor: Math.round(netMillionths / 1e6),
    boundMinor: Math.floor(boundMillionths / 1e6),
    createdAt: plan.createdAt,
    issuedAt: plan.issuedAt ?? null,
    version: plan.version,
    can: {
      'plan:issue': roleMay(role, 'plan:issue') && plan.state === 'draft',
      'plan:withdraw': roleMay(role, 'plan:withdraw') && (plan.state === 'draft' || plan.state === 'issued'),
      'plan:remove': roleMay(role, 'plan:draft') && plan.state === 'draft',
      'bar:cut': roleMay(role, 'bar:cut') && (plan.state === 'issued' || plan.state === 'cutting'),
    },
  };
}

export const presentPlanWhole = ({ facts, groups, bars }: PlanWhole, role: Role): PlanView => ({
  plan: presentPlan(facts, role),
  groups,
  bars: facts.plan.state === 'withdrawn' ? [] : bars,
});
