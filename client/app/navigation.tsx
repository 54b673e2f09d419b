import { NavLink } from 'react-router-dom';
import { screens, type Screen } from './screens.ts';
import { useSession } from './session.ts';

interface NavEntry {
  to: string;
  label: string;
  group: 'read' | 'write';
  /** Spoken with the label: how many wait. */
  count: number | null;
}

/** The links of the header that who is signed in has a use for. */
export function useNavigation(list: readonly Screen[] = screens): NavEntry[] {
  const { me, may } = useSession();
  return list.flatMap(({ path, nav }) => {
    if (!nav || (nav.needs && !may(nav.needs))) return [];
    return [{ to: path, label: nav.label, group: nav.group, count: nav.count ? me?.[nav.count] ?? null : null }];
  });
}

/** A row of links; the open page's is marked. */
export function NavLinks({ entries, onFollow }: { entries: readonly NavEntry[]; onFollow?: () => void }) {
  return entries.map((entry) => (
    <NavLink key={entry.to} to={entry.to} className="nav-link" onClick={onFollow}>
      {entry.label}
      {entry.count !== null && (
        <>
          <span aria-hidden="true">{`\u00a0· ${entry.count}`}</span>
          <span className="sr-only">{`, ${entry.count} waiting`}</span>
        </>
      )}
    </NavLink>
  ));
}
