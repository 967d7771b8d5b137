import type { ReactNode } from 'react';
import { useTitle } from './page-info.js';
import type { PageInfo } from './page-info.js';

interface PageProps {
  /** short name for the strip and the browser's title */
  title: string;
  /** what the browser's title begins with instead: the thing, then the page it belongs to, so that tabs and bookmarks are told apart */
  trail?: readonly string[] | undefined;
  /** name of the project, for the browser's title */
  projectName?: string | undefined;
  /** the answer, in a sentence without a full stop */
  heading: ReactNode;
  /** one line that explains the answer */
  sub?: ReactNode;
  /** buttons at the right of the heading */
  actions?: ReactNode;
  /** what the strip says under State instead of the project's count of open items */
  state?: PageInfo['state'];
  /** narrow: a single column for reading and forms */
  width?: 'full' | 'narrow';
  children?: ReactNode;
}

/** The frame of every page: heading that is the answer, a line below it, actions, then the content. */
export function Page({ title, trail, projectName, heading, sub, actions, state, width = 'full', children }: PageProps) {
  useTitle(title, projectName, state, trail);
  return (
    <article className={`mt-page mt-page-${width}`}>
      <header className="mt-page-head">
        <div className="mt-page-words">
          {/* takes the focus when one goes to another page, so that its answer is read out */}
          <h1 tabIndex={-1}>{heading}</h1>
          {sub && <p className="mt-sub">{sub}</p>}
        </div>
        {actions && <div className="mt-actions">{actions}</div>}
      </header>
      {children}
    </article>
  );
}
