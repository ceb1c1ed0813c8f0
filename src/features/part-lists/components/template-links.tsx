import { Download } from 'lucide-react';
import { Button } from '#src/components/button.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { blankTemplate, filledExample } from '#src/features/part-lists/hooks/example-list.ts';
import { saveText } from '#src/features/part-lists/hooks/save-text.ts';

/** A list to fill and one that is filled, made here in the shop's units. */
export function TemplateLinks() {
  const { units } = useFormats();
  const icon = <Download aria-hidden size={17} />;
  return (
    <>
      <Button size="small" icon={icon} onClick={() => saveText(blankTemplate(units))}>
        Template to fill
      </Button>
      <Button size="small" icon={icon} onClick={() => saveText(filledExample(units))}>
        Filled example
      </Button>
    </>
  );
}
