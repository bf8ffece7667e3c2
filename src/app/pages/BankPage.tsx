import { Bank } from '#src/features/bank/Bank.tsx';
import { Page } from '../layout/Page.tsx';
import { usePerson } from '../layout/use-person.ts';

export function BankPage() {
  const person = usePerson();
  return (
    <Page title="Bank">
      <Bank mayWrite={person.abilities.includes('item.create')} />
    </Page>
  );
}
