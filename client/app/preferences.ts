import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { patchPreferences, type Preferences } from '#shared/contracts/accounts.ts';
import { call } from '#client/lib/api-client.ts';
import { announce } from '#client/lib/announce.ts';
import { setInstrument } from '#client/lib/instrument.ts';
import { rememberTable } from '#client/lib/table-setting.ts';
import { useTheme } from '#client/lib/theme.ts';
import { sessionOptions, useSession } from './session.ts';

/** Puts a choice in force at once, remembers it on this device, and with the account where there is one. */
export function useChoosePreferences(): (change: Partial<Preferences>) => void {
  const { me } = useSession();
  const client = useQueryClient();
  const [, setTheme] = useTheme();
  const { mutate } = useMutation({
    mutationFn: (body: Partial<Preferences>) => call(patchPreferences, { body }),
    onSuccess: (preferences) => client.setQueryData(sessionOptions.queryKey, (before) => before && { ...before, preferences }),
    onError: () => announce('The setting holds on this device, but could not be saved with the account.'),
  });
  return (change) => {
    setInstrument({
      ...(change.temperatureK === undefined ? {} : { temperatureK: change.temperatureK }),
      ...(change.energyUnit === undefined ? {} : { unit: change.energyUnit }),
    });
    if (change.theme) setTheme(change.theme);
    rememberTable(change);
    if (me?.user) mutate(change);
  };
}

/** Takes over the preferences of an account when its holder is first known; an address that names its own goes before. */
export function useAccountPreferences(): void {
  const { me } = useSession();
  const [, setTheme] = useTheme();
  const id = me?.user?.id;
  useEffect(() => {
    if (!id || !me?.preferences) return;
    const { temperatureK, energyUnit, theme, ...table } = me.preferences;
    const named = new URLSearchParams(window.location.search);
    setInstrument({ ...(named.has('T') ? {} : { temperatureK }), ...(named.has('unit') ? {} : { unit: energyUnit }) });
    setTheme(theme);
    rememberTable(table);
    // Once for each person: later changes are made here and sent there.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [id]);
}
