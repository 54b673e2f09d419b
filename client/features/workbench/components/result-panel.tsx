import { Suspense } from 'react';
import { Link } from 'react-router-dom';
import { sentence } from '../typed-number.ts';
import { TextButton } from '#client/ui/button.tsx';
import { Derivation } from '#client/ui/derivation.tsx';
import { Facts } from '#client/ui/facts.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { SillLine } from '#client/ui/sill-line.tsx';
import { Sign } from '#client/ui/signs.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { fieldName, type Answer } from '../answer.ts';
import type { Fault } from '../read-typed.ts';
import type { Outcome, Sheet } from '../sheet.ts';
import { paramOf } from '../typed.ts';
import { addressOf } from '../onward.ts';
import { FigureName, FigureView } from './figure-view.tsx';

interface ResultPanelProps {
  sheet: Sheet;
  answer: Answer;
  /** The result is that of a moment ago: what is typed just now cannot be read yet. */
  stale: boolean;
  onType: (param: string, text: string) => void;
  actions: React.ReactNode;
}

/** What the form amounts to: what to give, what stands in the way, or the result. */
export function ResultPanel({ sheet, answer, stale, onType, actions }: ResultPanelProps) {
  if (answer.state !== 'result') return <section className="result" aria-labelledby="result"><h2 id="result">Result</h2><NoResult sheet={sheet} answer={answer} onType={onType} /></section>;
  const { outcome, given, derivation, onward, notes } = answer;
  const Picture = sheet.picture;
  const warnings = [...(outcome.warnings ?? []), ...notes];
  return (
    <>
      <section className={`result ${stale ? 'result-stale' : ''}`} aria-labelledby="result" aria-busy={stale || undefined}>
        <h2 id="result">Result</h2>
        <MainFigures outcome={outcome} />
        {warnings.map((warning) => <Notice key={warning} kind="doubt" className="result-warning"><p>{sentence(warning)}</p></Notice>)}
        {outcome.facts.length > 0 && (
          <div className="result-facts"><Facts facts={outcome.facts.map((figure, index) => ({ key: `${figure.label} ${index}`, name: <FigureName figure={figure} />, value: <FigureView figure={figure} /> }))} /></div>
        )}
        {actions}
        {onward.length > 0 && (
          <p className="onward no-print">
            Go on:{' '}
            {onward.map((one, index) => <span key={one.to + one.label}>{index > 0 && ' · '}<Link to={addressOf(one)}>{one.label}</Link></span>)}
          </p>
        )}
      </section>
      {Picture && (
        <Suspense fallback={<div className="picture-room" />}><div className={`picture ${stale ? 'result-stale' : ''}`}><Picture {...given} onType={onType} /></div></Suspense>
      )}
      <section aria-labelledby="derivation" className={stale ? 'result-stale' : undefined}>
        <h2 id="derivation">The derivation</h2>
        <Derivation lines={derivation} />
      </section>
    </>
  );
}

function MainFigures({ outcome }: { outcome: Outcome }) {
  const result = (
    <div className={`notice ${outcome.extrapolated ? 'notice-doubt' : 'notice-result'} result-main`}>
      {outcome.main.map((figure) => (
        <div key={figure.label} className="result-figure">
          <p className="result-label"><FigureName figure={figure} />{outcome.extrapolated && <>{' '}<Tag kind="doubt">extrapolated</Tag></>}</p>
          <p><FigureView figure={figure} large /></p>
        </div>
      ))}
    </div>
  );
  if (outcome.printed === undefined) return result;
  return (
    <div className="result-pair">
      <div className="notice notice-quotation result-printed"><p className="result-label">As typed</p><samp>{outcome.printed}</samp></div>
      <Sign of="->" className="result-arrow" />
      {result}
    </div>
  );
}

/** The field of a fault in words, before its message; a table with its row. */
function placeOf(sheet: Sheet, fault: Fault): string {
  const field = sheet.fields.find((one) => paramOf(one) === fault.param);
  return field ? `${fieldName(field)}${fault.cell ? `, row ${fault.cell.row + 1}` : ''}: ` : '';
}

function NoResult({ sheet, answer, onType }: { sheet: Sheet; answer: Exclude<Answer, { state: 'result' }>; onType: (param: string, text: string) => void }) {
  if (answer.state === 'empty') return <div className="no-result"><SillLine shape="flat" /><p>{sheet.empty}</p></div>;
  if (answer.state === 'missing') {
    return (
      <div className="no-result">
        <SillLine shape="sill" />
        <p>Still to give:</p>
        <ul className="missing">{answer.missing.map((field) => <li key={field.key + field.label}>{field.kind === 'table' ? `${field.label.toLowerCase()}, ${field.least === 1 ? 'one row' : `${field.least} rows`} at least` : fieldName(field).charAt(0).toLowerCase() + fieldName(field).slice(1)}</li>)}</ul>
        {answer.faults.length > 0 && <p>What is marked in the form cannot be read.</p>}
      </div>
    );
  }
  const { suggestion } = answer;
  return (
    <Notice kind="refusal" title="No result.">
      {answer.faults.map((fault, index) => <p key={index}>{placeOf(sheet, fault)}{fault.message}</p>)}
      {suggestion && <p className="pt-2"><TextButton onClick={() => onType('equation', suggestion)}>{`Write ${suggestion}`}</TextButton></p>}
    </Notice>
  );
}
