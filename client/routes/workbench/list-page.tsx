import { PageHead } from '#client/ui/page-head.tsx';
import { CalculatorList } from '#client/features/workbench/components/calculator-list.tsx';

/** The Workbench: the calculators by purpose. */
export function Component() {
  return (
    <>
      <PageHead title="Workbench" />
      <p className="max-w-[110ch] pb-6 text-second">
        Every calculation runs as it is typed, shows its derivation, and has an address of its own that can be sent on. Nothing that is typed here is stored.
      </p>
      <CalculatorList />
    </>
  );
}
