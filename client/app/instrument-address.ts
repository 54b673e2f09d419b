import { useEffect } from 'react';
import { useMatches, useSearchParams } from 'react-router-dom';
import { instrumentSetting, isDefaultInstrument, readEnergyUnit, readTemperatureK, setInstrument, useInstrument } from '#client/lib/instrument.ts';

/**
 * Keeps `?T=` and `?unit=` of the address and the instrument the same on the pages where they change what is shown.
 * An address that names them is obeyed (a link shows what its sender saw); one that does not gets them once they differ from the usual ones.
 */
export function useInstrumentInAddress(): void {
  const matches = useMatches();
  const mirrors = matches.some((match) => (match.handle as { instrument?: boolean } | undefined)?.instrument);
  const [search, setSearch] = useSearchParams();
  const { temperatureK, unit } = useInstrument();
  const inAddress = `${search.get('T') ?? ''} ${search.get('unit') ?? ''}`;

  // The address speaks first: on arrival and whenever it changes.
  useEffect(() => {
    if (!mirrors) return;
    const [temperature = '', energyUnit = ''] = inAddress.split(' ');
    const fromTemperature = readTemperatureK(temperature);
    const fromUnit = readEnergyUnit(energyUnit);
    setInstrument({
      ...(fromTemperature === null ? {} : { temperatureK: fromTemperature }),
      ...(fromUnit === null ? {} : { unit: fromUnit }),
    }, false);
  }, [mirrors, inAddress]);

  // Then the reader: a change of the instrument is written to the address.
  useEffect(() => {
    if (!mirrors) return;
    const setting = instrumentSetting();
    const named = search.has('T') || search.has('unit');
    if (!named && isDefaultInstrument(setting)) return;
    if (search.get('T') === String(setting.temperatureK) && search.get('unit') === setting.unit) return;
    setSearch((before) => {
      const next = new URLSearchParams(before);
      next.set('T', String(setting.temperatureK));
      next.set('unit', setting.unit);
      return next;
    }, { replace: true, preventScrollReset: true });
  }, [mirrors, temperatureK, unit, search, setSearch]);
}
