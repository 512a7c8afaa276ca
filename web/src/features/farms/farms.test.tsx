import { screen, waitFor, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { describe, expect, it } from 'vitest';
import { aFarm } from '../../testing/factories';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';

const members = http.get('*/api/members', () => HttpResponse.json({ items: [] }));
const list = (...farms: ReturnType<typeof aFarm>[]) =>
  http.get('*/api/farms', () => HttpResponse.json({ items: farms }));

describe('farms', () => {
  it('sorts by its heads and keeps the filter in the address', async () => {
    const app = renderApp('/farms', {
      handlers: [
        list(
          aFarm({ areaM2: 50_000 }),
          aFarm({ id: 'farm-00002', name: 'Moosgut', holder: 'Peter Hall', areaM2: 20_000 }),
        ),
      ],
    });
    const table = await screen.findByRole('table');
    const names = () =>
      within(table)
        .getAllByRole('link')
        .map((link) => link.textContent);
    expect(names()).toEqual(['Birkenhof', 'Moosgut']);
    await app.user.click(within(table).getByRole('button', { name: 'Area' }));
    expect(names()).toEqual(['Moosgut', 'Birkenhof']);
    expect(within(table).getByRole('columnheader', { name: 'Area' })).toHaveAttribute(
      'aria-sort',
      'ascending',
    );
    await app.user.type(screen.getByLabelText(/Find a farm/), 'hall');
    expect(names()).toEqual(['Moosgut']);
    expect(app.router.state.location.search).toBe('?q=hall');
  });

  it('checks a new farm at its fields, then saves it once', async () => {
    const keys: (string | null)[] = [];
    const app = renderApp('/farms?add=1', {
      handlers: [
        list(),
        members,
        http.post('*/api/farms', async ({ request }) => {
          keys.push(request.headers.get('idempotency-key'));
          expect(await request.json()).toMatchObject({ name: 'Talhof', holder: 'Ute Brand' });
          return HttpResponse.json(aFarm({ name: 'Talhof' }), { status: 201 });
        }),
      ],
    });
    const dialog = await screen.findByRole('dialog');
    await app.user.click(within(dialog).getByRole('button', { name: 'Add the farm' }));
    const summary = within(dialog).getByRole('alert');
    expect(summary).toHaveFocus();
    await app.user.click(within(summary).getByRole('link', { name: 'Holder is missing.' }));
    expect(within(dialog).getByLabelText('Holder')).toHaveFocus();
    await app.user.type(within(dialog).getByLabelText('Farm name'), 'Talhof');
    await app.user.type(within(dialog).getByLabelText('Holder'), 'Ute Brand');
    await app.user.click(within(dialog).getByRole('button', { name: 'Add the farm' }));
    expect(await screen.findByText('Talhof is added.')).toBeVisible();
    expect(keys).toHaveLength(1);
    expect(keys[0]).toMatch(/^[0-9a-f-]{36}$/);
  });

  it('overwrites nobody: a stale save asks first, and then names the newer version', async () => {
    const versions: (string | null)[] = [];
    const app = renderApp('/farms?edit=farm-00001', {
      handlers: [
        list(aFarm()),
        members,
        http.get('*/api/farms/farm-00001', () => HttpResponse.json(aFarm({ version: 5 }))),
        http.patch('*/api/farms/farm-00001', ({ request }) => {
          versions.push(request.headers.get('if-match'));
          return versions.length === 1
            ? problem(412, 'Someone else changed it.')
            : HttpResponse.json(aFarm({ version: 6 }));
        }),
      ],
    });
    const dialog = await screen.findByRole('dialog');
    await app.user.type(within(dialog).getByLabelText('Place'), ' am See');
    await app.user.click(within(dialog).getByRole('button', { name: 'Save' }));
    await app.user.click(await within(dialog).findByRole('button', { name: 'Save mine over it' }));
    await waitFor(() => expect(versions).toEqual(['"1"', '"5"']));
    expect(await screen.findByText('Birkenhof is saved.')).toBeVisible();
  });
});
