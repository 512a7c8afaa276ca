import { Button } from '@mantine/core';
import { Link } from 'react-router-dom';
import { EmptyState } from '../../components/empty-state';

export function NotFound() {
  return (
    <EmptyState
      title="Nothing stands at this address"
      action={
        <Button component={Link} to="/">
          Back to the desk
        </Button>
      }
    >
      The page may have been removed, or the link was cut short on its way. Fields and scenarios are
      found again with Ctrl + K.
    </EmptyState>
  );
}
