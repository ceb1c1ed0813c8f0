import type { PartListLine } from '#shared/domain/part-list/types.ts';

function difference(one: PartListLine, other: PartListLine): string | null {
  if (one.section !== other.section) return 'section';
  if (one.lengthNm !== other.lengthNm) return 'length';
  if (one.widthNm !== other.widthNm) return 'width';
  return one.grade === other.grade ? null : 'grade';
}

/**
 * Adds a remark where one mark stands for different pieces. Often it is meant (a mark per assembly),
 * so it does not stop the row; the person at the saw should still know.
 */
export function remarkRepeatedMarks(lines: readonly PartListLine[]): PartListLine[] {
  const first = new Map<string, PartListLine>();
  return lines.map((line) => {
    const earlier = first.get(line.mark);
    if (!earlier) first.set(line.mark, line);
    const differing = earlier && difference(earlier, line);
    if (!earlier || !differing) return line;
    const remark = `Mark ${line.mark} stands on row ${earlier.row} with another ${differing}`;
    return { ...line, remarks: [...line.remarks, remark] };
  });
}
