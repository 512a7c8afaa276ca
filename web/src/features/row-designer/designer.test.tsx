import { fireEvent, screen, waitFor } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { describe, expect, it, vi } from 'vitest';
import { aField, aSeason } from '../../testing/factories';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';
import { aScenario } from '../../testing/scenario-factory';

// Leaflet draws on a canvas that jsdom lacks; the map itself is walked in a real browser.
vi.mock('./rows-map', () => ({ RowsMap: () => <div data-testid="map" /> }));

const handlers = [
  http.get('*/api/fields/field-0001', () => HttpResponse.json(aField())),
  http.get('*/api/fields/field-0001/seasons', () => HttpResponse.json({ items: [aSeason()] })),
  http.get('*/api/weather', () => HttpResponse.json({ items: [] })),
];
const at = '/fields/field-0001/scenarios';

describe('row designer', () => {
  it('lays rows as numbers change and keeps the last sound rows when they collide', async () => {
    renderApp(`${at}/new`, { handlers });
    const pitch = await screen.findByLabelText(/^Pitch in m/);
    expect(screen.getByLabelText(/^Cross-section of the rows to scale/)).toBeVisible();
    fireEvent.change(pitch, { target: { value: '13,6' } });
    expect(screen.getByText('0.25')).toBeVisible();
    fireEvent.change(pitch, { target: { value: '2' } });
    expect(await screen.findByText(/Rows would collide/)).toBeVisible();
    expect(screen.getByText('0.25')).toBeVisible();
  });

  it('asks for a name before anything is sent, then saves and goes to the scenario', async () => {
    let sent: unknown = null;
    const made = aScenario({ id: 'scenario-1', name: 'Raised, 11 m' }, null);
    const app = renderApp(`${at}/new`, {
      handlers: [
        ...handlers,
        http.post('*/api/scenarios', async ({ request }) => {
          sent = await request.json();
          return HttpResponse.json(made);
        }),
        http.get('*/api/scenarios/scenario-1', () => HttpResponse.json(made)),
      ],
    });
    fireEvent.click(await screen.findByText('Save'));
    expect(await screen.findByRole('alert')).toHaveTextContent('Scenario name is missing.');
    expect(sent).toBeNull();
    fireEvent.change(screen.getByLabelText('Scenario name'), {
      target: { value: 'Raised, 11 m' },
    });
    fireEvent.click(screen.getByText('Save'));
    await waitFor(() => expect(app.router.state.location.pathname).toBe(`${at}/scenario-1`));
    expect(sent).toMatchObject({
      fieldId: 'field-0001',
      name: 'Raised, 11 m',
      layout: { pitchM: 11 },
    });
  });

  it('shows a refusal of the run and keeps everything typed', async () => {
    const scenario = aScenario({}, null);
    renderApp(`${at}/scenario-1`, {
      handlers: [
        ...handlers,
        http.get('*/api/scenarios/scenario-1', () => HttpResponse.json(scenario)),
        http.post('*/api/scenarios/scenario-1/runs', () =>
          problem(422, 'Choose a weather year first.'),
        ),
      ],
    });
    fireEvent.click(await screen.findByText('Work out the light budget'));
    expect(await screen.findByText('Choose a weather year first.')).toBeVisible();
    expect(screen.getByLabelText('Scenario name')).toHaveValue('South rows');
  });

  it('locks a scenario that has been run and offers its result and a copy', async () => {
    const scenario = aScenario({}, 'done');
    renderApp(`${at}/scenario-1`, {
      handlers: [
        ...handlers,
        http.get('*/api/scenarios/scenario-1', () => HttpResponse.json(scenario)),
        http.get('*/api/runs/run-000001', () => HttpResponse.json(scenario.latestRun)),
      ],
    });
    expect(await screen.findByRole('link', { name: 'Read the result' })).toHaveAttribute(
      'href',
      `${at}/scenario-1/result`,
    );
    expect(screen.getByRole('button', { name: 'Copy to change' })).toBeEnabled();
    expect(screen.getByLabelText(/^Pitch in m/)).toBeDisabled();
    expect(screen.queryByText('Work out the light budget')).toBeNull();
  });
});
