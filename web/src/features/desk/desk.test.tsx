import type { DeskItem } from '@furrowlight/shared/contract/desk';
import { screen, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { describe, expect, it } from 'vitest';
import { aDesk } from '../../testing/factories';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';

const item = (change: Partial<DeskItem>): DeskItem => ({
  kind: 'run-finished',
  at: '2026-12-01T07:00:00.000Z',
  fieldId: 'field-0001',
  fieldName: 'Long Acre',
  farmName: 'Birkenhof',
  scenarioId: 'scenario-1',
  text: 'The run is done.',
  ...change,
});

describe('desk', () => {
  it('groups what wants attention, most pressing first, each with its next step', async () => {
    const desk = aDesk({
      items: [
        item({}),
        item({ kind: 'field-without-boundary', scenarioId: null, text: 'Only a pin.' }),
        item({ kind: 'run-failed', text: 'Hours are missing.' }),
      ],
    });
    renderApp('/', { handlers: [http.get('*/api/desk', () => HttpResponse.json(desk))] });
    const sections = await screen.findAllByRole('region');
    expect(sections.map((section) => within(section).getByRole('heading').textContent)).toEqual([
      'Wants an answer',
      'Ready to read',
      'Gaps in the records',
    ]);
    const href = (name: string) => screen.getByRole('link', { name }).getAttribute('href');
    expect(href('Read the result: Long Acre')).toBe(
      '/fields/field-0001/scenarios/scenario-1/result',
    );
    expect(href('Open the scenario: Long Acre')).toBe('/fields/field-0001/scenarios/scenario-1');
    expect(href('Draw the boundary: Long Acre')).toBe('/fields/field-0001?edit=boundary');
  });

  it('shows the way when nothing is recorded yet', async () => {
    const desk = aDesk({ counts: { farms: 1, fields: 0, scenarios: 0, openReviews: 0 } });
    renderApp('/', { handlers: [http.get('*/api/desk', () => HttpResponse.json(desk))] });
    const steps = await screen.findByRole('list', { name: 'First steps' });
    expect(within(steps).getAllByRole('listitem')[0]).toHaveTextContent('Done.');
    expect(within(steps).getByRole('link')).toHaveTextContent('Draw its field');
  });

  it('says what failed, with the request id, and tries again', async () => {
    let broken = true;
    const app = renderApp('/', {
      handlers: [
        http.get('*/api/desk', () =>
          broken ? problem(503, 'The database is locked.') : HttpResponse.json(aDesk()),
        ),
      ],
    });
    const alert = await screen.findByRole('alert');
    expect(alert).toHaveTextContent('The database is locked.');
    expect(alert).toHaveTextContent('req-test');
    broken = false;
    await app.user.click(within(alert).getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText('Nothing wants you today')).toBeVisible();
  });
});
