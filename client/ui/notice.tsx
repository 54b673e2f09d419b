import type { ReactNode } from 'react';

export type NoticeKind = 'quotation' | 'result' | 'doubt' | 'refusal';

interface NoticeProps {
  kind: NoticeKind;
  /** The first words, in bold: what the bar's colour says must also be said. */
  title?: ReactNode;
  children?: ReactNode;
  /** Heard when it appears: a refusal at once, the others when there is a pause. */
  live?: boolean;
  className?: string;
}

const looks: Readonly<Record<NoticeKind, string>> = {
  quotation: 'notice notice-quotation',
  result: 'notice notice-result',
  doubt: 'notice notice-doubt',
  refusal: 'notice notice-refusal',
};

/** A passage behind a 4 px bar: a quotation, a result, a doubt or a refusal. */
export function Notice({ kind, title, children, live = false, className = '' }: NoticeProps) {
  return (
    <div className={`${looks[kind]} ${className}`} role={live ? (kind === 'refusal' ? 'alert' : 'status') : undefined}>
      {title && <strong>{title} </strong>}
      {children}
    </div>
  );
}
