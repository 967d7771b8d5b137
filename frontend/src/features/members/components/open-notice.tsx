import type { MemberSheetDto } from '@mantlet/common';
import { defaultDesignBasis } from '@mantlet/common';
import { Link } from 'react-router-dom';
import { StatusWord } from '../../../ui/status-word.js';
import { useCurrentProject } from '../../projects/project-context.js';
import { openMatters } from '../open-matters.js';

/** What on this member waits on somebody: said before the drawings, which stay. */
export function OpenNotice({ sheet, heading }: { sheet: MemberSheetDto; /** what the page says already */ heading: string }) {
  const project = useCurrentProject();
  const matters = openMatters(sheet, (project.settings?.designBasis ?? defaultDesignBasis).secondSignatureAboveC);
  if (matters.length === 0) return null;
  return (
    <section className="mt-open" aria-label="What is open">
      {matters.map(({ what, who, how, place }) => (
        <div key={what}>
          <StatusWord kind="attention">Waits on the {who}</StatusWord>
          <p>{!heading.startsWith(what) && `${what}. `}{how}{place === 'zone' && <> <Link to={`/projects/${project.id}/zones?zone=${sheet.zone.id}`}>Zone {sheet.zone.code}</Link>.</>}{place === 'schedule' && <> <Link to={`/projects/${project.id}/schedule`}>Schedule</Link>.</>}</p>
        </div>
      ))}
    </section>
  );
}
