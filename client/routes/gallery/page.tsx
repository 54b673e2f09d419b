import { PageHead } from '#client/ui/page-head.tsx';
import { GalleryControls } from './gallery-controls.tsx';
import { GalleryEntry } from './gallery-entry.tsx';
import { GalleryGrid } from './gallery-grid.tsx';
import { GalleryPlots } from './gallery-plots.tsx';
import { GallerySearch } from './gallery-search.tsx';

/** Every piece of the design kit on one page, with invented values, to look at while working on it; not part of the built application. */
export function Component() {
  return (
    <div className="flex flex-col gap-12">
      <PageHead title="Gallery" trail={[{ label: 'Search', to: '/search' }, { label: 'the design kit, with invented values' }]} aside={<span>only while developing</span>} />
      <GallerySearch />
      <GalleryEntry />
      <GalleryControls />
      <GalleryGrid />
      <GalleryPlots />
    </div>
  );
}
