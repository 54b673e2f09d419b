import { useEffect, useRef, type ReactNode } from 'react';
import { Link, Outlet, ScrollRestoration, useLocation, useNavigation as useRouterNavigation } from 'react-router-dom';
import { announce } from '#client/lib/announce.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { useMediaQuery, useNarrow } from '#client/lib/use-media-query.ts';
import { InstrumentControl } from '#client/ui/instrument-control.tsx';
import { LiveRegion } from '#client/ui/live-region.tsx';
import { Mark } from '#client/ui/mark.tsx';
import { Popover } from '#client/ui/popover.tsx';
import { SessionGuard } from '#client/routes/sign-in/session-guard.tsx';
import { AccountLines, AccountMenu } from './account-menu.tsx';
import { useInstrumentInAddress } from './instrument-address.ts';
import { NavLinks, useNavigation } from './navigation.tsx';
import { useAccountPreferences, useChoosePreferences } from './preferences.ts';
import { useSession } from './session.ts';
import { SiteFooter } from './site-footer.tsx';

/** What surrounds every page: header with the instrument, demonstration banner, the page itself, footer. */
export function Shell({ children }: { children?: ReactNode }) {
  const { me } = useSession();
  const narrow = useNarrow();
  useInstrumentInAddress();
  useAccountPreferences();
  useFocusOnArrival();
  return (
    <>
      <OnTheWay />
      <a className="skip-link" href="#content">Skip to the content</a>
      <Header narrow={narrow} />
      {me?.demonstration && (
        <aside className="demo-banner" aria-label="Demonstration">
          <p className="page">Demonstration data: every entry, author and journal here is invented. Not for use.</p>
        </aside>
      )}
      <main id="content" tabIndex={-1} className="page">{children ?? <Outlet />}</main>
      <SiteFooter version={me?.version} />
      {narrow && <aside className="instrument-dock" aria-label="Instrument"><Instrument /></aside>}
      <LiveRegion />
      <SessionGuard />
      <ScrollRestoration getKey={({ pathname, key }) => (pathname === '/search' ? pathname : key)} />
    </>
  );
}

function Header({ narrow }: { narrow: boolean }) {
  const entries = useNavigation();
  const roomy = useMediaQuery('(min-width: 1100px)');
  return (
    <header className="site-header">
      <div className="page site-header-row">
        <Link className="mark-link" to="/search" aria-label="Sillstone, to the search"><Mark />Sillstone</Link>
        {roomy && <nav className="site-nav" aria-label="Read"><NavLinks entries={entries.filter((entry) => entry.group === 'read')} /></nav>}
        <div className="header-aside">
          {!narrow && <Instrument />}
          {roomy ? (
            <>
              <nav className="site-nav" aria-label="Contribute and review"><NavLinks entries={entries.filter((entry) => entry.group === 'write')} /></nav>
              <AccountMenu />
            </>
          ) : (
            <Popover align="end" label="Menu" panelClassName="menu-panel">
              {(close) => (
                <>
                  <nav aria-label="Pages"><NavLinks entries={entries} onFollow={close} /></nav>
                  <AccountLines onFollow={close} />
                </>
              )}
            </Popover>
          )}
        </div>
      </div>
    </header>
  );
}

/** A line at the head while the next page is fetched; it waits a moment, so that quick pages do not flicker. */
function OnTheWay() {
  const { state } = useRouterNavigation();
  return state === 'loading' ? <div className="on-the-way" aria-hidden="true" /> : null;
}

function Instrument() {
  const { temperatureK, unit } = useInstrument();
  const choose = useChoosePreferences();
  return (
    <InstrumentControl
      temperatureK={temperatureK}
      unit={unit}
      onTemperatureK={(next) => choose({ temperatureK: next })}
      onUnit={(next) => choose({ energyUnit: next })}
    />
  );
}

/** When another page opens, the focus goes to its heading and its title is said; a change of the query alone moves nothing. */
function useFocusOnArrival(): void {
  const { pathname } = useLocation();
  const before = useRef(pathname);
  useEffect(() => {
    if (before.current === pathname) return;
    before.current = pathname;
    // The page's own code may still be on its way; its heading is looked for until it is there.
    let tries = 0;
    const timer = setInterval(() => {
      const heading = document.querySelector<HTMLElement>('main h1[tabindex]');
      tries += 1;
      if (!heading && tries < 40) return;
      clearInterval(timer);
      if (document.activeElement?.closest('main input, main textarea, main select')) return;
      (heading ?? document.getElementById('content'))?.focus({ preventScroll: true });
      announce(document.title);
    }, 50);
    return () => clearInterval(timer);
  }, [pathname]);
}
