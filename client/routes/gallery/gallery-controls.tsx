import { useState } from 'react';
import { ApiError } from '#client/lib/api-error.ts';
import { Button, LinkButton } from '#client/ui/button.tsx';
import { Checkbox, RadioGroup } from '#client/ui/choice.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { Equation } from '#client/ui/equation.tsx';
import { InputField, SelectField, TextareaField } from '#client/ui/field.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { LoadMore } from '#client/ui/pagination.tsx';
import { EmptyState, ErrorState, ForbiddenState, LoadingState } from '#client/ui/states.tsx';
import { Tag } from '#client/ui/tag.tsx';

const equations = ['N* + N* -> N2 + 2*', 'NH3* + * -> NH2* + H*', 'CO(g) + O*_edge -> CO2 + *', '[13C]O* + * <-> C* + O*', 'C2H4** -> C2H4 + 2*', '½N2 + * <-> N*'];

/** Buttons, fields, notices and states. */
export function GalleryControls() {
  const [open, setOpen] = useState(false);
  const [answer, setAnswer] = useState<'yes' | 'no' | null>('yes');
  return (
    <section className="section-line grid gap-10 wide:grid-cols-3">
      <div className="flex flex-col gap-4">
        <h2>Buttons</h2>
        <div className="flex flex-wrap gap-3">
          <Button look="primary">Accept</Button><Button>Return</Button><Button look="refusal">Reject</Button><Button look="quiet">Clear</Button>
          <Button busy>Exporting</Button><Button disabled>Submit</Button><LinkButton to="/gallery" small>Small link</LinkButton>
        </div>
        <div className="flex flex-wrap gap-2"><Tag>computed</Tag><Tag kind="result">accepted 14 Mar 2026</Tag><Tag kind="doubt">extrapolated</Tag><Tag kind="refusal">retracted</Tag></div>
        <Notice kind="quotation"><samp>152 kcal/mol</samp></Notice>
        <Notice kind="result">Converted by exact factors.</Notice>
        <Notice kind="doubt">Same source, step and surface as entry B2X-9TF-6 (accepted).</Notice>
        <Notice kind="refusal" title="Unit slip?">Read as kJ/mol, 152 falls among the neighbours (121 to 152).</Notice>
        <ul>{equations.map((one) => <li key={one}><Equation equation={one} /></li>)}</ul>
        <Button onClick={() => setOpen(true)}>Withdraw the submission</Button>
        <Dialog open={open} title="Withdraw this submission?" onClose={() => setOpen(false)} actions={<><Button look="refusal" onClick={() => setOpen(false)}>Withdraw</Button><Button onClick={() => setOpen(false)}>Keep</Button></>}>
          It goes back to you as withdrawn and leaves the reviewer's queue.
        </Dialog>
      </div>
      <div className="flex flex-col gap-4">
        <h2>Fields</h2>
        <InputField label="Value as printed" typed required hint="Exactly as in the source, with its uncertainty." defaultValue="44.5 ± 1.4" />
        <InputField label="Unit as printed" typed error="kcal/mole is not a unit read here; write kcal/mol." defaultValue="kcal/mole" />
        <SelectField label="Kind of uncertainty" choices={[{ value: 's', label: 'standard uncertainty' }]} empty="not said in the source" />
        <TextareaField label="To the contributor" defaultValue="Table 4 heads this column kJ/mol. Please check the unit." />
        <RadioGroup legend="Value and digits as printed" name="answer" look="segments" choices={[{ value: 'yes', label: 'Yes' }, { value: 'no', label: 'No' }]} value={answer} onChange={setAnswer} />
        <RadioGroup legend="Scope" name="scope" choices={[{ value: 'yes', label: 'Elementary', hint: 'One step as written.' }, { value: 'no', label: 'Apparent', hint: 'The overall reaction.' }]} value={answer} onChange={setAnswer} />
        <Checkbox label="The DOI is this paper" defaultChecked />
        <Checkbox label="Some of the rows" indeterminate readOnly />
        <InputField label="Not open" disabled defaultValue="under review" />
        <LoadMore shown={50} total={412} hasMore busy={false} onMore={() => undefined} />
      </div>
      <div>
        <LoadingState what="entries" rows={3} />
        <EmptyState title="No entry matches all of these" actions={<Button>Any method</Button>}>Without the method, 14 would be found.</EmptyState>
        <ErrorState error={new ApiError({ status: 503, code: 'database-unavailable', title: 'The database does not answer', detail: 'It is tried again by itself; nothing you sent was lost.', requestId: '01HZX' })} onRetry={() => undefined} />
        <ForbiddenState error={new ApiError({ status: 401, code: 'sign-in-required', title: 'Sign in to do this', detail: 'Saved searches belong to an account.' })} />
      </div>
    </section>
  );
}
