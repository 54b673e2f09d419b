import type { Preview } from '#shared/contracts/entries.ts';
import { kindWord } from '#shared/domain/kinds.ts';
import { isApiError } from '#client/lib/api-error.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { Equation } from '#client/ui/equation.tsx';
import { Facts } from '#client/ui/facts.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { printedText, QuantityValue } from '#client/ui/quantity-value.tsx';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';
import type { EntryForm } from '../entry-form.ts';

interface SubmitDialogProps {
  open: boolean;
  form: EntryForm;
  preview: Preview | undefined;
  sourceLabel: string | null;
  busy: boolean;
  error: unknown;
  onSubmit: () => void;
  onClose: () => void;
}

/** What is about to be handed in, once more; handing in freezes it. */
export function SubmitDialog({ open, form, preview, sourceLabel, busy, error, onSubmit, onClose }: SubmitDialogProps) {
  const { unit } = useInstrument();
  const warnings = preview?.checks.filter((check) => check.severity === 'warning').length ?? 0;
  return (
    <Dialog
      open={open}
      title="Submit this entry for review?"
      onClose={onClose}
      actions={(
        <>
          <Button look="primary" busy={busy} onClick={onSubmit}>Submit</Button>
          <Button onClick={onClose}>Go on editing</Button>
        </>
      )}
    >
      <Facts
        facts={[
          { name: 'Elementary step', value: preview?.step ? <Equation equation={preview.step.equation} /> : form.step.equation },
          { name: 'Surface', value: preview?.surface ? <SurfaceLabel label={preview.surface.label} /> : null },
          { name: 'Kind', value: form.kind ? kindWord[form.kind] : null },
          {
            name: 'As printed',
            value: preview && preview.quantities.length > 0 ? (
              <ul>
                {preview.quantities.map((quantity, index) => (
                  <li key={index}><samp>{printedText(quantity)}</samp>{' is '}<QuantityValue quantity={quantity} energyUnit={unit} /></li>
                ))}
              </ul>
            ) : null,
          },
          { name: 'Source', value: sourceLabel },
          { name: 'Where', value: form.locator || null },
        ]}
      />
      {warnings > 0 && (
        <p className="pt-3 text-ochre">{warnings === 1 ? 'One check has' : `${warnings} checks have`} raised a doubt; the reviewer sees the same.</p>
      )}
      <p className="pt-3 text-second">It is frozen while a reviewer holds it against the paper. You can withdraw it until it is decided.</p>
      {Boolean(error) && (
        <div className="pt-3">
          <Notice kind="refusal" live title={isApiError(error) ? `${error.title}.` : 'It could not be submitted.'}>
            {isApiError(error) ? error.detail : 'Try again in a moment.'}
            {isApiError(error) && error.errors.length > 1 && <ul className="list-disc pl-5">{error.errors.map((one) => <li key={one.path + one.message}>{one.message}</li>)}</ul>}
          </Notice>
        </div>
      )}
    </Dialog>
  );
}
