import { screen, waitFor, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { describe, expect, it } from 'vitest';
import { aFarm, aSession } from '../../testing/factories';
import { renderApp } from '../../testing/render-app';

const members = http.get('*/api/members', () =>
  HttpResponse.json({
    items: [
      {
        id: 'member-0001',
        name: 'Ida Wendt',
        email: 'ida@example.test',
        role: 'advisor',
        active: true,
      },
    ],
  }),
);
const audit = (brokenAt: number | null) =>
  http.get('*/api/audit', ({ request }) => {
    const older = new URL(request.url).searchParams.get('before');
    const seq = older ? 1 : 2;
    return HttpResponse.json({
      items: [
        {
          seq,
          at: '2026-11-30T08:00:00.000Z',
          actorName: 'Ida Wendt',
          action: `act ${seq}`,
          subjectKind: 'field',
          subjectId: 'field-0001',
          subjectName: 'Long Acre',
          hash: 'abcdef0123456789',
        },
      ],
      next: older ? null : 2,
      brokenAt,
    });
  });

describe('cooperative', () => {
  it('brings a field back from the bin', async () => {
    let inBin = true;
    const app = renderApp('/cooperative', {
      handlers: [
        members,
        http.get('*/api/bin', () =>
          HttpResponse.json({
            items: inBin
              ? [
                  {
                    kind: 'field',
                    id: 'field-0009',
                    name: 'Lost Piece',
                    farmName: 'Birkenhof',
                    deletedAt: '2026-11-30T08:00:00.000Z',
                    keptUntil: '2026-12-30T08:00:00.000Z',
                  },
                ]
              : [],
          }),
        ),
        http.post('*/api/fields/field-0009/restore', () => {
          inBin = false;
          return HttpResponse.json({});
        }),
      ],
    });
    await app.user.click(await screen.findByRole('button', { name: 'Bring back' }));
    expect(await screen.findByText('The bin is empty.')).toBeVisible();
    expect(screen.getByText('Lost Piece is back.')).toBeVisible();
    expect(screen.queryByRole('heading', { name: 'What happened' })).toBeNull();
  });

  it('shows the admin what happened, page by page, and whether the chain is whole', async () => {
    const app = renderApp('/cooperative', {
      session: aSession({ role: 'admin' }),
      handlers: [
        members,
        audit(null),
        http.get('*/api/bin', () => HttpResponse.json({ items: [] })),
      ],
    });
    expect(await screen.findByText('The chain of hashes is whole.')).toBeVisible();
    await app.user.click(screen.getByRole('button', { name: 'Show older entries' }));
    const log = screen.getByRole('table', { name: /Entries/ });
    await waitFor(() => expect(within(log).getAllByRole('row')).toHaveLength(3));
    expect(within(log).getByText('act 1')).toBeVisible();
  });

  it('says where the chain breaks', async () => {
    renderApp('/cooperative', {
      session: aSession({ role: 'admin' }),
      handlers: [members, audit(1), http.get('*/api/bin', () => HttpResponse.json({ items: [] }))],
    });
    expect(await screen.findByText(/breaks at entry 1/)).toBeVisible();
  });

  it('offers a farmer nothing that a farmer may not do', async () => {
    renderApp('/farms?edit=farm-00001', {
      session: aSession({ role: 'farmer' }),
      handlers: [http.get('*/api/farms', () => HttpResponse.json({ items: [aFarm()] }))],
    });
    expect(await screen.findByRole('link', { name: 'Birkenhof' })).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Add a farm' })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Change Birkenhof' })).toBeNull();
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(screen.queryByRole('link', { name: 'Cooperative' })).toBeNull();
  });
});
