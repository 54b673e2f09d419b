import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';

function Page() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button onClick={() => setOpen(true)}>Withdraw</Button>
      <Dialog open={open} title="Withdraw this submission?" onClose={() => setOpen(false)} actions={<Button onClick={() => setOpen(false)}>Keep</Button>}>It leaves the queue.</Dialog>
    </>
  );
}

describe('dialog', () => {
  it.each([
    ['Escape', async (user: ReturnType<typeof userEvent.setup>) => user.keyboard('{Escape}')],
    ['its button', async (user: ReturnType<typeof userEvent.setup>) => user.click(screen.getByRole('button', { name: 'Keep' }))],
  ])('is named by its title, closes by %s and gives the focus back', async (_, leave) => {
    const user = userEvent.setup();
    render(<Page />);
    await user.click(screen.getByRole('button', { name: 'Withdraw' }));
    expect(screen.getByRole('dialog', { name: 'Withdraw this submission?' })).toBeTruthy();
    screen.getByRole('button', { name: 'Keep' }).focus();
    await leave(user);
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Withdraw' }));
  });
});
