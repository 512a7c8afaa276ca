import { MantineProvider } from '@mantine/core';
import { QueryClientProvider, type QueryClient } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { schemeManager, theme, variables } from './theme/theme';

/** What every page stands on, the farmer's light review page included. */
export function BaseProviders({ client, children }: { client: QueryClient; children: ReactNode }) {
  return (
    <QueryClientProvider client={client}>
      <MantineProvider
        theme={theme}
        cssVariablesResolver={variables}
        colorSchemeManager={schemeManager}
        defaultColorScheme="auto"
      >
        {children}
      </MantineProvider>
    </QueryClientProvider>
  );
}
