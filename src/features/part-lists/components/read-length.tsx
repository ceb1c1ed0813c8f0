import { useFormats } from '#src/lib/formats.ts';
import { isExactIn } from '#src/features/part-lists/hooks/length-words.ts';

type ReadLengthProps = { lengthNm: number; widthNm?: number | null | undefined };

function One({ nm }: { nm: number }) {
  const { length, lengthStyle } = useFormats();
  return (
    <span className="whitespace-nowrap">
      {!isExactIn(nm, lengthStyle) && <span title="Rounded to show; kept exactly">≈ </span>}
      {length(nm)}
    </span>
  );
}

/** A length as it was read, plate with its width; what is rounded for showing says so. */
export function ReadLength({ lengthNm, widthNm }: ReadLengthProps) {
  if (widthNm === undefined || widthNm === null) return <One nm={lengthNm} />;
  return (
    <>
      <One nm={widthNm} /> × <One nm={lengthNm} />
    </>
  );
}
