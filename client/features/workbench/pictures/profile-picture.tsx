import { energyIn } from '#client/lib/numbers.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { EnergyProfile } from '#client/ui/energy-profile.tsx';
import { PlotFrame } from '#client/ui/plot-frame.tsx';
import { profileQuantityWords } from '../calculators/profile-words.ts';
import type { PictureProps } from '../sheet.ts';

interface Result {
  states: readonly { name: string; kind: 'start' | 'transition-state' | 'intermediate' | 'end'; energyKJPerMol: number }[];
}

/** The pathway as stairs, its highest point marked. */
export default function ProfilePicture({ result, input }: PictureProps<Result, { quantity: 'gibbs' | 'enthalpy' | 'electronic'; temperatureK?: number }>) {
  const { unit } = useInstrument();
  const what = profileQuantityWords[input.quantity];
  return (
    <PlotFrame title="Energy profile">
      <EnergyProfile
        unit={unit} what={input.temperatureK === undefined ? what : `${what} at ${input.temperatureK} K`} digits={unit === 'eV' ? 2 : unit === 'kcal/mol' ? 1 : 0}
        pathways={[{
          id: 'typed', label: 'as typed',
          states: result.states.map((state) => ({ label: state.name, energy: energyIn(unit, state.energyKJPerMol), kind: state.kind === 'transition-state' ? 'transition' as const : 'state' as const })),
        }]}
      />
    </PlotFrame>
  );
}
