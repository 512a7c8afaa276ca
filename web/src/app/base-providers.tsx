import { MantineProvider } from '@mantine/core';
import { QueryClientProvider, type QueryClient } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { schemeManager, theme, variables } from './theme/theme';

export interface ProviderProps {
  client: QueryClient;
  children: ReactNode;
  /** `test` opens dialogs without transitions. */
  env?: 'default' | 'test';
}

/** What every page stands on, the farmer's light review page included. */
export function BaseProviders({ client, children, env }: ProviderProps) {
  return (
    <QueryClientProvider client={client}>
      <MantineProvider
        env={env}
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
