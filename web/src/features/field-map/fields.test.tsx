import { screen, waitFor, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { describe, expect, it, vi } from 'vitest';
import { aConfig, aFarm, aField } from '../../testing/factories';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';

// Leaflet draws on a canvas that jsdom lacks; the map itself is walked in a real browser.
vi.mock('./fields-map', () => ({ FieldsMap: () => <div data-testid="map" /> }));

const fields = [
  aField(),
  aField({ id: 'field-0002', name: 'Mill Meadow', seasonCount: 1, scenarioCount: 2 }),
  aField({
    id: 'field-0003',
    name: 'Ford Field',
    farmId: 'farm-00002',
    farmName: 'Moosgut',
    boundary: null,
    geometry: null,
  }),
];
const handlers = [
  http.get('*/api/config', () => HttpResponse.json(aConfig())),
  http.get('*/api/fields', () => HttpResponse.json({ items: fields })),
  http.get('*/api/farms', () =>
    HttpResponse.json({ items: [aFarm(), aFarm({ id: 'farm-00002', name: 'Moosgut' })] }),
  ),
];

describe('fields', () => {
  it('is a list that the keyboard walks, choosing and opening', async () => {
    const app = renderApp('/fields', {
      handlers: [
        ...handlers,
        http.get('*/api/fields/field-0002', () => problem(404, 'There is no such field.')),
      ],
    });
    const list = await screen.findByRole('listbox', { name: 'Fields' });
    list.focus();
    await app.user.keyboard('{ArrowDown}{ArrowDown}');
    expect(within(list).getByRole('option', { selected: true })).toHaveTextContent('Mill Meadow');
    expect(app.router.state.location.search).toBe('?field=field-0002');
    expect(screen.getByRole('region', { name: 'Chosen: Mill Meadow' })).toHaveTextContent('4.08');
    await app.user.keyboard('{End}');
    expect(screen.getByRole('link', { name: 'Draw the boundary' })).toBeVisible();
    await app.user.keyboard('{ArrowUp}{Enter}');
    await waitFor(() => expect(app.router.state.location.pathname).toBe('/fields/field-0002'));
  });

  it('types a boundary by side lengths and bearings, and saves it closed', async () => {
    let sent: unknown = null;
    const app = renderApp('/fields?add=type', {
      handlers: [
        ...handlers,
        http.post('*/api/fields', async ({ request }) => {
          sent = await request.json();
          return problem(422, 'Not accepted.', [
            { path: 'boundary', message: 'The field overlaps Long Acre.' },
          ]);
        }),
      ],
    });
    const start = () => screen.getByRole('button', { name: 'Start here' });
    await waitFor(() => expect(start()).toBeEnabled());
    await app.user.click(start());
    const side = async (length: string, bearing: string) => {
      await app.user.type(screen.getByLabelText(/Next side/), length);
      await app.user.clear(screen.getByLabelText(/^Bearing in/));
      await app.user.type(screen.getByLabelText(/^Bearing in/), bearing);
      await app.user.click(screen.getByRole('button', { name: 'Add' }));
    };
    await side('200', '90');
    await side('150,5', '0');
    await side('200', '270');
    expect(screen.getByText('3.010 ha')).toBeVisible();
    await app.user.type(screen.getByLabelText('Field name'), 'New Piece');
    await app.user.click(screen.getAllByLabelText('Farm')[0]);
    await app.user.click(await screen.findByRole('option', { name: 'Moosgut' }));
    await app.user.click(screen.getByRole('button', { name: 'Save the field' }));
    expect(screen.getByText(/The boundary is not finished/)).toBeVisible();
    await app.user.click(screen.getByRole('button', { name: 'Finish' }));
    await app.user.click(screen.getByRole('button', { name: 'Save the field' }));
    expect(await screen.findByText('The field overlaps Long Acre.')).toBeVisible();
    expect(sent).toMatchObject({ name: 'New Piece', farmId: 'farm-00002' });
    const { boundary } = sent as { boundary: { coordinates: [number, number][][] } };
    expect(boundary.coordinates[0]).toHaveLength(5);
    expect(boundary.coordinates[0][4]).toEqual(boundary.coordinates[0][0]);
    expect(screen.getByLabelText('Field name')).toHaveValue('New Piece');
  });

  it('imports with a count, reasons, and an offer to swap coordinates', async () => {
    const saved: string[] = [];
    const app = renderApp('/fields?add=import&farm=farm-00001', {
      handlers: [
        ...handlers,
        http.post('*/api/fields', async ({ request }) => {
          const body = (await request.json()) as {
            name: string;
            boundary: { coordinates: number[][][] };
          };
          saved.push(`${body.name} ${body.boundary.coordinates[0][0].join(' ')}`);
          return HttpResponse.json(aField({ id: 'field-0009', name: body.name }), { status: 201 });
        }),
      ],
    });
    const text = JSON.stringify({
      type: 'FeatureCollection',
      features: [
        {
          type: 'Feature',
          properties: { name: 'North' },
          geometry: {
            type: 'Polygon',
            coordinates: [
              [
                [52.5, 13.4],
                [52.5, 13.41],
                [52.51, 13.41],
                [52.5, 13.4],
              ],
            ],
          },
        },
        { type: 'Feature', properties: {}, geometry: { type: 'LineString', coordinates: [] } },
      ],
    });
    await app.user.click(await screen.findByLabelText('GeoJSON text'));
    await app.user.paste(text);
    expect(screen.getByText('1 read, 1 skipped')).toBeVisible();
    expect(screen.getByText('feature 2: a LineString encloses no area')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Add this field' })).toBeDisabled();
    await app.user.click(screen.getByRole('button', { name: 'Swap them' }));
    await app.user.click(screen.getByRole('button', { name: 'Add this field' }));
    await waitFor(() => expect(saved).toEqual(['North 13.4 52.5']));
    expect(await screen.findByText('1 field is added.')).toBeVisible();
  });
});
