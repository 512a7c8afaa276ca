import { render, type RenderResult } from '@testing-library/react';
import userEvent, { type UserEvent } from '@testing-library/user-event';
import { QueryClient } from '@tanstack/react-query';
import type { Session } from '@furrowlight/shared/contract/session';
import { http, HttpResponse, type RequestHandler } from 'msw';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { AppProviders } from '../app/providers';
import { makeRoutes } from '../app/router';
import { aSession } from './factories';
import { server } from './server';

interface Options {
  /** Answers of the API; a request without one fails the test. */
  handlers?: RequestHandler[];
  /** Who is signed in; null for nobody. An advisor unless told. */
  session?: Session | null;
}

export interface RenderedApp extends RenderResult {
  user: UserEvent;
  router: ReturnType<typeof createMemoryRouter>;
  client: QueryClient;
}

/** The one entrance of tests: the whole program at an address, against declared answers. */
export function renderApp(path: string, options: Options = {}): RenderedApp {
  const session = options.session === undefined ? aSession() : options.session;
  const client = new QueryClient({
    defaultOptions: { queries: { retry: false, gcTime: Infinity }, mutations: { retry: false } },
  });
  server.use(
    ...(options.handlers ?? []),
    http.get('*/api/session', () =>
      session
        ? HttpResponse.json(session)
        : HttpResponse.json(
            {
              type: 'about:blank',
              title: 'Not signed in',
              status: 401,
              code: 'not-signed-in',
              detail: 'Sign in first.',
              requestId: 'test-request',
            },
            { status: 401 },
          ),
    ),
  );
  const router = createMemoryRouter(makeRoutes(), { initialEntries: [path] });
  const view = render(
    <AppProviders client={client} env="test">
      <RouterProvider router={router} />
    </AppProviders>,
  );
  return { ...view, user: userEvent.setup(), router, client };
}
