import '@mantine/notifications/styles.layer.css';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { createBrowserRouter, RouterProvider } from 'react-router-dom';
import { AppProviders } from './app/providers';
import { makeQueryClient } from './app/query-client';
import { makeRoutes } from './app/router';

export function mount(element: HTMLElement): void {
  const client = makeQueryClient();
  const router = createBrowserRouter(makeRoutes());
  createRoot(element).render(
    <StrictMode>
      <AppProviders client={client}>
        <RouterProvider router={router} />
      </AppProviders>
    </StrictMode>,
  );
}
