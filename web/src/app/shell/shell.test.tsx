import { screen, waitFor } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { describe, expect, it, vi } from 'vitest';
import { aConfig, aDesk, aFarm, aField } from '../../testing/factories';
import { renderApp } from '../../testing/render-app';
import { aScenario } from '../../testing/scenario-factory';
import { matches } from './palette/entries';

vi.mock('../../features/field-map/fields-map', () => ({ FieldsMap: () => null }));

const handlers = [
  http.get('*/api/config', () => HttpResponse.json(aConfig())),
  http.get('*/api/desk', () => HttpResponse.json(aDesk())),
  http.get('*/api/farms', () => HttpResponse.json({ items: [aFarm()] })),
  http.get('*/api/fields', () => HttpResponse.json({ items: [aField({ scenarioCount: 1 })] })),
  http.get('*/api/fields/field-0001/scenarios', () =>
    HttpResponse.json({ items: [aScenario({ name: 'Acre fence' }, 'running')] }),
  ),
];

describe('shell', () => {
  it('finds a scenario by its name with Ctrl+K and goes there', async () => {
    // The page that opens is not this test's concern; it may ask for its data before the test ends.
    const elsewhere = [
      '*/api/fields/field-0001',
      '*/api/fields/field-0001/seasons',
      '*/api/weather',
      '*/api/scenarios/scenario-1',
    ].map((path) => http.get(path, () => new HttpResponse(null, { status: 404 })));
    const app = renderApp('/', { handlers: [...handlers, ...elsewhere] });
    await screen.findByRole('heading', { name: 'Desk' });
    await app.user.keyboard('{Control>}k{/Control}');
    await app.user.type(await screen.findByRole('combobox', { name: /Find a field/ }), 'acre fe');
    expect(await screen.findByRole('option', { name: /Acre fence/ })).toBeVisible();
    expect(screen.queryByRole('option', { name: /Birkenhof$/ })).toBeNull();
    await app.user.keyboard('{Enter}');
    await waitFor(() =>
      expect(app.router.state.location.pathname).toBe('/fields/field-0001/scenarios/scenario-1'),
    );
  });

  it('jumps by single keys, unless they are switched off', async () => {
    const app = renderApp('/', { handlers });
    await screen.findByRole('heading', { name: 'Desk' });
    await app.user.keyboard('gh');
    expect(await screen.findByRole('heading', { name: 'Help' })).toBeVisible();
    expect(document.activeElement).toHaveAttribute('id', 'main');
    await app.user.click(screen.getAllByRole('button', { name: /Account of/ })[0]);
    await app.user.click(await screen.findByRole('switch', { name: /Single-key/ }));
    await app.user.keyboard('{Escape}gd');
    expect(app.router.state.location.pathname).toBe('/help');
  });

  it('forgets what was opened lately when someone signs out', async () => {
    localStorage.setItem(
      'furrowlight-recent:member-0001',
      JSON.stringify([{ to: '/fields/x', label: 'Secret', under: 'Farm' }]),
    );
    const app = renderApp('/', {
      handlers: [
        ...handlers,
        http.delete('*/api/session', () => new HttpResponse(null, { status: 204 })),
      ],
    });
    expect(await screen.findByText('Secret')).toBeVisible();
    await app.user.click(screen.getAllByRole('button', { name: /Account of/ })[0]);
    await app.user.click(await screen.findByRole('menuitem', { name: 'Sign out' }));
    expect(await screen.findByRole('heading', { name: 'Sign in' })).toBeVisible();
    expect(localStorage.getItem('furrowlight-recent:member-0001')).toBeNull();
  });

  it('matches words by their beginnings, accents and case aside', () => {
    expect(matches('talmu', 'Talmühle, Judith Wegner')).toBe(true);
    expect(matches('acre long', 'Long Acre')).toBe(true);
    expect(matches('cre', 'Long Acre')).toBe(false);
  });
});
