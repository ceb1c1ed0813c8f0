type SectionWordsProps = { section: string; sectionText: string };

const same = (one: string, other: string) =>
  one.replace(/\s/g, '').toLowerCase() === other.replace(/\s/g, '').toLowerCase();

/** The section as the trade writes it, with the customer's own words beside it where they differ. */
export function SectionWords({ section, sectionText }: SectionWordsProps) {
  return (
    <>
      <span className="font-mono">{section}</span>
      {!same(section, sectionText) && (
        <span className="ml-2 text-[0.9375rem] text-muted">
          list says <span className="font-mono">{sectionText}</span>
        </span>
      )}
    </>
  );
}
