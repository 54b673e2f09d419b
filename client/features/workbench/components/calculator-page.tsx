import { useEffect, useMemo } from 'react';
import { announce } from '#client/lib/announce.ts';
import { instrumentSetting, isDefaultInstrument, useInstrument } from '#client/lib/instrument.ts';
import { useDebounced } from '#client/lib/use-debounced.ts';
import { useMediaQuery } from '#client/lib/use-media-query.ts';
import { Button } from '#client/ui/button.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { PageHead } from '#client/ui/page-head.tsx';
import { longestAddress, printTyped } from '../address.ts';
import { answerOf, fieldName, type Answer } from '../answer.ts';
import { exampleOf } from '../example.ts';
import { figureText } from '../figures.ts';
import type { Fault } from '../read-typed.ts';
import type { Sheet } from '../sheet.ts';
import { nothingTyped, type Typed } from '../typed.ts';
import { useTyped } from '../use-typed.ts';
import { CalculatorForm } from './calculator-form.tsx';
import { CalculatorNav } from './calculator-nav.tsx';
import { CopyButton } from './copy-button.tsx';
import { Formula } from '#client/ui/formula.tsx';
import { GivenPanel } from './given-panel.tsx';
import { MethodPanel } from './method-panel.tsx';
import { ResultActions } from './result-actions.tsx';
import { ResultPanel } from './result-panel.tsx';

/** How long typing must rest before a fault is shown and a result is said [ms]. */
const restMs = 600;

interface CalculatorPageProps {
  sheet: Sheet;
  mayContribute: boolean;
}

/** One calculator: what is given at the left, what it amounts to at the right, the method beneath; all of it in the address. */
export function CalculatorPage({ sheet, mayContribute }: CalculatorPageProps) {
  const form = useTyped(sheet);
  const { typed, leftOut, tooLong, onAll, onValue } = form;
  const { calculator } = sheet;
  const wide = useMediaQuery('(min-width: 1180px)');
  const rested = useDebounced(typed, restMs);
  const now = useMemo(() => answerOf(sheet, typed), [sheet, typed]);
  const before = useMemo(() => (rested === typed ? now : answerOf(sheet, rested)), [sheet, rested, typed, now]);
  const stale = now.state === 'faulty' && before.state === 'result';
  const answer = stale ? before : now;
  const link = tooLong ? '' : linkTo(sheet, typed);
  useSaid(before);

  return (
    <>
      <PageHead
        title={calculator.title}
        trail={[{ label: 'Workbench', to: '/workbench' }]}
        aside={(
          <div className="page-actions no-print">
            <Button small onClick={() => onAll(exampleOf(sheet))}>Example</Button>
            <Button small onClick={() => onAll(nothingTyped)}>Clear</Button>
            <CopyButton label="Copy link" copied="Link copied" text={() => link} disabled={tooLong} />
          </div>
        )}
      />
      {leftOut.length > 0 && (
        <Notice kind="doubt" title="Parts of this address could not be read and were left out:" className="mb-5">
          {leftOut.map(({ name, message }) => `${name} (${message})`).join(', ')}.
        </Notice>
      )}
      {tooLong && (
        <Notice kind="doubt" title="Too much for a link." className="mb-5">
          {`The address would be longer than ${longestAddress} characters: what is typed is kept only while this page is open. Save it as CSV or copy it as text.`}
        </Notice>
      )}
      <div className="calculator">
        {wide && <CalculatorNav />}
        <div className="calculator-sheet">
          <p className="calculator-summary"><Formula text={calculator.summary.replace(/_([a-z]{2,})/g, '_{$1}')} prose /></p>
          <div className="calculator-columns">
            <div><CalculatorForm sheet={sheet} form={form} faults={shownFaults(now, before, rested === typed)} /><GivenPanel sheet={sheet} typed={typed} /></div>
            <div className="calculator-result">
              <ResultPanel
                sheet={sheet} answer={answer} stale={stale} onType={onValue}
                actions={answer.state === 'result' && <ResultActions sheet={sheet} typed={stale ? rested : typed} answer={answer} link={link} mayContribute={mayContribute} />}
              />
            </div>
          </div>
          <MethodPanel sheet={sheet} />
        </div>
        {!wide && <div className="section-line no-print"><h2 className="pb-2">Other calculators</h2><CalculatorNav /></div>}
      </div>
    </>
  );
}

/** The whole address of what is typed, with the reader's unit where it is not the usual one. */
function linkTo(sheet: Sheet, typed: Typed): string {
  const params = printTyped(sheet, typed);
  const setting = instrumentSetting();
  if (!isDefaultInstrument(setting)) {
    params.set('T', String(setting.temperatureK));
    params.set('unit', setting.unit);
  }
  const query = params.toString();
  return `${window.location.origin}/workbench/${sheet.calculator.name}${query ? `?${query}` : ''}`;
}

function faultsOf(answer: Answer): readonly Fault[] {
  return answer.state === 'faulty' || answer.state === 'missing' ? answer.faults : [];
}

/** A fault is shown once typing rests, and while it stays where it was. */
function shownFaults(now: Answer, before: Answer, resting: boolean): readonly Fault[] {
  const known = faultsOf(before);
  return faultsOf(now).filter((fault) => resting || known.some((one) => one.param === fault.param && one.cell?.row === fault.cell?.row && one.cell?.column === fault.cell?.column));
}

/** Says the result to those who listen, once typing rests. */
function useSaid(answer: Answer): void {
  const { unit } = useInstrument();
  const words = answer.state === 'result' ? `Result: ${answer.outcome.main.map((figure) => `${fieldName(figure)} ${figureText(figure, unit)}`).join('; ')}` : '';
  useEffect(() => {
    if (words) announce(words);
  }, [words]);
}
