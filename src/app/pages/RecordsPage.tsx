import { Records } from '#src/features/records/Records.tsx';
import { Page } from '../layout/Page.tsx';
import { usePerson } from '../layout/use-person.ts';
import { NotAllowed } from './NotAllowed.tsx';

export function RecordsPage() {
  if (!usePerson().abilities.includes('record.list')) return <NotAllowed what="Records" />;
  return (
    <Page title="Records">
      <Records />
    </Page>
  );
}
