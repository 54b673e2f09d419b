import { TextButton } from '#client/ui/button.tsx';
import { focusField } from '../entry-field.ts';
import { placeName, type FormFault } from '../faults.ts';

/** What stands in the way of submitting; each leads to its field. */
export function FaultsList({ faults }: { faults: readonly FormFault[] }) {
  return (
    <ul className="border-t border-rule">
      {faults.map((fault) => (
        <li key={fault.path + fault.message} className="border-b border-hairline py-1.5">
          <TextButton className="font-semibold" onClick={() => focusField(fault.path)}>{placeName(fault.path)}</TextButton>
          <span>: {fault.message}</span>
        </li>
      ))}
    </ul>
  );
}
