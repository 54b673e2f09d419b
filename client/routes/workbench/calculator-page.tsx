import { useParams } from 'react-router-dom';
import { useSession } from '#client/app/session.ts';
import { CalculatorPage } from '#client/features/workbench/components/calculator-page.tsx';
import { sheetNamed } from '#client/features/workbench/purposes.ts';
import { NotFoundState } from '#client/ui/states.tsx';

/** One calculator of the Workbench, by its name in the address. */
export function Component() {
  const { name = '' } = useParams();
  const { may } = useSession();
  const found = sheetNamed(name);
  if (!found) return <NotFoundState page detail={`The Workbench has no calculator named ${name.slice(0, 60)}. The list of the Workbench has them all.`} />;
  return <CalculatorPage key={name} sheet={found.sheet} mayContribute={may('contributor')} />;
}
