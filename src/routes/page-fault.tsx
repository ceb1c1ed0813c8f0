import { useQueryClient } from '@tanstack/react-query';
import { isRouteErrorResponse, useRevalidator, useRouteError } from 'react-router-dom';
import { LinkButton } from '#src/components/button.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Fault } from '#src/components/fault.tsx';
import { Page } from '#src/components/page.tsx';
import { ApiError, faultWords } from '#src/lib/api-error.ts';

/** An address that leads nowhere. */
export function NotFound() {
  return (
    <Page title="No such page">
      <EmptyState
        title="There is nothing at this address"
        actions={<LinkButton to="/">To your own page</LinkButton>}
      >
        The address may be mistyped, or what it showed has been deleted.
      </EmptyState>
    </Page>
  );
}

/** A page that could not load or draw itself; the rail stays, so that nobody is stuck. */
export function PageFault() {
  const error = useRouteError();
  const client = useQueryClient();
  const { revalidate } = useRevalidator();
  if (isRouteErrorResponse(error) && error.status === 404) return <NotFound />;
  if (error instanceof ApiError && error.code === 'not-found') return <NotFound />;
  const words = faultWords(error);
  if (error instanceof ApiError && error.code === 'not-allowed')
    return (
      <Page title={words.title}>
        <EmptyState title={words.message} actions={<LinkButton to="/">To your own page</LinkButton>}>
          A manager of the shop sees to people and their roles.
        </EmptyState>
      </Page>
    );
  return (
    <Page title={words.title}>
      <Fault
        {...words}
        title="The page could not be shown"
        onRetry={() => {
          if (!(error instanceof ApiError)) window.location.reload();
          else
            void client
              .resetQueries({ predicate: (query) => query.state.status === 'error' })
              .then(() => revalidate());
        }}
      />
    </Page>
  );
}
