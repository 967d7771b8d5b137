import { useRouteError } from 'react-router-dom';
import { LinkButton } from '../ui/link-button.js';
import { Page } from '../ui/page.js';
import { ErrorState } from '../ui/states.js';

/** Shown in place of a page that failed while being drawn or fetched. */
export function RouteFault() {
  const error = useRouteError();
  return <ErrorState error={error} retry={() => window.location.reload()} />;
}

export function NotFound() {
  return (
    <Page title="Not found" heading="There is no page at this address" sub="It may have been mistyped, or belong to something that was deleted.">
      <p><LinkButton to="/projects" type="primary">Go to the projects</LinkButton></p>
    </Page>
  );
}
