/** What stands in a page's place when it failed; the frame around it stays usable. */
import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { Page, Section } from '../ui/page.tsx';
import { ErrorNotice } from '../ui/error-notice.tsx';
import { NotFoundPage } from './not-found-page.tsx';

export function PageError() {
  const error = useRouteError();
  if (isRouteErrorResponse(error) && error.status === 404) return <NotFoundPage />;
  return (
    <Page title="This page could not be shown">
      <Section>
        <ErrorNotice error={error} />
      </Section>
    </Page>
  );
}
