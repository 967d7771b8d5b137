import { useEffect } from 'react';
import { useNavigate } from 'react-router-dom';
import { LinkButton } from '../../../ui/link-button.js';

interface MemberPagerProps { /** the list as it was left */ back: string; projectId: string; previousId: string | null; nextId: string | null; state: unknown }

/** To the member before and after by mark. With a modifier, so that a key alone never leaves the page. */
export function MemberPager({ back, projectId, previousId, nextId, state }: MemberPagerProps) {
  const navigate = useNavigate();
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!event.altKey || event.ctrlKey || event.metaKey) return;
      const id = event.key === 'PageUp' ? previousId : event.key === 'PageDown' ? nextId : null;
      if (!id) return;
      event.preventDefault();
      void navigate(`/projects/${projectId}/members/${id}`, { state });
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [navigate, projectId, previousId, nextId, state]);
  const button = (id: string | null, text: string, keys: string) => (id
    ? <LinkButton to={`/projects/${projectId}/members/${id}`} state={state} title={keys} aria-keyshortcuts={keys.replace(' ', '')}>{text}</LinkButton>
    : null);
  return (
    <nav className="mt-pager mt-noprint" aria-label="Members by mark">
      <LinkButton to={back}>All members</LinkButton>
      {button(previousId, 'Previous', 'Alt +PageUp')}
      {button(nextId, 'Next', 'Alt +PageDown')}
    </nav>
  );
}
