import { ModalsProvider } from '@mantine/modals';
import { Notifications } from '@mantine/notifications';
import { useEffect } from 'react';
import { onSignedOut } from '../lib/api';
import { sessionQuery } from '../queries/session';
import { BaseProviders, type ProviderProps } from './base-providers';

/** Everything the signed-in application stands on. */
export function AppProviders({ client, children, env }: ProviderProps) {
  useEffect(() => onSignedOut(() => client.setQueryData(sessionQuery.queryKey, null)), [client]);
  return (
    <BaseProviders client={client} env={env}>
      <ModalsProvider labels={{ confirm: 'Yes', cancel: 'Keep' }}>{children}</ModalsProvider>
      <Notifications position="bottom-right" limit={4} autoClose={6000} />
    </BaseProviders>
  );
}
