import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it, vi } from 'vitest';
import { ApiError } from '#client/lib/api-error.ts';
import { Button } from '#client/ui/button.tsx';
import { Derivation } from '#client/ui/derivation.tsx';
import { InputField, SelectField, TextareaField } from '#client/ui/field.tsx';
import { ErrorState } from '#client/ui/states.tsx';

describe('button', () => {
  it('keeps the focus while it is busy and does nothing', async () => {
    const user = userEvent.setup();
    const onClick = vi.fn();
    const onSubmit = vi.fn();
    render(<form onSubmit={onSubmit}><Button type="submit" busy onClick={onClick}>Submit</Button></form>);
    await user.tab();
    expect(document.activeElement).toBe(screen.getByRole('button'));
    await user.keyboard('{Enter}');
    expect(onClick).not.toHaveBeenCalled();
    expect(onSubmit).not.toHaveBeenCalled();
  });
});

describe('field', () => {
  it.each([
    ['input', <InputField key="i" label="Unit" hint="As in the source." error="No such unit." required />],
    ['textarea', <TextareaField key="t" label="Unit" hint="As in the source." error="No such unit." required />],
    ['select', <SelectField key="s" label="Unit" hint="As in the source." error="No such unit." required choices={[]} empty="none" />],
  ])('ties label, hint and error to its %s', (_, field) => {
    render(field);
    const control = screen.getByLabelText(/^Unit/);
    const described = (control.getAttribute('aria-describedby') ?? '').split(' ').map((id) => document.getElementById(id)?.textContent);
    expect(described).toEqual(['As in the source.', 'No such unit.']);
    expect(control.getAttribute('aria-invalid')).toBe('true');
    expect(control.getAttribute('aria-required')).toBe('true');
  });

  it('is not invalid without an error', () => {
    render(<InputField label="Unit" />);
    expect(screen.getByLabelText('Unit').hasAttribute('aria-invalid')).toBe(false);
  });
});

describe('error state', () => {
  const error = (status: number, code: 'not-found' | 'sign-in-required' | 'forbidden' | 'internal') =>
    new ApiError({ status, code, title: 'Title', detail: 'Detail of the answer.', requestId: 'r1' });

  it.each([
    [404, 'not-found', 'There is nothing here', 'link', 'Go to the search'],
    [401, 'sign-in-required', 'Title', 'link', 'Sign in'],
    [403, 'forbidden', 'Title', 'link', 'Go to the search'],
    [500, 'internal', 'Title', 'button', 'Try again'],
  ] as const)('answers %s with its own words and a way on', (status, code, title, role, way) => {
    render(<MemoryRouter><ErrorState error={error(status, code)} onRetry={() => undefined} /></MemoryRouter>);
    expect(screen.getByRole('heading').textContent).toBe(title);
    expect(screen.getByText('Detail of the answer.')).toBeTruthy();
    expect(screen.getByRole(role, { name: way })).toBeTruthy();
  });

  it('shows nothing of an error that is no answer', () => {
    render(<MemoryRouter><ErrorState error={new Error('undefined is not a function')} /></MemoryRouter>);
    expect(screen.queryByText(/undefined/)).toBeNull();
  });
});

describe('derivation', () => {
  it('numbers its steps and says an assumption in words', () => {
    render(<Derivation lines={[
      { operation: 'Read the printed value', from: '1', to: '1', reference: 'as printed' },
      { operation: 'Divide by the site density', from: '1', to: '2', assumption: 'site density of the terrace', reference: 'site balance' },
    ]}
    />);
    expect(screen.getAllByRole('listitem')).toHaveLength(2);
    expect(screen.getByText('Assumed:').parentElement?.textContent).toBe('Assumed: site density of the terrace');
  });
});
