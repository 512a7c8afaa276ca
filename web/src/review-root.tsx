import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { BaseProviders } from './app/base-providers';
import { makeQueryClient } from './app/query-client';
import { ReviewEntryPage } from './features/review/review-entry-page';

export function mount(element: HTMLElement): void {
  createRoot(element).render(
    <StrictMode>
      <BaseProviders client={makeQueryClient()}>
        <ReviewEntryPage />
      </BaseProviders>
    </StrictMode>,
  );
}
