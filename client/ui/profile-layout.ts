import { fittedLabel, textWidth } from './fitted-label.ts';

/** One state of a pathway. */
export interface ProfileState {
  label: string;
  /** Against the start or any other reference that all pathways share. */
  energy: number;
  kind: 'state' | 'transition';
  /** Standard uncertainty. */
  u?: number | null;
}

/** States one after another, with the transition states between them. */
export interface ProfilePathway {
  id: string;
  label: string;
  states: readonly ProfileState[];
  /** Index of the highest point of this pathway. */
  highest?: number | null;
}

/** A name under the profile. */
export interface PlacedLabel {
  index: number;
  text: string;
  full: string;
  x: number;
  /** Row of the names, from the axis downwards. */
  level: number;
}

/** The names of the states of pathways that have the same ones. */
export interface LabelBand {
  pathwayIds: string[];
  labels: PlacedLabel[];
  levels: number;
}

interface LabelRoom {
  slot: number;
  /** Middle of a slot. */
  middle: (index: number) => number;
  width: number;
  most?: number;
}

const gap = 8;

/**
 * Places the names of states in rows so that none touches another: side by side where there is room, else in turns
 * on two or three rows; one that is still too long is cut and keeps its full name for whoever points at it.
 */
export function placeLabels(names: readonly string[], { slot, middle, width, most = 3 }: LabelRoom): PlacedLabel[] {
  const room = (index: number, levels: number) => Math.min(slot * levels - gap, 2 * Math.min(middle(index), width - middle(index)));
  const fits = (levels: number) => names.every((name, index) => textWidth(name) <= room(index, levels));
  const levels = Array.from({ length: most }, (_, index) => index + 1).find(fits) ?? most;
  return names.map((full, index) => ({ index, full, text: fittedLabel(full, room(index, levels)), x: middle(index), level: index % levels }));
}

/** One band of names for each set of pathways with the same names, at most three bands. */
export function labelBands(pathways: readonly ProfilePathway[], room: LabelRoom): LabelBand[] {
  const bands: { key: string; names: string[]; pathwayIds: string[] }[] = [];
  for (const pathway of pathways) {
    const names = pathway.states.map((state) => state.label);
    const key = names.join('\n');
    const same = bands.find((band) => band.key === key);
    if (same) same.pathwayIds.push(pathway.id);
    else bands.push({ key, names, pathwayIds: [pathway.id] });
  }
  const most = bands.length > 1 ? 2 : 3;
  return bands.slice(0, 3).map(({ names, pathwayIds }) => {
    const labels = placeLabels(names, { ...room, most });
    return { pathwayIds, labels, levels: Math.max(1, ...labels.map((label) => label.level + 1)) };
  });
}

/** The stairs of a pathway: flat along each state, upright between them, as the sill is drawn. */
export function stairs(states: readonly ProfileState[], edge: (index: number) => number, y: (energy: number) => number): string {
  return states.map((state, index) => `${index === 0 ? `M${edge(0)} ` : 'V'}${y(state.energy)}H${edge(index + 1)}`).join('');
}

/** Index of the highest state; the first of equals. */
export function highestOf(states: readonly ProfileState[]): number {
  return states.reduce((best, state, index) => (state.energy > (states[best]?.energy ?? Number.NEGATIVE_INFINITY) ? index : best), 0);
}
