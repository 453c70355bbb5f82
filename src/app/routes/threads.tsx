import { useNavigate } from 'react-router-dom';
import { TwoColumns } from '../../components/ui/page.tsx';
import { Sheet } from '../../components/ui/sheet.tsx';
import { OpenThread } from '../../features/threads/components/open-thread.tsx';
import { ThreadList } from '../../features/threads/components/thread-list.tsx';
import { usePathId } from '../use-path-id.ts';

export function Component() {
  const commissionId = usePathId('commissionId');
  const navigate = useNavigate();
  return (
    <TwoColumns
      main={
        <Sheet title="Threads">
          <ThreadList commissionId={commissionId} />
        </Sheet>
      }
      side={
        <Sheet title="Open a thread">
          <OpenThread
            commissionId={commissionId}
            subject="commission"
            subjectId={commissionId}
            suggestedTitle=""
            onOpened={(threadId) => void navigate(`/commissions/${commissionId}/threads/${threadId}`)}
          />
        </Sheet>
      }
    />
  );
}
