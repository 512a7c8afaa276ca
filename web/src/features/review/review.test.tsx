import { render, screen, waitFor } from '@testing-library/react';
import { QueryClient } from '@tanstack/react-query';
import { http } from 'msw';
import { afterEach, describe, expect, it } from 'vitest';
import { BaseProviders } from '../../app/base-providers';
import { problem } from '../../testing/problem';
import { server } from '../../testing/server';
import { ReviewEntryPage } from './review-entry-page';

const token = 'a'.repeat(43);

function open(hash: string) {
  window.history.replaceState(null, '', `/r${hash}`);
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  return render(
    <BaseProviders client={client} env="test">
      <ReviewEntryPage />
    </BaseProviders>,
  );
}

afterEach(() => window.history.replaceState(null, '', '/'));

describe('review link', () => {
  it('takes the token out of the address and says kindly that a link is closed', async () => {
    let sent: unknown = null;
    server.use(
      http.post('*/api/review-session', async ({ request }) => {
        sent = await request.json();
        return problem(410, 'This link has expired. Ask Ida Wendt for a new one.');
      }),
    );
    open(`#${token}`);
    expect(await screen.findByRole('heading', { name: 'This link is closed' })).toBeVisible();
    expect(screen.getByText('This link has expired. Ask Ida Wendt for a new one.')).toBeVisible();
    expect(sent).toEqual({ token });
    expect(window.location.hash).toBe('');
  });

  it('asks for the whole link when there is neither token nor cookie', async () => {
    server.use(http.get('*/api/review', () => problem(401, 'Sign in first.')));
    open('');
    await waitFor(() =>
      expect(screen.getByRole('heading', { name: 'Please open the link again' })).toBeVisible(),
    );
  });
});
