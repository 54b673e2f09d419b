import { render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { PlotFrame } from '#client/ui/plot-frame.tsx';
import { PlotLegend } from '#client/ui/plot-legend.tsx';

const saved: { name: string; text: Promise<string> }[] = [];

beforeEach(() => {
  saved.length = 0;
  const blobs = new Map<string, Blob>();
  Object.assign(URL, {
    createObjectURL: (blob: Blob) => {
      blobs.set(`blob:${blobs.size}`, blob);
      return `blob:${blobs.size - 1}`;
    },
    revokeObjectURL: () => undefined,
  });
  vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function click(this: HTMLAnchorElement) {
    saved.push({ name: this.download, text: blobs.get(this.href)?.text() ?? Promise.resolve('') });
  });
});
afterEach(() => document.querySelectorAll('.demo-banner').forEach((banner) => banner.remove()));

const plot = (
  <figure>
    <svg className="plot" width="100" height="50" role="img" aria-label="k"><path d="M0 0H1" /></svg>
    <PlotLegend items={[{ id: 'a', label: 'Ru(0001)', sample: <path d="M0 6H26" /> }]} />
  </figure>
);

describe('the frame of a plot', () => {
  it('is a named part of the page with its caption', () => {
    render(<PlotFrame title="Fit of k against T" caption="Eight points.">{plot}</PlotFrame>);
    expect(screen.getByRole('region', { name: 'Fit of k against T' })).toBeTruthy();
    expect(screen.getByRole('heading', { level: 3, name: 'Fit of k against T' })).toBeTruthy();
    expect(screen.getByText('Eight points.')).toBeTruthy();
    expect(screen.getAllByRole('button').map((button) => button.getAttribute('aria-label'))).toEqual(['Save Fit of k against T as SVG', 'Save Fit of k against T as PNG']);
  });

  it('saves the drawing with its legend, its note and what the page says of its data', async () => {
    const banner = document.createElement('aside');
    banner.className = 'demo-banner';
    banner.textContent = 'Demonstration data:\n every entry is invented.';
    document.body.append(banner);
    render(<PlotFrame title="Fit of k against T">{plot}</PlotFrame>);
    await userEvent.setup().click(screen.getByRole('button', { name: /SVG/ }));
    await waitFor(() => expect(saved).toHaveLength(1));
    expect(saved[0]?.name).toBe('fit-of-k-against-t.svg');
    const text = await saved[0]?.text;
    for (const words of ['Ru(0001)', 'they are not design data', 'Demonstration data: every entry is invented.', '<title>Fit of k against T</title>']) expect(text).toContain(words);
  });

  it('saves the figures under the name given', async () => {
    render(<PlotFrame title="Fit" fileName="points" csv={() => 'T,k\r\n450,1\r\n'}>{plot}</PlotFrame>);
    await userEvent.setup().click(screen.getByRole('button', { name: 'Save Fit as CSV' }));
    expect(saved[0]?.name).toBe('points.csv');
    expect(await saved[0]?.text).toBe('T,k\r\n450,1\r\n');
  });

  it('says so when there is nothing to save, and when the figures cannot be made', async () => {
    const user = userEvent.setup();
    render(<PlotFrame title="Fit" csv={() => { throw new Error('The rows changed meanwhile.'); }}><p>No point to draw yet.</p></PlotFrame>);
    await user.click(screen.getByRole('button', { name: /SVG/ }));
    expect(await screen.findByText('Not saved. There is no plot to save yet.')).toBeTruthy();
    await user.click(screen.getByRole('button', { name: /CSV/ }));
    expect(await screen.findByText('Not saved. The rows changed meanwhile.')).toBeTruthy();
    expect(saved).toHaveLength(0);
  });
});
