import { ChevronDownIcon, HamburgerMenuIcon } from '@radix-ui/react-icons';
import { Button, DropdownMenu, IconButton } from '@radix-ui/themes';
import { Suspense, useEffect, useRef } from 'react';
import { Link, NavLink, Outlet, useLocation, useNavigate } from 'react-router-dom';
import { Mark } from '@/components/mark';
import { PageSkeleton } from '@/components/page-states';
import { useMe, useSession } from '@/lib/auth/session';
import { useLiveEvents } from '@/lib/live-events/use-live-events';
import { paths } from './paths';
import { setUpLinks, WORK_LINKS } from './shell-links';
import styles from './app-shell.module.css';

/** Keyboard and screen-reader users begin at the new page, not at the old link. */
function useFocusOnNavigation() {
  const main = useRef<HTMLElement>(null);
  const { pathname } = useLocation();
  const isFirst = useRef(true);
  useEffect(() => {
    if (isFirst.current) {
      isFirst.current = false;
      return;
    }
    main.current?.focus({ preventScroll: true });
    scrollTo(0, 0);
  }, [pathname]);
  return main;
}

function AccountItems() {
  const navigate = useNavigate();
  const { signOut } = useSession();
  return (
    <>
      <DropdownMenu.Item onSelect={() => navigate(paths.account)}>Account</DropdownMenu.Item>
      <DropdownMenu.Item onSelect={() => void signOut()}>Sign out</DropdownMenu.Item>
    </>
  );
}

function AccountMenu() {
  const me = useMe();
  return (
    <DropdownMenu.Root>
      <DropdownMenu.Trigger>
        <Button variant="ghost" color="gray" highContrast size="3" className={styles.account} aria-label={`Account of ${me.name}`}>
          <span>{me.name}</span>
          <ChevronDownIcon />
        </Button>
      </DropdownMenu.Trigger>
      <DropdownMenu.Content align="end">
        <AccountItems />
      </DropdownMenu.Content>
    </DropdownMenu.Root>
  );
}

function PhoneMenu() {
  const me = useMe();
  const navigate = useNavigate();
  const links = [...WORK_LINKS, ...setUpLinks(me)];
  return (
    <DropdownMenu.Root>
      <DropdownMenu.Trigger>
        <IconButton variant="ghost" color="gray" highContrast size="4" aria-label="Menu">
          <HamburgerMenuIcon width="20" height="20" />
        </IconButton>
      </DropdownMenu.Trigger>
      <DropdownMenu.Content align="end">
        {links.map(({ to, word }) => (
          <DropdownMenu.Item key={to} onSelect={() => navigate(to)}>
            {word}
          </DropdownMenu.Item>
        ))}
        <DropdownMenu.Separator />
        <DropdownMenu.Label>{me.name}</DropdownMenu.Label>
        <AccountItems />
      </DropdownMenu.Content>
    </DropdownMenu.Root>
  );
}

const Links = ({ links }: { links: typeof WORK_LINKS }) =>
  links.map(({ to, word }) => (
    <NavLink key={to} to={to}>
      {word}
    </NavLink>
  ));

/** The bar on top of every signed-in page, and the live updates below it. */
export function AppShell() {
  useLiveEvents();
  const setUp = setUpLinks(useMe());
  const main = useFocusOnNavigation();
  return (
    <>
      <a className={styles.skip} href="#main">
        Skip to the page
      </a>
      <header className={styles.bar} data-shell>
        <div className={styles.inner}>
          <Link to={paths.cases} className={styles.home}>
            <Mark size={22} />
            Kerfside
          </Link>
          <nav className={styles.links} aria-label="Main">
            <Links links={WORK_LINKS} />
            {setUp.length > 0 && (
              <div className={styles.apart}>
                <Links links={setUp} />
              </div>
            )}
          </nav>
          <AccountMenu />
          <div className={styles.phone}>
            <PhoneMenu />
          </div>
        </div>
      </header>
      <main id="main" ref={main} tabIndex={-1} className={styles.main}>
        <Suspense fallback={<PageSkeleton />}>
          <Outlet />
        </Suspense>
      </main>
    </>
  );
}
