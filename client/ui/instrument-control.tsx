import { useId, useState, type KeyboardEvent } from 'react';
import { energyUnits, type EnergyUnit } from '#shared/contracts/accounts.ts';
import { readEnergyUnit, readTemperatureK, temperatureLimitsK } from '#client/lib/instrument.ts';

interface InstrumentControlProps {
  temperatureK: number;
  unit: EnergyUnit;
  onTemperatureK: (temperatureK: number) => void;
  onUnit: (unit: EnergyUnit) => void;
}

/** "at 700 K in kJ/mol": the temperature of interest and the energy unit, set once for every page. */
export function InstrumentControl({ temperatureK, unit, onTemperatureK, onUnit }: InstrumentControlProps) {
  const id = useId();
  /** What is being typed; null while the setting itself is shown. */
  const [typed, setTyped] = useState<string | null>(null);
  const [error, setError] = useState(false);

  function commit() {
    if (typed === null) return;
    const read = readTemperatureK(typed);
    if (read === null) {
      setError(true);
      return;
    }
    setError(false);
    setTyped(null);
    if (read !== temperatureK) onTemperatureK(read);
  }

  function giveUp() {
    setTyped(null);
    setError(false);
  }

  function onKey(event: KeyboardEvent) {
    if (event.key === 'Enter') commit();
    if (event.key === 'Escape') giveUp();
    if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
      event.preventDefault();
      const from = readTemperatureK(typed ?? String(temperatureK)) ?? temperatureK;
      const to = from + (event.key === 'ArrowUp' ? 1 : -1) * (event.shiftKey ? 100 : 10);
      giveUp();
      onTemperatureK(Math.min(temperatureLimitsK.max, Math.max(temperatureLimitsK.min, to)));
    }
  }

  return (
    <div className="instrument" role="group" aria-label="Temperature of interest and energy unit">
      <label className="instrument-word" htmlFor={`${id}-t`}>at<span className="sr-only"> the temperature of interest, in kelvin</span></label>
      <span className="instrument-figure">
        <input
          id={`${id}-t`}
          className="instrument-input"
          type="text"
          inputMode="decimal"
          autoComplete="off"
          value={typed ?? String(temperatureK)}
          aria-invalid={error || undefined}
          aria-describedby={error ? `${id}-error` : undefined}
          onFocus={(event) => event.currentTarget.select()}
          onChange={(event) => setTyped(event.target.value)}
          onBlur={commit}
          onKeyDown={onKey}
        />
        <span aria-hidden="true">K</span>
      </span>
      <label className="instrument-word" htmlFor={`${id}-u`}>in<span className="sr-only"> the energy unit</span></label>
      <select
        id={`${id}-u`}
        className="instrument-select"
        value={unit}
        onChange={(event) => {
          const read = readEnergyUnit(event.target.value);
          if (read) onUnit(read);
        }}
      >
        {energyUnits.map((one) => <option className="select-option" key={one} value={one}>{one}</option>)}
      </select>
      {error && (
        <p className="instrument-error" id={`${id}-error`} role="alert">
          {`"${(typed ?? '').slice(0, 20)}" is no temperature from 1 to 5000 K. ${temperatureK} K still holds; Escape brings it back.`}
        </p>
      )}
    </div>
  );
}
