import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { screen, waitFor, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { describe, expect, it, vi } from 'vitest';
import { aCrop, aField, aSeason } from '../../../testing/factories';
import { aScenario } from '../../../testing/scenario-factory';
import { renderApp } from '../../../testing/render-app';
import { nextStep } from './next-step';

vi.mock('./overview-map', () => ({ OverviewMap: () => <div data-testid="map" /> }));
vi.mock('../../review/review-links', () => ({ ReviewLinks: () => null }));

const page = (seasons: ReturnType<typeof aSeason>[], scenarios: Scenario[]) => [
  http.get('*/api/fields', () => HttpResponse.json({ items: [aField()] })),
  http.get('*/api/fields/field-0001', () => HttpResponse.json(aField())),
  http.get('*/api/fields/field-0001/seasons', () => HttpResponse.json({ items: seasons })),
  http.get('*/api/fields/field-0001/scenarios', () => HttpResponse.json({ items: scenarios })),
  http.get('*/api/crops', () => HttpResponse.json({ items: [aCrop()] })),
];

describe('field page', () => {
  it('names the next step and remembers the field as opened lately', async () => {
    renderApp('/fields/field-0001', { handlers: page([], []) });
    expect(await screen.findByRole('link', { name: 'Add a season' })).toHaveAttribute(
      'href',
      '/fields/field-0001?season=new',
    );
    const lately = screen.getByRole('navigation', { name: 'Lately' });
    expect(within(lately).getByRole('link')).toHaveTextContent('Long Acre');
  });

  it('proposes dates and canopy height with the crop, and refuses harvest before sowing', async () => {
    let sent: unknown = null;
    const app = renderApp('/fields/field-0001?season=new', {
      handlers: [
        ...page([], []),
        http.post('*/api/fields/field-0001/seasons', async ({ request }) => {
          sent = await request.json();
          return HttpResponse.json(aSeason(), { status: 201 });
        }),
      ],
    });
    const dialog = await screen.findByRole('dialog');
    await app.user.click(within(dialog).getAllByLabelText('Crop')[0]);
    await app.user.click(await screen.findByRole('option', { name: 'Winter wheat' }));
    expect(within(dialog).getByLabelText(/Canopy height/)).toHaveValue('0.9');
    await app.user.clear(within(dialog).getByLabelText(/Canopy height/));
    await app.user.type(within(dialog).getByLabelText(/Canopy height/), '9');
    await app.user.click(within(dialog).getByRole('button', { name: 'Add the season' }));
    expect(
      within(dialog).getAllByText('Canopy height must be between 0 and 8 m.')[0],
    ).toBeVisible();
    await app.user.clear(within(dialog).getByLabelText(/Canopy height/));
    await app.user.type(within(dialog).getByLabelText(/Canopy height/), '0,85');
    await app.user.click(within(dialog).getByRole('button', { name: 'Add the season' }));
    await waitFor(() => expect(sent).not.toBeNull());
    expect(sent).toMatchObject({ cropId: 'winter-wheat', canopyHeightM: 0.85 });
    const { sowing, harvest } = sent as { sowing: string; harvest: string };
    expect(sowing).toMatch(/-10-01$/);
    expect(Number(harvest.slice(0, 4))).toBe(Number(sowing.slice(0, 4)) + 1);
  });

  it('takes at most four scenarios with a result into the comparison', async () => {
    const scenarios = [1, 2, 3, 4, 5].map((n) =>
      aScenario({ id: `scenario-${n}`, name: `Layout ${n}` }, 'done'),
    );
    scenarios.push(aScenario({ id: 'scenario-6', name: 'Sketch' }, null));
    const app = renderApp('/fields/field-0001', { handlers: page([aSeason()], scenarios) });
    const box = async (name: string) => screen.findByRole('checkbox', { name: `Compare ${name}` });
    expect(await box('Sketch')).toBeDisabled();
    for (const n of [1, 2, 3, 4]) await app.user.click(await box(`Layout ${n}`));
    expect(await box('Layout 5')).toBeDisabled();
    expect(screen.getByRole('link', { name: 'Compare' })).toHaveAttribute(
      'href',
      '/fields/field-0001/compare?ids=scenario-1,scenario-2,scenario-3,scenario-4',
    );
  });

  it('archives without asking and takes it back', async () => {
    const patches: unknown[] = [];
    const app = renderApp('/fields/field-0001', {
      handlers: [
        ...page([aSeason()], [aScenario({}, 'done')]),
        http.patch('*/api/scenarios/scenario-1', async ({ request }) => {
          patches.push([request.headers.get('if-match'), await request.json()]);
          return HttpResponse.json(aScenario({ version: 2, archived: true }, 'done'));
        }),
      ],
    });
    await app.user.click(await screen.findByRole('button', { name: 'More for South rows' }));
    await app.user.click(await screen.findByRole('menuitem', { name: 'Archive' }));
    await app.user.click(await screen.findByRole('button', { name: 'Undo' }));
    await waitFor(() =>
      expect(patches).toEqual([
        ['"1"', { archived: true }],
        ['"2"', { archived: false }],
      ]),
    );
  });
});

describe('nextStep', () => {
  it('goes from boundary over crop, rows and run to the comparison', () => {
    const step = (field: ReturnType<typeof aField>, seasons: number, scenarios: Scenario[]) =>
      nextStep(field, seasons, scenarios).label;
    expect(step(aField({ boundary: null }), 0, [])).toBe('Draw the boundary');
    expect(step(aField(), 0, [])).toBe('Add a season');
    expect(step(aField(), 1, [])).toBe('Lay rows');
    expect(step(aField(), 1, [aScenario({}, null)])).toBe('Open South rows');
    expect(step(aField(), 1, [aScenario({}, 'done')])).toBe('Read the result');
    expect(
      step(aField(), 1, [aScenario({}, 'done'), aScenario({ id: 'scenario-2' }, 'done')]),
    ).toBe('Compare them');
    expect(step(aField(), 1, [aScenario({ archived: true }, 'done')])).toBe('Lay rows');
  });
});
