import { useSyncExternalStore } from 'react';
import { defaultPreferences, energyUnits, type EnergyUnit } from '#shared/contracts/accounts.ts';
import { readStored, writeStored } from './local-storage.ts';

/** The temperature of interest [K] and the reader's energy unit: one setting, the same on every page. */
export interface InstrumentSetting {
  temperatureK: number;
  unit: EnergyUnit;
}

export const temperatureLimitsK = { min: 1, max: 5000 } as const;

const key = 'sillstone.instrument';
const fallback: InstrumentSetting = { temperatureK: defaultPreferences.temperatureK, unit: defaultPreferences.energyUnit };

/** Reads a temperature as typed, with or without "K"; null when it is no number from 1 to 5000 K. */
export function readTemperatureK(text: string): number | null {
  const bare = text.trim().replace(/\s*K$/i, '').replace(',', '.');
  if (!/^\d+(\.\d+)?$/.test(bare)) return null;
  const value = Number(bare);
  return value >= temperatureLimitsK.min && value <= temperatureLimitsK.max ? value : null;
}

/** Reads an energy unit of the instrument; null when it is none of those offered. */
export function readEnergyUnit(text: string): EnergyUnit | null {
  return energyUnits.find((unit) => unit === text) ?? null;
}

function remembered(): InstrumentSetting {
  const [temperature, unit] = (readStored(key) ?? '').split(' ');
  return {
    temperatureK: readTemperatureK(temperature ?? '') ?? fallback.temperatureK,
    unit: readEnergyUnit(unit ?? '') ?? fallback.unit,
  };
}

let current: InstrumentSetting | null = null;
const listeners = new Set<() => void>();

/** The setting now in force. */
export function instrumentSetting(): InstrumentSetting {
  current ??= remembered();
  return current;
}

/**
 * Changes the setting. A link's own temperature and unit hold while the page is open but are not remembered:
 * opening somebody else's link must not change what the reader set.
 */
export function setInstrument(change: Partial<InstrumentSetting>, remember = true): void {
  const before = instrumentSetting();
  const next = { ...before, ...change };
  if (remember) writeStored(key, `${next.temperatureK} ${next.unit}`);
  if (next.temperatureK === before.temperatureK && next.unit === before.unit) return;
  current = next;
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => {
    listeners.delete(listener);
  };
}

export interface Instrument extends InstrumentSetting {
  setTemperatureK: (temperatureK: number) => void;
  setUnit: (unit: EnergyUnit) => void;
}

const setTemperatureK = (temperatureK: number) => setInstrument({ temperatureK });
const setUnit = (unit: EnergyUnit) => setInstrument({ unit });

/** The temperature of interest and the energy unit, followed as the reader changes them. */
export function useInstrument(): Instrument {
  const setting = useSyncExternalStore(subscribe, instrumentSetting);
  return { ...setting, setTemperatureK, setUnit };
}

/** Whether the setting is the one a first visitor has. */
export function isDefaultInstrument(setting: InstrumentSetting): boolean {
  return setting.temperatureK === fallback.temperatureK && setting.unit === fallback.unit;
}
