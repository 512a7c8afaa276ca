import type { Session } from '@furrowlight/shared/contract/session';
import { UnstyledButton } from '@mantine/core';
import { useDisclosure, useHotkeys } from '@mantine/hooks';
import { IconSearch } from '@tabler/icons-react';
import { useEffect, useRef, type ReactNode } from 'react';
import { Link, NavLink, useLocation } from 'react-router-dom';
import { Mark, Wordmark } from '../../components/wordmark';
import { mayDo } from '../../lib/use-may';
import { AccountMenu } from './account-menu';
import { NAV, NAV_MORE, type NavItem } from './nav-items';
import { CommandPalette } from './palette/command-palette';
import { RecentPlaces } from './recent-places';
import classes from './shell.module.css';
import { useJumpKeys } from './use-jump-keys';

function NavRow({ item }: { item: NavItem }) {
  return (
    <NavLink to={item.to} end={item.to === '/'} className={classes.nav}>
      <item.icon size={19} stroke={1.6} aria-hidden />
      <span>{item.label}</span>
    </NavLink>
  );
}

/** The frame round every page: where one can go, where one is, and the way to everything. */
export function Shell({ session, children }: { session: Session; children: ReactNode }) {
  const [searching, search] = useDisclosure(false);
  const main = useRef<HTMLElement>(null);
  const { pathname } = useLocation();
  const first = useRef(true);
  useHotkeys([['mod+K', search.toggle]], []);
  useJumpKeys();

  // A new page starts at its top and takes the focus with it, as a fresh document would.
  useEffect(() => {
    if (first.current) {
      first.current = false;
      return;
    }
    window.scrollTo(0, 0);
    main.current?.focus({ preventScroll: true });
  }, [pathname]);

  return (
    <div className={classes.shell}>
      <a href="#main" className={classes.skip}>
        Skip to the page
      </a>
      <aside className={classes.rail}>
        <Link to="/" className={classes.home} aria-label="Furrowlight, to the desk">
          <Wordmark />
        </Link>
        <UnstyledButton className={classes.search} onClick={search.open}>
          <IconSearch size={16} stroke={1.7} aria-hidden />
          <span>Find or do</span>
          <kbd>Ctrl K</kbd>
        </UnstyledButton>
        <nav aria-label="Main">
          {NAV.map((item) => (
            <NavRow key={item.to} item={item} />
          ))}
        </nav>
        <RecentPlaces memberId={session.memberId} />
        <div className={classes.foot}>
          <nav aria-label="About">
            {NAV_MORE.filter(({ needs }) => !needs || mayDo(session, needs)).map((item) => (
              <NavRow key={item.to} item={item} />
            ))}
          </nav>
          <AccountMenu session={session} />
        </div>
      </aside>
      <nav aria-label="Top" className={classes.topbar}>
        <Link to="/" aria-label="Furrowlight, to the desk" className={classes.home}>
          <Mark size={30} />
        </Link>
        <UnstyledButton className={classes.search} onClick={search.open}>
          <IconSearch size={16} stroke={1.7} aria-hidden />
          <span>Find or do</span>
        </UnstyledButton>
        <AccountMenu session={session} compact />
      </nav>
      <main id="main" ref={main} tabIndex={-1} className={classes.main}>
        {children}
      </main>
      <nav aria-label="Main" className={classes.bottombar}>
        {NAV.map((item) => (
          <NavLink key={item.to} to={item.to} end={item.to === '/'} className={classes.tab}>
            <item.icon size={21} stroke={1.6} aria-hidden />
            <span>{item.label}</span>
          </NavLink>
        ))}
      </nav>
      <CommandPalette opened={searching} onClose={search.close} session={session} />
    </div>
  );
}
