import { App, Button } from 'antd';
import { useMemo, useState } from 'react';
import { useLocation, useNavigate, useParams } from 'react-router-dom';
import type { MemberSheetDto } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { count } from '../../../lib/format.js';
import { Page } from '../../../ui/page.js';
import type { PageInfo } from '../../../ui/page-info.js';
import { QueryState } from '../../../ui/states.js';
import { RequireRight, useCurrentProject, useMay } from '../../projects/project-context.js';
import { useDeleteMembers, useMember, useMemberNeighbours } from '../api/members.js';
import { MemberDrawing } from '../components/member-drawing.js';
import { Acceptances, MemberFacts } from '../components/member-facts.js';
import { MemberHistory } from '../components/member-history.js';
import { MemberPager } from '../components/member-pager.js';
import { OpenNotice } from '../components/open-notice.js';
import { WorkingTable } from '../components/working-table.js';
import { AcceptanceDrawer } from '../forms/acceptance-drawer.js';
import { EditMemberDrawer } from '../forms/member-drawer.js';
import { StructuralDrawer } from '../forms/structural-drawer.js';
import { filterOfAddress } from '../member-filter.js';
import { sheetHeading, sheetSub, verdictNames } from '../member-words.js';
import '../members.css';

function stateOf({ result }: MemberSheetDto): PageInfo['state'] {
  if (!result) return { word: 'Not assessed', kind: 'neutral' };
  if (result.assumed) return { word: 'Assumed', kind: 'attention' };
  return { word: verdictNames[result.verdict], kind: result.verdict === 'protected' || result.verdict === 'bare' ? 'settled' : 'attention' };
}

type Open = 'member' | 'structural' | 'accept' | null;

function Actions({ sheet, setOpen }: { sheet: MemberSheetDto; setOpen: (open: Open) => void }) {
  const project = useCurrentProject();
  const may = useMay();
  const navigate = useNavigate();
  const { message, modal } = App.useApp();
  const remove = useDeleteMembers(project.id);
  const { id, version, mark } = sheet.member;
  const askDelete = () => modal.confirm({
    title: `Delete ${mark}?`, icon: null, okText: 'Delete', okButtonProps: { danger: true }, cancelText: 'Keep', content: 'It leaves the schedule in progress; issued revisions keep it.',
    onOk: async () => {
      try {
        await remove.mutateAsync({ members: [{ id, version }] });
        void navigate(`/projects/${project.id}/members`);
      } catch (error) {
        void message.error(error instanceof ApiError ? error.message : 'Not deleted. Try again.');
      }
    },
  });
  return (
    <>
      {may('edit-members') && <Button danger onClick={askDelete}>Delete</Button>}
      {may('edit-members') && <Button onClick={() => setOpen('member')}>Change member</Button>}
      {may('edit-structural') && <Button onClick={() => setOpen('structural')}>Critical temperature</Button>}
      {may('accept-temperatures') && <Button onClick={() => setOpen('accept')}>Accept</Button>}
    </>
  );
}

function Drawers({ sheet, open, close }: { sheet: MemberSheetDto; open: Open; close: () => void }) {
  const project = useCurrentProject();
  const { message } = App.useApp();
  const { member, section, result } = sheet;
  switch (open) {
    case 'member': return <EditMemberDrawer projectId={project.id} member={member} section={section} onClose={close} />;
    case 'structural': return <StructuralDrawer projectId={project.id} member={member} onClose={close} />;
    case 'accept': {
      const one = { id: member.id, mark: member.mark, assumed: result?.assumed ?? false, criticalTemperatureC: result?.criticalTemperatureC ?? null, verdict: result?.verdict ?? null };
      return <AcceptanceDrawer members={[one]} onClose={close} onAccepted={(n) => { close(); void message.success(`Accepted for ${count(n, 'member')}`); }} />;
    }
    case null: return null;
  }
}

function Sheet({ sheet }: { sheet: MemberSheetDto }) {
  const project = useCurrentProject();
  const location = useLocation();
  const [open, setOpen] = useState<Open>(null);
  const list = (location.state as { list?: unknown } | null)?.list;
  const filter = useMemo(() => (typeof list === 'string' && list ? filterOfAddress(new URLSearchParams(list)) : null), [list]);
  const neighbours = useMemberNeighbours(project.id, sheet.member.id, filter);
  const { previousId, nextId } = neighbours.data ?? sheet;
  const back = `/projects/${project.id}/members${typeof list === 'string' && list ? `?${list}` : ''}`;
  return (
    <Page
      title={`Member ${sheet.member.mark}`} trail={[sheet.member.mark, 'Members']} projectName={project.name} heading={sheetHeading(sheet)} sub={sheetSub(sheet)} state={stateOf(sheet)}
      actions={<><Actions sheet={sheet} setOpen={setOpen} /><MemberPager back={back} projectId={project.id} previousId={previousId} nextId={nextId} state={location.state} /></>}
    >
      <OpenNotice sheet={sheet} heading={sheetHeading(sheet)} />
      <MemberDrawing sheet={sheet} />
      <div className="mt-sheet-body">
        <WorkingTable working={sheet.working} heading={`Member ${sheet.member.mark}: ${sheetHeading(sheet)}`} />
        <div className="mt-sheet-foot">
          <MemberFacts sheet={sheet} />
          <div className="mt-stack">
            <Acceptances projectId={project.id} memberId={sheet.member.id} acceptances={sheet.member.acceptances} />
            <MemberHistory history={sheet.history} />
          </div>
        </div>
      </div>
      <Drawers sheet={sheet} open={open} close={() => setOpen(null)} />
    </Page>
  );
}

function MemberOfAddress() {
  const project = useCurrentProject();
  const { memberId = '' } = useParams();
  const member = useMember(project.id, memberId);
  return <QueryState query={member} what="the member">{(sheet) => <Sheet key={sheet.member.id} sheet={sheet} />}</QueryState>;
}

export default function MemberPage() {
  return <RequireRight right="see-design"><MemberOfAddress /></RequireRight>;
}
