type SectionWordsProps = { section: string; sectionText: string };

/** Spaces, capitals and the sign between two sizes are spelling, not words. */
const plain = (text: string) => text.toLowerCase().replace(/\s/g, '').replace(/[×*]/g, 'x');

/** The section as the trade writes it, with the customer's own words beside it where they differ. */
export function SectionWords({ section, sectionText }: SectionWordsProps) {
  return (
    <>
      <span className="font-mono">{section}</span>
      {plain(section) !== plain(sectionText) && (
        <span className="ml-2 text-[0.9375rem] text-muted">
          list says <span className="font-mono">{sectionText}</span>
        </span>
      )}
    </>
  );
}
