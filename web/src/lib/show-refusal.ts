import { notifications } from '@mantine/notifications';
import { ApiProblem } from './api';

/** Says that an act was refused, and why, where no form stands to say it. */
export function showRefusal(title: string, error: unknown): void {
  notifications.show({
    color: 'danger',
    title,
    message: error instanceof ApiProblem ? error.detail : 'Something went wrong. Try again.',
  });
}
