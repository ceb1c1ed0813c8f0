import { useWindowVirtualizer } from '@tanstack/react-virtual';
import { useLayoutEffect, useRef, useState } from 'react';
import type { Bar, PlanGroup } from '#shared/schemas/plans.ts';
import { Button } from '#src/components/button.tsx';
import { BarMapFigure } from '#src/features/bar-map/components/bar-map-figure.tsx';
import { CutTable } from '#src/features/bar-map/components/cut-table.tsx';

const ZOOMS = [1, 1.5, 2, 3, 4];
const ESTIMATE_PX = 210;

/** Every layout of a group. Only those near the window are mounted, so five hundred bars scroll like five. */
export function BarMapList({ group, bars }: { group: PlanGroup; bars: readonly Bar[] }) {
  const [zoom, setZoom] = useState(0);
  const list = useRef<HTMLDivElement>(null);
  const [offset, setOffset] = useState(0);
  useLayoutEffect(() => {
    setOffset(list.current?.offsetTop ?? 0);
  }, []);
  const layouts = group.result.layouts;
  const rows = useWindowVirtualizer({
    count: layouts.length,
    estimateSize: () => ESTIMATE_PX,
    overscan: 3,
    scrollMargin: offset,
  });
  const scale = ZOOMS[zoom] ?? 1;
  return (
    <>
      <div
        className="mb-2 flex items-center gap-2"
        role="group"
        aria-label={`Size of the drawings of ${group.section}`}
      >
        <Button
          size="small"
          disabled={zoom === 0}
          onClick={() => setZoom(zoom - 1)}
          aria-label="Smaller drawings"
        >
          −
        </Button>
        <span className="w-16 text-center font-mono">{Math.round(scale * 100)} %</span>
        <Button
          size="small"
          disabled={zoom === ZOOMS.length - 1}
          onClick={() => setZoom(zoom + 1)}
          aria-label="Larger drawings"
        >
          +
        </Button>
      </div>
      <div
        ref={list}
        className="relative"
        style={{ height: rows.getTotalSize() }}
        role="list"
        aria-label={`Bar maps of ${group.section} ${group.grade}`}
      >
        {rows.getVirtualItems().map((row) => (
          <div
            key={row.key}
            ref={rows.measureElement}
            data-index={row.index}
            role="listitem"
            className="absolute top-0 left-0 w-full border-b border-line pt-3 pb-2"
            style={{ transform: `translateY(${row.start - rows.options.scrollMargin}px)` }}
          >
            <BarMapFigure group={group} layoutIndex={row.index} bars={bars} zoom={scale} />
            <CutTable group={group} layoutIndex={row.index} />
          </div>
        ))}
      </div>
    </>
  );
}
