import { People } from '#src/features/people/People.tsx';
import { Page } from '../layout/Page.tsx';
import { usePerson } from '../layout/use-person.ts';
import { NotAllowed } from './NotAllowed.tsx';

export function PeoplePage() {
  const { id, abilities } = usePerson();
  if (!abilities.includes('person.list')) return <NotAllowed what="People" />;
  return (
    <Page title="People">
      <People me={id} />
    </Page>
  );
}
