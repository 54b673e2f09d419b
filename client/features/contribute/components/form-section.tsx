import { useId, type ReactNode } from 'react';

interface FormSectionProps {
  title: string;
  hint?: ReactNode;
  children: ReactNode;
}

/** A part of the form, opened by the black line. */
export function FormSection({ title, hint, children }: FormSectionProps) {
  const id = useId();
  return (
    <section className="section-line flex flex-col gap-4 pb-9" aria-labelledby={id}>
      <div>
        <h2 id={id}>{title}</h2>
        {hint && <p className="text-fine text-second">{hint}</p>}
      </div>
      {children}
    </section>
  );
}

/** Fields side by side where there is room. */
export function FieldRow({ children }: { children: ReactNode }) {
  return <div className="grid items-start gap-x-5 gap-y-4 mid:grid-cols-2">{children}</div>;
}
