import { createBrowserRouter, redirect } from 'react-router-dom';
import { queryClient } from '#src/lib/query-client.ts';
import { LANDING, sessionQuery } from '#src/lib/session.ts';
import { paths } from '#src/lib/paths.ts';
import { Component as Layout, Starting } from '#src/routes/layout.tsx';
import { NotFound, PageFault } from '#src/routes/page-fault.tsx';

/** Pages behind sign-in: an unknown visitor is sent to sign in and comes back to where they wanted to go. */
async function signedIn({ request }: { request: Request }) {
  const session = await queryClient.ensureQueryData(sessionQuery);
  if (session.needsSetUp) return redirect(paths.setUp());
  if (!session.person) {
    const url = new URL(request.url);
    return redirect(paths.signIn(url.pathname === '/' ? undefined : url.pathname + url.search));
  }
  return null;
}

async function landing() {
  const { person } = await queryClient.ensureQueryData(sessionQuery);
  return redirect(person ? LANDING[person.role] : paths.signIn());
}

export const router = createBrowserRouter([
  {
    path: '/',
    loader: () => queryClient.ensureQueryData(sessionQuery),
    ErrorBoundary: PageFault,
    HydrateFallback: Starting,
    children: [
      { path: 'sign-in', lazy: () => import('#src/routes/sign-in.tsx') },
      { path: 'set-up', lazy: () => import('#src/routes/set-up.tsx') },
      { path: 'join/:token', lazy: () => import('#src/routes/join.tsx') },
      // Paper carries no rail.
      {
        path: 'plans/:planId/print',
        loader: signedIn,
        children: [{ index: true, lazy: () => import('#src/routes/plan-print.tsx') }],
      },
      {
        loader: signedIn,
        Component: Layout,
        children: [
          {
            ErrorBoundary: PageFault,
            children: [
              { index: true, loader: landing },
              { path: 'jobs', lazy: () => import('#src/routes/jobs.tsx') },
              { path: 'jobs/:jobId', lazy: () => import('#src/routes/job.tsx') },
              { path: 'jobs/:jobId/upload', lazy: () => import('#src/routes/upload.tsx') },
              { path: 'part-lists/:partListId', lazy: () => import('#src/routes/part-list.tsx') },
              { path: 'plans', lazy: () => import('#src/routes/plans.tsx') },
              { path: 'plans/new', lazy: () => import('#src/routes/plan-new.tsx') },
              { path: 'plans/:planId', lazy: () => import('#src/routes/plan.tsx') },
              { path: 'buying', lazy: () => import('#src/routes/buying.tsx') },
              { path: 'buying/suppliers', lazy: () => import('#src/routes/suppliers.tsx') },
              { path: 'bench', lazy: () => import('#src/routes/bench.tsx') },
              { path: 'bench/:planId', lazy: () => import('#src/routes/bench-plan.tsx') },
              { path: 'rack', lazy: () => import('#src/routes/rack.tsx') },
              { path: 'rack/log', lazy: () => import('#src/routes/rack-log.tsx') },
              { path: 'rack/:dropId', lazy: () => import('#src/routes/drop.tsx') },
              { path: 'shop', lazy: () => import('#src/routes/shop.tsx') },
              { path: 'shop/people', lazy: () => import('#src/routes/shop-people.tsx') },
              { path: 'shop/stations', lazy: () => import('#src/routes/shop-stations.tsx') },
              { path: 'shop/drop-rules', lazy: () => import('#src/routes/shop-drop-rules.tsx') },
              { path: 'shop/mail', lazy: () => import('#src/routes/shop-mail.tsx') },
              { path: 'shop/audit', lazy: () => import('#src/routes/shop-audit.tsx') },
              { path: '*', Component: NotFound },
            ],
          },
        ],
      },
    ],
  },
]);
