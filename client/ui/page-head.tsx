import { Fragment, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { useTitle } from '#client/lib/use-title.ts';

export interface TrailStep {
  label: ReactNode;
  to?: string;
}

interface PageHeadProps {
  title: ReactNode;
  /** The window's title, where the heading is more than text. */
  titleText?: string;
  trail?: readonly TrailStep[];
  aside?: ReactNode;
}

/** The head of a page: where it lies, what it is, what is said about it; closed by the black line. */
export function PageHead({ title, titleText, trail, aside }: PageHeadProps) {
  useTitle(titleText ?? (typeof title === 'string' ? title : ''));
  return (
    <div className="page-head">
      {trail && (
        <nav className="page-head-trail" aria-label="Where this page lies">
          {trail.map((step, index) => (
            <Fragment key={index}>
              {index > 0 && ' / '}
              {step.to ? <Link to={step.to}>{step.label}</Link> : step.label}
            </Fragment>
          ))}
        </nav>
      )}
      <h1 tabIndex={-1}>{title}</h1>
      {aside && <div className="page-head-aside">{aside}</div>}
    </div>
  );
}
