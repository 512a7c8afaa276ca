import { screen, waitFor } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { describe, expect, it } from 'vitest';
import { aConfig, aDesk, aSession } from '../../testing/factories';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';

const config = http.get('*/api/config', () => HttpResponse.json(aConfig()));
const desk = http.get('*/api/desk', () => HttpResponse.json(aDesk()));

describe('sign-in', () => {
  it('leads a stranger from a page to the door and, once in, back to that page', async () => {
    const app = renderApp('/farms?q=birk', {
      session: null,
      handlers: [
        config,
        http.get('*/api/farms', () => HttpResponse.json({ items: [] })),
        http.get('*/api/members', () => HttpResponse.json({ items: [] })),
        http.post('*/api/session', async ({ request }) => {
          expect(await request.json()).toEqual({
            email: 'ida@example.test',
            password: 'light-on-the-furrow',
          });
          return HttpResponse.json(aSession(), { status: 201 });
        }),
      ],
    });
    await app.user.type(await screen.findByLabelText('E-mail'), ' ida@example.test ');
    await app.user.type(screen.getByLabelText('Password'), 'light-on-the-furrow');
    await app.user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByRole('heading', { name: 'Farms' })).toBeVisible();
    expect(app.router.state.location.search).toBe('?q=birk');
  });

  it('says what is wrong and keeps what was typed', async () => {
    const app = renderApp('/sign-in', {
      session: null,
      handlers: [
        config,
        http.post('*/api/session', () => problem(401, 'E-mail or password is not right.')),
      ],
    });
    const email = await screen.findByLabelText('E-mail');
    await app.user.type(email, 'ida@example.test');
    await app.user.type(screen.getByLabelText('Password'), 'wrong');
    await app.user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('E-mail or password is not right.');
    expect(email).toHaveValue('ida@example.test');
  });

  it('checks the address before it asks the server', async () => {
    const app = renderApp('/sign-in', { session: null, handlers: [config] });
    await app.user.type(await screen.findByLabelText('E-mail'), 'ida');
    await app.user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(screen.getByText('This is not an e-mail address.')).toBeVisible();
    expect(screen.getByText('Password is missing.')).toBeVisible();
  });

  it('never follows a sign-in to another site', async () => {
    const app = renderApp('/sign-in?next=//evil.example/', { handlers: [config, desk] });
    await waitFor(() => expect(app.router.state.location.pathname).toBe('/'));
    expect(await screen.findByRole('heading', { name: 'Desk' })).toBeVisible();
  });

  it('offers the demo sign-ins only where the server names them', async () => {
    const accounts = [{ role: 'advisor', email: 'a@demo.example', password: 'p' }];
    renderApp('/sign-in', {
      session: null,
      handlers: [
        http.get('*/api/config', () => HttpResponse.json(aConfig({ demoAccounts: accounts }))),
      ],
    });
    expect(await screen.findByRole('button', { name: /a@demo.example/ })).toBeVisible();
  });
});
