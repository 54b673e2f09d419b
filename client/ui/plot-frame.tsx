import { useId, useRef, useState, type ReactNode } from 'react';
import { announce } from '#client/lib/announce.ts';
import { fileNameOf, saveFile } from '#client/lib/save-file.ts';
import { TextButton } from './button.tsx';
import { FieldError } from './field.tsx';

type Format = 'SVG' | 'PNG' | 'CSV';

interface PlotFrameProps {
  title: string;
  caption?: ReactNode;
  /** Without its ending; made from the title when not given. */
  fileName?: string;
  /** The figures behind the plot as CSV. */
  csv?: () => string;
  /** What the saved picture says of its values at its foot. */
  note?: string;
  level?: 2 | 3;
  children: ReactNode;
}

const usualNote = 'Drawn by Sillstone. The values are literature reports or were typed in; they are not design data.';

/** A plot under its heading, with the words to save it: as a drawing, as a picture of dots, its figures as CSV. */
export function PlotFrame({ title, caption, fileName = fileNameOf(title), csv, note = usualNote, level = 3, children }: PlotFrameProps) {
  const frame = useRef<HTMLDivElement>(null);
  const id = useId();
  const [busy, setBusy] = useState<Format | null>(null);
  const [error, setError] = useState<string | null>(null);
  const Heading = level === 2 ? 'h2' : 'h3';

  async function save(format: Format) {
    setBusy(format);
    setError(null);
    try {
      await (format === 'CSV' ? saveFile(`${fileName}.csv`, csv?.() ?? '', 'text/csv') : savePicture(format));
      announce(`${title} saved as ${format}.`);
    } catch (reason) {
      setError(reason instanceof Error ? `Not saved. ${reason.message}` : 'Not saved: the browser did not make the file.');
    } finally {
      setBusy(null);
    }
  }

  async function savePicture(format: 'SVG' | 'PNG') {
    const svg = frame.current?.querySelector<SVGSVGElement>('svg.plot');
    if (!svg) throw new Error('There is no plot to save yet.');
    const { svgImage, pngImage } = await import('#client/lib/svg-image.ts');
    const input = { svg, legend: frame.current?.querySelector('.plot-legend'), title, notes: [note, ...pageNotes()] };
    if (format === 'SVG') saveFile(`${fileName}.svg`, (await svgImage(input)).text, 'image/svg+xml');
    else saveFile(`${fileName}.png`, await pngImage(input));
  }

  const formats: Format[] = ['SVG', 'PNG', ...(csv ? ['CSV' as const] : [])];
  return (
    <section className="plot-frame" aria-labelledby={id}>
      <div className="plot-frame-head">
        <Heading id={id}>{title}</Heading>
        <p className="plot-frame-actions no-print">
          Save as{' '}
          {formats.map((format, index) => (
            <span key={format}>
              {index > 0 && ', '}
              <TextButton aria-label={`Save ${title} as ${format}`} aria-busy={busy === format || undefined} onClick={() => void save(format)}>{format}</TextButton>
            </span>
          ))}
        </p>
      </div>
      <FieldError id={`${id}-error`} error={error} />
      <div ref={frame}>{children}</div>
      {caption && <p className="plot-caption">{caption}</p>}
    </section>
  );
}

/** What the page itself says of its data goes out with a picture: that demonstration data are invented. */
function pageNotes(): string[] {
  return [...document.querySelectorAll('.demo-banner')].map((banner) => banner.textContent?.replace(/\s+/g, ' ').trim() ?? '').filter(Boolean);
}
