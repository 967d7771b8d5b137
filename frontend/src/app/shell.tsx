import { Drawer } from 'antd';
import { useEffect, useRef, useState } from 'react';
import type { ReactNode, RefObject } from 'react';
import { Outlet, ScrollRestoration, useLocation, useNavigation } from 'react-router-dom';
import type { ProjectDto } from '@mantlet/common';
import { useSession } from '../features/session/api/session.js';
import { AccountMenuItems } from './account-menu.js';
import { PageList } from './page-list.js';
import { TitleStrip, standing } from './title-strip.js';

/** Another page: the focus goes to its heading, unless the page has put it somewhere already. A change of filters or an opened sheet leaves it where it is. */
function useHeadingFocus(main: RefObject<HTMLElement | null>): void {
  const { pathname } = useLocation();
  const last = useRef(pathname);
  useEffect(() => {
    if (last.current === pathname) return;
    last.current = pathname;
    const page = main.current;
    if (!page) return;
    /** @returns whether there is nothing left to do: the heading has the focus, or something else of the page does */
    const settle = (): boolean => {
      const at = document.activeElement;
      if (at && at !== page && page.contains(at)) return true;
      const heading = page.querySelector<HTMLElement>('h1');
      heading?.focus({ preventScroll: true });
      return heading !== null;
    };
    if (settle()) return;
    // a page that is still fetched has no heading yet; whoever has gone elsewhere meanwhile is left there
    const watch = new MutationObserver(() => { if (document.activeElement !== document.body || settle()) watch.disconnect(); });
    watch.observe(page, { childList: true, subtree: true });
    return () => watch.disconnect();
  }, [pathname, main]);
}

/** The title strip above, the list of pages at the left, the page between them and the standing caution. */
export function Shell({ project, notice, children }: { project?: ProjectDto; notice?: ReactNode; children?: ReactNode }) {
  const user = useSession().data?.user;
  const [menuOpen, setMenuOpen] = useState(false);
  const main = useRef<HTMLElement>(null);
  useHeadingFocus(main);
  const going = useNavigation().state !== 'idle';
  const administrator = user?.administrator ?? false;
  return (
    <div className="mt-shell">
      <a className="mt-skip" href="#main" onClick={(event) => { event.preventDefault(); main.current?.focus(); }}>Skip to the page</a>
      <TitleStrip project={project} user={user ?? null} onMenu={() => setMenuOpen(true)} />
      <div className="mt-side"><PageList project={project} administrator={administrator} /></div>
      <main id="main" className="mt-main" ref={main} tabIndex={-1} aria-busy={going}>
        {notice}
        {children ?? <Outlet />}
        {project && (
          <p className="mt-foot">
            Results support design by licensed engineers and do not replace it. Local codes and the authority having jurisdiction govern;
            the period comes from the fire strategy; thickness from the product's own evidence. Nothing here certifies a product.
          </p>
        )}
      </main>
      <Drawer title="Menu" placement="right" size={300} open={menuOpen} onClose={() => setMenuOpen(false)} rootClassName="mt-menu-drawer">
        {project && <div className="mt-menu-who"><div className="mt-sub">Project {project.number}</div><div className="mt-strong">{project.name}</div></div>}
        <PageList project={project} administrator={administrator} onGo={() => setMenuOpen(false)} />
        <AccountMenuItems user={user ?? null} roles={standing(project, user ?? null)} onDone={() => setMenuOpen(false)} />
      </Drawer>
      <ScrollRestoration />
    </div>
  );
}
