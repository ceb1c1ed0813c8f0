import { LinkButton } from '#src/components/button.tsx';
import { Page } from '#src/components/page.tsx';
import { RackList } from '#src/features/rack/components/rack-list.tsx';
import { useMay } from '#src/lib/session.ts';
import { paths } from '#src/lib/paths.ts';

export function Component() {
  const mayLog = useMay('drop:log');
  return (
    <Page
      title="Drop rack"
      sub="What is left of bars and worth keeping. Plans use it before they buy."
      actions={
        mayLog && (
          <LinkButton variant="act" to={paths.logDrop()}>
            Log a drop
          </LinkButton>
        )
      }
    >
      <RackList />
    </Page>
  );
}
