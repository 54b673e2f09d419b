import { useWindowVirtualizer } from '@tanstack/react-virtual';
import { useCallback, useLayoutEffect, useRef, useState } from 'react';
import { keyOf, Line, type BodyProps, type TableLine } from './table-rows.tsx';

/** The body of a long table: only the lines in sight, and room for the others above and below. */
export function RowsInSight<T extends object>(props: BodyProps<T>) {
  const { lines, columns, choosable } = props;
  const body = useRef<HTMLTableSectionElement>(null);
  const [top, setTop] = useState(0);
  useLayoutEffect(() => {
    if (body.current) setTop(body.current.getBoundingClientRect().top + window.scrollY);
  }, []);
  const virtual = useWindowVirtualizer<HTMLTableRowElement>({
    count: lines.length,
    estimateSize: (index) => (lines[index]?.heading ? 50 : 47),
    overscan: 20,
    scrollMargin: top,
    getItemKey: (index) => keyOf(lines[index] as TableLine<T>),
  });
  const { measureElement } = virtual;
  // A row without height is not laid out (a hidden page): measuring it would have all rows drawn.
  const measure = useCallback((element: HTMLTableRowElement | null) => {
    if (element && element.getBoundingClientRect().height > 0) measureElement(element);
  }, [measureElement]);
  const items = virtual.getVirtualItems();
  const before = (items[0]?.start ?? top) - top;
  const after = virtual.getTotalSize() - ((items.at(-1)?.end ?? top) - top);
  const span = columns.length + (choosable ? 1 : 0);
  return (
    <tbody ref={body}>
      {before > 0 && <tr aria-hidden="true"><td className="table-space" colSpan={span} style={{ height: before }} /></tr>}
      {items.map((item) => {
        const line = lines[item.index];
        return line && <Line key={item.key} line={line} index={item.index} measure={measure} {...props} />;
      })}
      {after > 0 && <tr aria-hidden="true"><td className="table-space" colSpan={span} style={{ height: after }} /></tr>}
    </tbody>
  );
}
