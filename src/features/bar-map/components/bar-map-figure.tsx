import { useEffect, useMemo, useState } from 'react';
import { Layer, Shape, Stage } from 'react-konva';
import { drawBar } from '#shared/domain/bar-map/draw-bar.ts';
import type { Bar, PlanGroup } from '#shared/schemas/plans.ts';
import { paintBarMap } from '#src/features/bar-map/components/paint.ts';
import { barDrawing } from '#src/features/bar-map/hooks/bar-drawing.ts';
import { useWidth } from '#src/features/bar-map/hooks/use-width.ts';
import { useFormats } from '#src/lib/formats.ts';

/** A drawing this wide reads like the printed sheet; wider screens draw longer bars, not larger letters. */
const PX_PER_MM = 4;
const NARROWEST_MM = 150;

type BarMapFigureProps = {
  group: PlanGroup;
  layoutIndex: number;
  bar?: Bar;
  /** Every bar of the plan, for the tags the layout's repeats will make. */
  bars?: readonly Bar[];
  /** Next to cut: filled with layout blue. */
  activeCut?: number;
  /** 1 fits the page; larger ones are dragged or scrolled sideways. */
  zoom?: number;
};

/** Fonts of a canvas are those loaded when it paints; paint again when the shop's faces have come. */
function useFonts(): boolean {
  const [ready, setReady] = useState(document.fonts.status === 'loaded');
  useEffect(() => {
    let gone = false;
    Promise.all(
      ['700 12px "JetBrains Mono"', '400 12px "JetBrains Mono"', '600 12px "Barlow Condensed"'].map((font) =>
        document.fonts.load(font),
      ),
    ).then(
      () => !gone && setReady(true),
      () => !gone && setReady(true),
    );
    return () => {
      gone = true;
    };
  }, []);
  return ready;
}

/** One layout drawn with Konva. The words below say the same to whoever cannot see it or point at it. */
export function BarMapFigure({ group, layoutIndex, bar, bars, activeCut, zoom = 1 }: BarMapFigureProps) {
  const formats = useFormats();
  const [frame, width] = useWidth<HTMLDivElement>();
  const [pointed, setPointed] = useState<number | null>(null);
  const fonts = useFonts();
  const drawing = useMemo(
    () =>
      barDrawing(group, layoutIndex, formats, { bar, single: bar !== undefined, ...(bars ? { bars } : {}) }),
    [group, layoutIndex, formats, bar, bars],
  );
  const fit = Math.max(NARROWEST_MM, width / PX_PER_MM);
  const scale = width > 0 ? width / fit : PX_PER_MM;
  const map = useMemo(
    () => (drawing && width > 0 ? drawBar(drawing, fit * zoom) : null),
    [drawing, width, fit, zoom],
  );
  if (!drawing) return null;
  const filled = pointed ?? activeCut ?? null;
  const facts = drawing.cuts[filled ?? -1];
  const words = `${drawing.title}, ${drawing.facts.replace(/\s+/g, ' ')}${drawing.repeat > 1 ? `, cut ${drawing.repeat} times` : ''}: ${drawing.cuts
    .map(({ mark, lengthNm }) => `${mark} ${formats.length(lengthNm)}`)
    .join(
      ', ',
    )}; ${drawing.leftoverNm === 0 ? 'nothing left' : `${formats.length(drawing.leftoverNm)} ${drawing.keeps ? 'kept as a drop' : 'scrap'}`}.`;
  return (
    <figure className="m-0">
      <div
        ref={frame}
        className="overflow-x-auto"
        role="img"
        aria-label={words}
        tabIndex={zoom > 1 ? 0 : undefined}
      >
        {map && (
          <Stage
            width={map.width * scale}
            height={map.height * scale}
            onMouseMove={(event) => {
              const at = event.target.getStage()?.getPointerPosition();
              if (!at) return;
              const [x, y] = [at.x / scale, at.y / scale];
              const hit = map.pieces.findIndex(
                (field) =>
                  x >= field.x && x <= field.x + field.width && y >= field.y && y <= field.y + field.height,
              );
              setPointed(hit < 0 ? null : hit);
            }}
            onMouseLeave={() => setPointed(null)}
          >
            <Layer listening={false}>
              <Shape
                scaleX={scale}
                scaleY={scale}
                key={fonts ? 'fonts' : 'plain'}
                sceneFunc={(context) => paintBarMap(context, map, filled)}
              />
            </Layer>
          </Stage>
        )}
      </div>
      <figcaption className="min-h-6 pl-1 font-mono text-sm text-muted" aria-hidden>
        {facts
          ? `${facts.mark} · stop ${formats.setting(facts.lengthNm)} · tape ${formats.length(facts.startNm + facts.lengthNm)}`
          : ''}
      </figcaption>
    </figure>
  );
}
