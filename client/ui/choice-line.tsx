import { Link } from 'react-router-dom';

interface ChoiceLineProps {
  label: string;
  choices: readonly { key: string; label: string; count?: number; to: string; current: boolean }[];
}

/** A filter as a line of links with counts; the one in force is marked. */
export function ChoiceLine({ label, choices }: ChoiceLineProps) {
  return (
    <nav aria-label={label} className="mb-5 flex flex-wrap gap-x-6 gap-y-1">
      {choices.map((choice) => (
        <Link
          key={choice.key} to={choice.to} replace aria-current={choice.current ? 'true' : undefined}
          className={`border-b-[3px] py-1 no-underline ${choice.current ? 'border-lichen font-semibold text-ink' : 'border-transparent text-second hover:border-rule hover:text-ink'}`}
        >
          {choice.label}{choice.count !== undefined && <>{' '}<span className="font-normal text-second">{`· ${choice.count}`}</span></>}
        </Link>
      ))}
    </nav>
  );
}
