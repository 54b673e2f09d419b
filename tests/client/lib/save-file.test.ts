import { afterEach, describe, expect, it, vi } from 'vitest';
import { fileNameOf, saveFile } from '#client/lib/save-file.ts';

describe('a file name', () => {
  it.each([
    ['Fit of k against T', 'fit-of-k-against-t'], ['NH₃/ND₃ on Ru(0001)', 'nh3-nd3-on-ru-0001'], ['Équilibre à 700 K', 'equilibre-a-700-k'], ['../../etc', 'etc'], ['', 'plot'], ['→', 'plot'], ['x'.repeat(200), 'x'.repeat(80)],
  ])('%j becomes %s', (title, name) => {
    expect(fileNameOf(title)).toBe(name);
  });
});

describe('saving', () => {
  afterEach(() => vi.useRealTimers());

  it('offers the content under its name and lets it go afterwards', async () => {
    vi.useFakeTimers();
    const made: Blob[] = [];
    const createObjectURL = vi.fn((blob: Blob) => { made.push(blob); return 'blob:one'; });
    const revokeObjectURL = vi.fn();
    Object.assign(URL, { createObjectURL, revokeObjectURL });
    const clicked: string[] = [];
    vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function click(this: HTMLAnchorElement) {
      clicked.push(`${this.download} ${this.href}`);
    });
    saveFile('points.csv', 'T,k\r\n', 'text/csv');
    expect(clicked).toEqual(['points.csv blob:one']);
    expect(made[0]?.type).toBe('text/csv;charset=utf-8');
    expect(await made[0]?.text()).toBe('T,k\r\n');
    expect(document.querySelector('a')).toBeNull();
    expect(revokeObjectURL).not.toHaveBeenCalled();
    vi.runAllTimers();
    expect(revokeObjectURL).toHaveBeenCalledWith('blob:one');
  });
});
