import { useQuery } from '@tanstack/react-query';
import { me } from '#src/api/session.ts';
import { Notice } from '#src/ui/notice.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { EditedPage } from './edited-page.tsx';
import { useSharedText } from './use-shared-text.ts';
import { WaitingDesk } from './waiting-desk.tsx';

type Props = Omit<Parameters<typeof EditedPage>[0], 'shared' | 'name'>;

/** The page as all who have it open share it; what is typed here is theirs at once. */
export function JoinedPage(props: Props) {
  const shared = useSharedText(props.page.id);
  const { data: person } = useQuery(me);
  if (shared?.hasText === true && person !== undefined && person !== null)
    return <EditedPage {...props} shared={shared} name={person.name} />;
  return (
    <WaitingDesk {...props}>
      {shared?.standing === 'refused' ? (
        <Notice kind="alarm" title="This page cannot be opened for correcting">
          {shared.refusal}
        </Notice>
      ) : (
        <Pending what="Fetching the text that everybody shares …" />
      )}
    </WaitingDesk>
  );
}
