import type { Session } from '@furrowlight/shared/contract/session';
import {
  Menu,
  SegmentedControl,
  Switch,
  Text,
  UnstyledButton,
  VisuallyHidden,
  useMantineColorScheme,
} from '@mantine/core';
import { IconDoorExit, IconSelector } from '@tabler/icons-react';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { Link, useNavigate } from 'react-router-dom';
import { mayDo } from '../../lib/use-may';
import { signOut } from '../../queries/session';
import classes from './account-menu.module.css';
import { forgetRecent } from '../../lib/recent';
import { NAV_MORE } from './nav-items';
import { useShortcutsAllowed } from './use-jump-keys';

function initials(name: string): string {
  const words = name.trim().split(/\s+/);
  return `${words[0]?.[0] ?? ''}${words.length > 1 ? (words.at(-1)?.[0] ?? '') : ''}`.toUpperCase();
}

/** Who is signed in, how the page looks, and the way out. */
export function AccountMenu({ session, compact }: { session: Session; compact?: boolean }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const leave = useMutation(signOut(client));
  const { colorScheme, setColorScheme } = useMantineColorScheme();
  const [shortcuts, setShortcuts] = useShortcutsAllowed();

  const out = async () => {
    forgetRecent(session.memberId);
    await leave.mutateAsync();
    await navigate('/sign-in');
  };

  return (
    <Menu position={compact ? 'bottom-end' : 'top-start'} width={264} shadow="md">
      <Menu.Target>
        <UnstyledButton className={compact ? classes.compact : classes.target}>
          <VisuallyHidden>Account of {compact ? session.name : ''}</VisuallyHidden>
          <span className={classes.initials} aria-hidden>
            {initials(session.name)}
          </span>
          {!compact && (
            <>
              <span className={classes.words}>
                <span className={classes.name}>{session.name}</span>
                <span className={classes.coop}>{session.cooperative.name}</span>
              </span>
              <IconSelector size={16} stroke={1.6} aria-hidden />
            </>
          )}
        </UnstyledButton>
      </Menu.Target>
      <Menu.Dropdown>
        <div className={classes.card}>
          <Text fw={600} size="sm">
            {session.name}
          </Text>
          <Text size="xs" c="dimmed">
            {session.role} · {session.cooperative.name}
          </Text>
          <Text size="xs" mt="md" mb={4} id="scheme-label">
            Colours
          </Text>
          <SegmentedControl
            fullWidth
            size="xs"
            aria-labelledby="scheme-label"
            value={colorScheme}
            onChange={(value) => setColorScheme(value as typeof colorScheme)}
            data={[
              { value: 'light', label: 'Day' },
              { value: 'dark', label: 'Night' },
              { value: 'auto', label: 'As device' },
            ]}
          />
          <Switch
            mt="md"
            size="sm"
            label="Single-key shortcuts"
            description="g then d, f, a, w or h jumps to a page"
            checked={shortcuts}
            onChange={(event) => setShortcuts(event.currentTarget.checked)}
          />
        </div>
        <Menu.Divider />
        {compact &&
          NAV_MORE.filter(({ needs }) => !needs || mayDo(session, needs)).map((item) => (
            <Menu.Item
              key={item.to}
              component={Link}
              to={item.to}
              leftSection={<item.icon size={16} stroke={1.6} />}
            >
              {item.label}
            </Menu.Item>
          ))}
        <Menu.Item
          leftSection={<IconDoorExit size={16} stroke={1.6} />}
          onClick={() => void out()}
          disabled={leave.isPending}
        >
          Sign out
        </Menu.Item>
      </Menu.Dropdown>
    </Menu>
  );
}
