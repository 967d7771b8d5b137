import { useRouteError } from 'react-router-dom';
import { LinkButton } from '../ui/link-button.js';
import { Page } from '../ui/page.js';
import { ErrorState } from '../ui/states.js';

/** Shown in place of a page that failed while being drawn or fetched. */
export function RouteFault() {
  const error = useRouteError();
  return <ErrorState error={error} retry={() => window.location.reload()} />;
}

/** A project that is not there and one that is not theirs are told apart to nobody. */
export function NoSuchProject() {
  return (
    <Page title="Not found" heading="There is no such project, or you are not on its team" sub="If you were on it until now, somebody has taken you off: its fire engineer or specifier can say. What you saved is kept.">
      <p><LinkButton to="/projects" type="primary">Go to the projects</LinkButton></p>
    </Page>
  );
}

export function NotFound() {
  return (
    <Page title="Not found" heading="There is no page at this address" sub="It may have been mistyped, or belong to something that was deleted.">
      <p><LinkButton to="/projects" type="primary">Go to the projects</LinkButton></p>
    </Page>
  );
}
