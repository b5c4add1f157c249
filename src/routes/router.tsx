import type { ComponentType } from 'react';
import { createBrowserRouter, Outlet, type RouteObject } from 'react-router';

import { Loading } from './loading.tsx';
import { NotFoundRoute, PageError } from './page-error.tsx';
import { SignedInRoute } from './signed-in.tsx';

/** Every address there is. Each page is fetched when it is first asked for. */
const routes: RouteObject[] = [
  {
    element: <Outlet />,
    errorElement: <PageError />,
    hydrateFallbackElement: <Loading what="Opening" />,
    children: [
      page('/sign-in', async () => (await import('./sign-in.tsx')).SignInRoute),
      page('/sign-up', async () => (await import('./sign-up.tsx')).SignUpRoute),
      page('/forgot', async () => (await import('./forgot.tsx')).ForgotRoute),
      page('/reset', async () => (await import('./reset.tsx')).ResetRoute),
      page('/confirm', async () => (await import('./confirm.tsx')).ConfirmRoute),
      page('/invitations/:token', async () => (await import('./invitation.tsx')).InvitationRoute),
      page('/mailbox', async () => (await import('./mailbox.tsx')).MailboxRoute),
      {
        element: <SignedInRoute />,
        children: [
          page('/', async () => (await import('./home.tsx')).HomeRoute),
          page('/vessels/new', async () => (await import('./new-vessel.tsx')).NewVesselRoute),
          page('/vessels/:vesselId/revisions', async () => (await import('./revisions.tsx')).RevisionsRoute),
          page('/vessels/:vesselId/revisions/:letter', async () => (await import('./revision.tsx')).RevisionRoute),
          {
            path: '/vessels/:vesselId',
            lazy: async () => ({ Component: (await import('./vessel-layout.tsx')).VesselLayout }),
            children: [
              page('draw', async () => (await import('./draw.tsx')).DrawRoute),
              page('draw/:sheetId', async () => (await import('./draw.tsx')).DrawRoute),
              page('findings', async () => (await import('./findings.tsx')).FindingsRoute),
              page('parts', async () => (await import('./parts.tsx')).PartsRoute),
              page('print', async () => (await import('./print.tsx')).PrintRoute),
              page('basis', async () => (await import('./basis.tsx')).BasisRoute),
              page('people', async () => (await import('./people.tsx')).PeopleRoute),
            ],
          },
        ],
      },
      { path: '*', element: <NotFoundRoute /> },
    ],
  },
];

function page(path: string, load: () => Promise<ComponentType>): RouteObject {
  return { path, errorElement: <PageError />, lazy: async () => ({ Component: await load() }) };
}

export const router = createBrowserRouter(routes);
