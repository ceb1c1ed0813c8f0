import type { BarDrawing } from '#shared/domain/bar-map/draw-bar.ts';
import { barMassMg } from '#shared/domain/mass.ts';
import { sectionOutline } from '#shared/domain/section/outline.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import type { Bar, PlanGroup } from '#shared/schemas/plans.ts';
import { formatHeat, formatTag, type Formats } from '#src/lib/formats.ts';

type Options = {
  bar?: Bar | undefined;
  /** Leaves out the repeat, where one bar stands for itself. */ single?: boolean;
  bars?: readonly Bar[];
};

/** A layout of a plan's group as the drawing wants it. */
export function barDrawing(
  group: PlanGroup,
  layoutIndex: number,
  formats: Formats,
  { bar, single = false, bars = [] }: Options = {},
): BarDrawing | null {
  const layout = group.result.layouts[layoutIndex];
  const stock = group.stock.find(({ stockId }) => stockId === layout?.stockId);
  if (!layout || !stock) return null;
  const marks = new Map(group.pieces.map(({ id, mark }) => [id, mark]));
  const section = sectionByName(group.stockKey);
  const made = bar
    ? [bar]
    : bars.filter((entry) => entry.groupId === group.id && entry.layout === layoutIndex);
  const tags = made.flatMap(({ makesTag }) => (makesTag === null ? [] : [formatTag(makesTag)]));
  const tagWords = tags.length > 2 ? `${tags[0]} … ${tags.at(-1)}` : tags.join(', ');
  const slot = made.length === 1 ? made[0]?.madeDrop?.slot : undefined;
  const heat = bar?.heat ?? stock.drop?.heat ?? null;
  const facts = [
    stock.drop ? `drop ${formatTag(stock.drop.tag)} ${stock.drop.slot}` : '',
    formats.length(stock.lengthNm),
    formats.mass(barMassMg(group.mgPerM, stock.lengthNm)),
    stock.drop || bar?.heat ? formatHeat(heat) : '',
  ].filter(Boolean);
  return {
    stockNm: stock.lengthNm,
    headCropNm: group.request.cutting.headCropNm,
    tailCropNm: group.request.cutting.tailCropNm,
    kerfNm: group.request.cutting.kerfNm,
    cuts: layout.cuts.map(({ pieceId, startNm, lengthNm }) => ({
      pieceId,
      mark: marks.get(pieceId) ?? pieceId,
      startNm,
      lengthNm,
    })),
    leftoverNm: layout.leftoverNm,
    keeps: layout.keeps,
    repeat: single ? 0 : layout.repeat,
    dropWords: [tagWords || 'new drop', `${formats.length(layout.leftoverNm)}${slot ? ` ${slot}` : ''}`],
    title: `${group.section} ${group.grade}`.trim(),
    facts: facts.join('   '),
    outline: section ? sectionOutline(section) : null,
    units: formats.units,
    length: formats.length,
    tape: formats.length,
  };
}
